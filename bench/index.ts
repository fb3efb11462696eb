/** `npm run bench`: how long the chain takes, stage by stage, and against the same chain in NumPy. Ratios and medians, no verdicts. */

import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { cpus } from 'node:os';
import { resolve } from 'node:path';
import { type CarrierChoice, carriersNear, carriersOf } from '../src/core/carriers/carriers';
import type { CarrierState } from '../src/core/carriers/state';
import type { SampledDoping } from '../src/core/profile/doping';
import { resample } from '../src/core/profile/resample';
import { conduction } from '../src/core/sheet/conduction';
import { layerReadings, layerSpans } from '../src/core/sheet/layers';
import { modelSpread } from '../src/core/sheet/modelSpread';
import { temperatureCoefficients } from '../src/core/sheet/temperatureCoefficient';
import { prepare, solve } from '../src/core/solve';
import { parseStudy, validateStudy } from '../src/core/study/validate';

const RUNS = 300;

/** Three implants and two anneals in one wafer. */
const STUDY = validateStudy({
  format: 'ohmstrata-study/1',
  name: 'three implants, two anneals',
  wafer: { dopant: 'phosphorus', concentration_cm3: 1.3e15 },
  steps: [
    { step: 'implant', dopant: 'boron', dose_cm2: 2e13, energy_keV: 60 },
    { step: 'implant', dopant: 'boron', dose_cm2: 5e12, energy_keV: 25 },
    { step: 'anneal', temperature_C: 1000, time_min: 30 },
    { step: 'implant', dopant: 'arsenic', dose_cm2: 4e14, energy_keV: 60 },
    { step: 'anneal', temperature_C: 950, time_min: 20 },
  ],
});

interface Timing {
  median: number;
  least: number;
}

function timed(work: () => unknown, runs = RUNS): Timing {
  for (let i = 0; i < Math.min(runs, 50); i++) work();
  const times = Array.from({ length: runs }, () => {
    const start = performance.now();
    work();
    return performance.now() - start;
  }).sort((a, b) => a - b);
  return { median: times[runs >> 1], least: times[0] };
}

function line(name: string, { median, least }: Timing, note = ''): void {
  console.log(`${name.padEnd(46)} ${median.toFixed(3).padStart(9)} ms  (least ${least.toFixed(3)})  ${note}`);
}

/** Median wall time of a command, ms. */
function command(arguments_: string[], runs = 15): Timing {
  return timed(() => spawnSync(process.execPath, arguments_, { stdio: 'ignore' }), runs);
}

/** What is timed against NumPy: from the doping to the readings, neutral and in equilibrium. */
interface Chains {
  neutral: Timing;
  poisson: Timing;
  nodes: number;
}

function coreStages(): Chains {
  const prepared = prepare(STUDY);
  const { doping, model } = prepared;
  const neutral: CarrierChoice = { ...prepared.choice, carriers: 'neutral' };
  const poisson: CarrierChoice = { ...prepared.choice, carriers: 'poisson' };
  const chain = (state: CarrierState) => {
    const flow = conduction(state, model);
    return layerSpans(state).map((span) => layerReadings(state, flow, span));
  };
  const found = carriersOf(doping, poisson);
  const dense = ofNodes(doping, 600);
  const denseFound = carriersOf(dense, poisson);
  console.log(
    `meshes: ${doping.depth.length} nodes of the doping, ${found.doping.depth.length} of the equilibrium, ${denseFound.doping.depth.length} of a finer one`,
  );
  line('profile: recipe, mesh, sampling', timed(() => prepare(STUDY)));
  const timings = {
    neutral: timed(() => chain(carriersOf(doping, neutral))),
    poisson: timed(() => chain(carriersOf(doping, poisson))),
    nodes: doping.depth.length,
  };
  line('neutral carriers, mobility, layers', timings.neutral);
  line('equilibrium with its mesh, mobility, layers', timings.poisson);
  line('equilibrium alone, with its mesh', timed(() => carriersOf(doping, poisson)));
  line('the same on the finer mesh', timed(() => carriersOf(dense, poisson)));
  line(
    'equilibrium near a known one (warm start)',
    timed(() => carriersNear(denseFound, { ...poisson, temperature: poisson.temperature + 1 })),
    `${denseFound.doping.depth.length} nodes`,
  );
  const spans = layerSpans(found);
  line('temperature coefficients', timed(() => temperatureCoefficients(found, poisson, model, spans)));
  line('spread of the mobility models', timed(() => modelSpread(found, poisson, 'complete', spans)));
  line('whole, neutral: study to result document', timed(() => solve(withCarriers('neutral'))));
  line('whole, equilibrium: study to result document', timed(() => solve(withCarriers('poisson'))));
  return timings;
}

const withCarriers = (carriers: 'neutral' | 'poisson') => ({
  ...STUDY,
  models: { ...STUDY.models, carriers },
});

/** The doping on evenly finer cells, so that about `count` nodes come out. */
function ofNodes(doping: SampledDoping, count: number): SampledDoping {
  const pieces = Math.max(1, Math.round(count / doping.depth.length));
  const depth: number[] = [];
  for (let i = 0; i + 2 < doping.depth.length; i += 2)
    for (let k = 0; k < 2 * pieces; k++)
      depth.push(doping.depth[i] + ((doping.depth[i + 2] - doping.depth[i]) * k) / (2 * pieces));
  depth.push(doping.depth[doping.depth.length - 1]);
  return resample(doping, Float64Array.from(depth));
}

function numpyChains(ours: Chains): void {
  const script = resolve('bench/chain.py');
  const run = spawnSync('python3', [script, String(RUNS)], { encoding: 'utf8' });
  if (run.status !== 0) {
    console.log('NumPy chains skipped: python3 with numpy and scipy was not found');
    return;
  }
  const medians = JSON.parse(run.stdout) as Record<'neutral' | 'poisson', number>;
  for (const kind of ['neutral', 'poisson'] as const) {
    console.log(`${`NumPy and SciPy, ${kind}, 600 depths`.padEnd(46)} ${medians[kind].toFixed(3).padStart(9)} ms`);
    console.log(`  NumPy / ours, ${kind}: ${(medians[kind] / ours[kind].median).toFixed(2)}`);
  }
}

function commandLine(): void {
  const bare = command(['-e', '0']);
  const entry = resolve('out/cli/ohmstrata.mjs');
  const demo = resolve('demo-profiles/p-resistor.json');
  parseStudy(readFileSync(demo, 'utf8'));
  const solved = command([entry, 'solve', demo]);
  line('bare Node', bare);
  line('ohmstrata solve, process start to end', solved, `bare Node + ${(solved.median - bare.median).toFixed(0)} ms`);
}

console.log(`${cpus()[0]?.model ?? 'unknown processor'}, Node ${process.version}, medians of ${RUNS} warm runs`);
numpyChains(coreStages());
commandLine();
