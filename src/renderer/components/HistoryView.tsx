/** What the wafer would read after every step of the recipe: sheet resistance, junction depth, and how far heat has moved dopants. */

import { useMemo } from 'preact/hooks';
import type { HistoryResult } from '../../core/index';
import { depthDigits, digits } from '../state/digits';
import { historySwept } from '../state/sweeps';
import { SweepPlot } from './SweepPlot';
import { SweepTable } from './SweepTable';

export function HistoryView() {
  const answer = historySwept.value;
  return (
    <section class="sweep" aria-label="The wafer after every step">
      <div class="sweep-tools">
        <h2 class="pane-title">After every step</h2>
      </div>
      {!answer && <p class="plot-wait">Solving …</p>}
      {answer && !answer.ok && (
        <p class="sweep-problem" role="alert">
          {answer.message}
        </p>
      )}
      {answer?.ok && <History result={answer.result} />}
    </section>
  );
}

function History({ result: { entries } }: { result: HistoryResult }) {
  const lines = useMemo(() => {
    const most = Math.max(...entries.map(({ layers }) => layers.length));
    const x = entries.map(({ step }) => step);
    return Array.from({ length: most }, (_, k) => ({
      name: `layer ${k + 1}`,
      x,
      y: entries.map(({ layers }) => layers[k]?.sheetResistance_ohmSq ?? null),
    }));
  }, [entries]);
  return (
    <>
      <SweepPlot
        label="Sheet resistance of every layer after every step"
        lines={lines}
        xTitle="step"
        yTitle="sheet resistance (Ω/sq)"
        log
        counts
      />
      <SweepTable
        label="Layers after every step"
        head={['step', 'what', 'layers', 'sheet resistance (Ω/sq)', 'down to (µm)', '√Dt (µm)']}
        rows={entries.map(({ step, title, layers, diffusionLength_um }) => [
          String(step),
          title,
          layers.map(({ type }) => type).join(' / '),
          layers.map((layer) => digits(layer.sheetResistance_ohmSq)).join(' / '),
          layers.map((layer) => depthDigits(layer.bottom_um)).join(' / '),
          Object.entries(diffusionLength_um)
            .map(([symbol, um]) => `${symbol} ${digits(um, 3)}`)
            .join(', ') || '–',
        ])}
      />
      <p class="card-note">
        What is implanted and not annealed yet reads as if it were active. √Dt adds the heat up with the
        constant diffusivities of the chosen set, and what anneals have taken in of implant damage.
      </p>
    </>
  );
}
