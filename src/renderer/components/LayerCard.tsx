/** The readings of one layer; sheet resistance leads. */

import type { LayerResult, MeasurementResult, ResultDocument } from '../../core/index';
import { depthDigits, digits } from '../state/digits';
import { Copyable } from './Copyable';

interface Props {
  layer: LayerResult;
  result: ResultDocument;
}

const EDGES: Record<LayerResult['bottomEdge'], string> = {
  junction: 'junction at',
  wafer: 'wafer ends at',
  buriedOxide: 'buried oxide at',
};

type Row = readonly [name: string, value: number | null, shown: string, unit: string];

function rowsOf(layer: LayerResult): Row[] {
  const row = (name: string, value: number | null, unit: string): Row => [name, value, digits(value), unit];
  return [
    [EDGES[layer.bottomEdge], layer.bottom_um, depthDigits(layer.bottom_um), 'µm'],
    row('Hall mobility', layer.hallMobility_cm2Vs, 'cm²/Vs'),
    row('Hall dose', layer.hallDose_cm2, 'cm⁻²'),
    row('carrier dose', layer.carrierDose_cm2, 'cm⁻²'),
    row('net dose', layer.netDose_cm2, 'cm⁻²'),
    row('mean resistivity', layer.meanResistivity_ohmCm, 'Ω cm'),
    ['TC1', layer.tcr1_ppmK, digits(layer.tcr1_ppmK, 3), 'ppm/K'],
    row('peak net', layer.peakNet_cm3, 'cm⁻³'),
    ['at depth', layer.peakDepth_um, depthDigits(layer.peakDepth_um), 'µm'],
    ...(layer.index === 1 ? [row('net at the surface', layer.surfaceNet_cm3, 'cm⁻³')] : []),
  ];
}

export function LayerCard({ layer, result }: Props) {
  const measured = result.measurements.filter((each) => each.layer === layer.index);
  return (
    <section class="panel layer" aria-label={`Layer ${layer.index}, ${layer.type}-type`}>
      <h3>
        <span class={`type-mark type-${layer.type}`}>{layer.type}</span>
        Layer {layer.index}
        <span class="layer-span">
          {depthDigits(layer.top_um)}–{depthDigits(layer.bottom_um)} µm
        </span>
      </h3>
      <Copyable
        class="big"
        name={`Sheet resistance of layer ${layer.index} in ohm per square`}
        value={layer.sheetResistance_ohmSq}
        shown={digits(layer.sheetResistance_ohmSq)}
        unit="Ω/sq"
      />
      <p class="spread">{spreadInWords(layer)}</p>
      {measured.map((each, i) => (
        <Measured key={i} {...each} />
      ))}
      <dl class="figures">
        {rowsOf(layer).map(([name, value, shown, unit]) => (
          <>
            <dt>{name}</dt>
            <dd>
              <Copyable name={name} value={value} shown={shown} unit={unit} />
            </dd>
          </>
        ))}
      </dl>
    </section>
  );
}

function Measured({ measured_ohmSq, difference_percent, difference_sigma }: MeasurementResult) {
  return (
    <p class="measured-line">
      measured {digits(measured_ohmSq)} Ω/sq: {differenceInWords(difference_percent, difference_sigma)}
    </p>
  );
}

/** "2.7 % above the prediction (2.5 σ)". */
function differenceInWords(percent: number | null, sigma: number | null): string {
  if (percent === null) return 'there is no prediction for this layer';
  const side = percent >= 0 ? 'above' : 'below';
  const inSigma = sigma === null ? '' : ` (${digits(Math.abs(sigma), 2)} σ)`;
  return `${digits(Math.abs(percent), 2)} % ${side} the prediction${inSigma}`;
}

/** How far the published mobility models agree, so that nobody reads four digits where the literature has two. */
function spreadInWords({ sheetResistanceSpread_ohmSq: [low, high] }: LayerResult): string {
  const percent = (100 * (high - low)) / low;
  if (percent < 0.1) return 'the mobility models that apply agree';
  return `${digits(low)} to ${digits(high)} Ω/sq by the mobility models that apply (${digits(percent, 2)} %)`;
}
