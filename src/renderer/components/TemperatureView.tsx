/** Sheet resistance against temperature: every layer relative to its value at the study's temperature, and its coefficients. */

import { useMemo } from 'preact/hooks';
import type { TemperatureResult } from '../../core/index';
import { digits } from '../state/digits';
import { temperatureSpan, temperatureSwept } from '../state/sweeps';
import { SpanField } from './SpanField';
import { SweepPlot } from './SweepPlot';
import { SweepTable } from './SweepTable';

const COLDEST = -73.15;
const HOTTEST = 226.85;

export function TemperatureView() {
  const span = temperatureSpan.value;
  const answer = temperatureSwept.value;
  const set = (change: Partial<typeof span>): void => {
    temperatureSpan.value = { ...span, ...change };
  };
  const end = (label: string, key: 'from_C' | 'to_C') => (
    <SpanField
      label={label}
      kind="temperature"
      unit="C"
      shownUnit="°C"
      value={span[key]}
      low={COLDEST}
      high={HOTTEST}
      commit={(value) => set({ [key]: value })}
    />
  );
  return (
    <section class="sweep" aria-label="Sheet resistance against temperature">
      <div class="sweep-tools">
        <h2 class="pane-title">Temperature</h2>
        {end('From', 'from_C')}
        {end('To', 'to_C')}
        <SpanField
          label="Points"
          kind="plain"
          unit=""
          shownUnit=""
          value={span.points}
          low={2}
          high={1000}
          whole
          commit={(points) => set({ points })}
        />
      </div>
      {!answer && <p class="plot-wait">Solving …</p>}
      {answer && !answer.ok && (
        <p class="sweep-problem" role="alert">
          {answer.message}
        </p>
      )}
      {answer?.ok && <Sweep result={answer.result} />}
    </section>
  );
}

function Sweep({ result }: { result: TemperatureResult }) {
  const { layers, temperature_C, reference_C } = result;
  const lines = useMemo(
    () =>
      layers.map(({ index, type, reference_ohmSq, sheetResistance_ohmSq }) => ({
        name: `layer ${index} ${type}`,
        x: temperature_C,
        y: sheetResistance_ohmSq.map((value) =>
          value === null ? null : 100 * (value / reference_ohmSq - 1),
        ),
      })),
    [result],
  );
  return (
    <>
      <SweepPlot
        label="Change of sheet resistance with temperature, one line a layer"
        lines={lines}
        xTitle="temperature (°C)"
        yTitle={`change from ${digits(reference_C, 3)} °C (%)`}
      />
      <SweepTable
        label="Temperature coefficients"
        head={[
          'layer',
          `at ${digits(reference_C, 3)} °C (Ω/sq)`,
          'TC1 (ppm/K)',
          'TC2 (ppm/K²)',
          'worst residual (%)',
        ]}
        rows={layers.map((layer) => [
          `${layer.index} ${layer.type}`,
          digits(layer.reference_ohmSq),
          digits(layer.tcr1_ppmK),
          digits(layer.tcr2_ppmK2, 3),
          digits(layer.worst_percent, 2),
        ])}
      />
      <SweepTable
        label="Sheet resistance by temperature"
        head={['°C', ...layers.map(({ index, type }) => `layer ${index} ${type} (Ω/sq)`)]}
        rows={temperature_C.map((t, i) => [
          digits(t),
          ...layers.map(({ sheetResistance_ohmSq }) => digits(sheetResistance_ohmSq[i])),
        ])}
      />
      <p class="card-note">
        R = R₀ (1 + TC1 ΔT + TC2 ΔT²) by least squares over the span. Mobility {result.mobility}; in layers of
        10¹⁷ to 10¹⁹ cm⁻³ a temperature coefficient is uncertain by half its value.
      </p>
    </>
  );
}
