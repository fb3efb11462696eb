/** One layer between reverse-biased junctions: how far it is pinched, and what its junctions store. */

import { useMemo } from 'preact/hooks';
import type { BiasResult } from '../../core/index';
import { depthDigits, digits } from '../state/digits';
import { shown } from '../state/solver';
import { biasSpan, biasSwept } from '../state/sweeps';
import { SpanField } from './SpanField';
import { SweepPlot } from './SweepPlot';
import { SweepTable } from './SweepTable';

const JUNCTIONS = ['both', 'upper', 'lower'] as const;

export function BiasView() {
  const span = biasSpan.value;
  const answer = biasSwept.value;
  const layers = shown.value?.solution.result.layers ?? [];
  const set = (change: Partial<typeof span>): void => {
    biasSpan.value = { ...span, ...change };
  };
  const end = (label: string, key: 'from_V' | 'to_V') => (
    <SpanField
      label={label}
      kind="voltage"
      unit="V"
      shownUnit="V"
      value={span[key]}
      low={0}
      high={1000}
      commit={(value) => set({ [key]: value })}
    />
  );
  return (
    <section class="sweep" aria-label="A layer against reverse voltage">
      <div class="sweep-tools">
        <h2 class="pane-title">Bias</h2>
        <label class="span-field">
          Layer
          <select
            value={String(span.layer)}
            onChange={(event) => set({ layer: Number(event.currentTarget.value) })}
          >
            {layers.map(({ index, type }) => (
              <option key={index} value={String(index)} selected={index === span.layer}>
                {index} {type}
              </option>
            ))}
          </select>
        </label>
        <label class="span-field">
          Junctions
          <select
            value={span.junctions}
            onChange={(event) => set({ junctions: event.currentTarget.value as typeof span.junctions })}
          >
            {JUNCTIONS.map((name) => (
              <option key={name} value={name} selected={name === span.junctions}>
                {name}
              </option>
            ))}
          </select>
        </label>
        {end('From', 'from_V')}
        {end('To', 'to_V')}
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

function Sweep({ result }: { result: BiasResult }) {
  const { layer, type, reverse_V, sheetResistance_ohmSq, junctions } = result;
  const resistance = useMemo(
    () => [{ name: `layer ${layer} ${type}`, x: reverse_V, y: sheetResistance_ohmSq }],
    [result],
  );
  const capacitance = useMemo(
    () =>
      junctions.map(({ position, capacitance_nFcm2 }) => ({
        name: `${position} junction`,
        x: reverse_V,
        y: capacitance_nFcm2,
      })),
    [result],
  );
  return (
    <>
      <p class="sweep-summary">
        Voltage coefficient <b>{digits(result.voltageCoefficient_percentV, 3)} %/V</b> at no bias. Pinch-off{' '}
        <b>{result.pinchOff_V === null ? 'not up to 200 V' : `at ${digits(result.pinchOff_V, 3)} V`}</b>.
      </p>
      <div class="sweep-plots">
        <SweepPlot
          label="Sheet resistance against reverse voltage"
          lines={resistance}
          xTitle="reverse voltage (V)"
          yTitle="sheet resistance (Ω/sq)"
        />
        <SweepPlot
          label="Junction capacitance against reverse voltage"
          lines={capacitance}
          xTitle="reverse voltage (V)"
          yTitle="capacitance (nF/cm²)"
        />
      </div>
      <SweepTable
        label="Values by reverse voltage"
        head={[
          'reverse (V)',
          'sheet resistance (Ω/sq)',
          ...junctions.flatMap(({ position }) => [
            `${position} depleted (µm)`,
            `${position} capacitance (nF/cm²)`,
          ]),
        ]}
        rows={reverse_V.map((v, i) => [
          digits(v),
          sheetResistance_ohmSq[i] === null ? 'depleted' : digits(sheetResistance_ohmSq[i]),
          ...junctions.flatMap(({ depletion_um, capacitance_nFcm2 }) => [
            depletion_um[i]?.map(depthDigits).join('–') ?? '–',
            digits(capacitance_nFcm2[i]),
          ]),
        ])}
      />
      <p class="card-note">
        Fermi levels are flat in each layer: no current flows and nothing breaks down. Live structures at
        voltage are for qualified staff under your site’s rules.
      </p>
    </>
  );
}
