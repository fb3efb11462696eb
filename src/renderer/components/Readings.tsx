/** What the instruments would read, layer by layer, and what the steps did. */

import { useLayoutEffect } from 'preact/hooks';
import type { JunctionResult, StepResult } from '../../core/index';
import { depthDigits, digits } from '../state/digits';
import { outdated, shown, solveProblem } from '../state/solver';
import { Copyable } from './Copyable';
import { LayerCard } from './LayerCard';

export function Readings() {
  const current = shown.value;

  useLayoutEffect(() => {
    if (!current) return;
    performance.mark('ohmstrata:readings', { detail: current.runId });
    document.body.dataset.readings = String(current.runId);
  }, [current?.runId]);

  return (
    <section
      class={`readings ${outdated.value ? 'outdated' : ''}`}
      aria-label="Readings"
      aria-busy={outdated.value}
    >
      <h2 class="pane-title">
        Readings
        {solveProblem.value && current && <span class="tag tag-wrong">of the last valid recipe</span>}
      </h2>
      {current && (
        <>
          {current.solution.result.layers.map((layer) => (
            <LayerCard key={layer.index} layer={layer} result={current.solution.result} />
          ))}
          <Junctions junctions={current.solution.result.junctions} />
          <StepFigures steps={current.solution.result.steps} />
          <p class="visually-hidden" aria-live="polite">
            {spoken()}
          </p>
        </>
      )}
    </section>
  );
}

/** One sentence for screen readers, said after each change. */
function spoken(): string {
  const layers = shown.value?.solution.result.layers ?? [];
  return layers
    .map(
      (layer) =>
        `Layer ${layer.index}, ${layer.type}: ${digits(layer.sheetResistance_ohmSq)} ohm per square, down to ${depthDigits(layer.bottom_um)} micrometres.`,
    )
    .join(' ');
}

function Junctions({ junctions }: { junctions: readonly JunctionResult[] }) {
  return (
    <section class="panel" aria-label="Junctions">
      <h3>Junctions</h3>
      {junctions.length === 0 ? (
        <p class="card-note">None: the wafer is one layer.</p>
      ) : (
        <ol class="junctions">
          {junctions.map((junction) => (
            <Junction key={junction.electrical_um ?? junction.metallurgical_um} {...junction} />
          ))}
        </ol>
      )}
    </section>
  );
}

function Junction(junction: JunctionResult) {
  const { electrical_um, metallurgical_um, depletion_um, builtIn_V, capacitance_nFcm2 } = junction;
  const depth = (name: string, um: number | null) => (
    <>
      <dt>{name}</dt>
      <dd>
        <Copyable
          name={`${name} in µm`}
          value={um}
          shown={um === null ? 'none' : depthDigits(um)}
          unit="µm"
        />
      </dd>
    </>
  );
  return (
    <li>
      <dl class="figures">
        {depth('n = p at', electrical_um)}
        {metallurgical_um !== electrical_um && depth('doping changes sign at', metallurgical_um)}
        {depletion_um && (
          <>
            <dt>depleted</dt>
            <dd>
              {depthDigits(depletion_um[0])}–{depthDigits(depletion_um[1])} <span class="unit">µm</span>
            </dd>
          </>
        )}
        {capacitance_nFcm2 !== null && (
          <>
            <dt>capacitance</dt>
            <dd>
              <Copyable
                name="Junction capacitance in nF/cm²"
                value={capacitance_nFcm2}
                shown={digits(capacitance_nFcm2)}
                unit="nF/cm²"
              />
            </dd>
          </>
        )}
        {builtIn_V !== null && (
          <>
            <dt>built-in voltage</dt>
            <dd>
              <Copyable
                name="Built-in voltage in V"
                value={builtIn_V}
                shown={digits(builtIn_V, 3)}
                unit="V"
              />
            </dd>
          </>
        )}
      </dl>
    </li>
  );
}

function StepFigures({ steps }: { steps: readonly StepResult[] }) {
  const telling = steps.filter((step) => Object.keys(step.figures).length > 0);
  if (telling.length === 0) return null;
  return (
    <section class="panel" aria-label="What the steps did">
      <h3>What the steps did</h3>
      {telling.map((step) => (
        <div key={step.index} class="step-figures">
          <h4>
            <span class="step-number">{step.index}</span> {step.title}
          </h4>
          <dl class="figures">
            {Object.entries(step.figures).map(([name, value]) => (
              <Figure key={name} name={name} value={value} />
            ))}
          </dl>
        </div>
      ))}
    </section>
  );
}

const UNIT_SUFFIXES: Record<string, string> = {
  um: 'µm',
  nm: 'nm',
  cm3: 'cm⁻³',
  cm: 'cm',
  C: '°C',
  keV: 'keV',
  percent: '%',
  min: 'min',
  s: 's',
};

/** "projectedRange_um" reads as "projected range" with µm behind the value, "Dt_B_cm2" as "Dt of B" with cm². */
function Figure({ name, value }: { name: string; value: number | string }) {
  const [word, ...rest] = name.split('_');
  const suffix = rest.pop();
  const unit = suffix && unitOf(word, suffix);
  const plain = word.replace(/([a-z])([A-Z])/g, (_, end, start) => `${end} ${start.toLowerCase()}`);
  const words = [plain, ...rest].join(' of ');
  return (
    <>
      <dt>{words}</dt>
      <dd>
        {typeof value === 'number' ? (
          <Copyable name={words} value={value} shown={digits(value)} unit={unit} />
        ) : (
          value
        )}
      </dd>
    </>
  );
}

/** The suffix says cm2 for atoms on an area and for an area alike; a dose is the former. */
function unitOf(word: string, suffix: string): string {
  if (suffix === 'cm2') return /dose$/i.test(word) ? 'cm⁻²' : 'cm²';
  return UNIT_SUFFIXES[suffix] ?? suffix;
}
