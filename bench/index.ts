/** `npm run bench`: how long the chain takes, stage by stage, and against the same chain in NumPy. Ratios and medians, no verdicts. */

import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { cpus } from 'node:os';
import { resolve } from 'node:path';
import { conduction } from '../src/core/sheet/conduction';
import { layerReadings, layerSpans } from '../src/core/sheet/layers';
import { temperatureCoefficients } from '../src/core/sheet/temperatureCoefficient';
import { mobilityModel } from '../src/core/mobility/list';
import { runRecipe } from '../src/core/process/runRecipe';
import { sampleDoping } from '../src/core/profile/doping';
import { solve } from '../src/core/solve';
import { toRecipe } from '../src/core/study/toRecipe';
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

function coreStages(): Timing {
  const recipe = toRecipe(STUDY);
  const model = mobilityModel(recipe.models.mobility);
  const build = () => {
    const process_ = runRecipe(recipe);
    const activation = { fraction: process_.activeFractions, limit: process_.activeLimits };
    return sampleDoping(process_.contributions, activation, recipe.wafer.thickness, 1);
  };
  const doping = build();
  const spans = layerSpans(doping, doping.junctions);
  const readings = () => {
    const flow = conduction(doping, model, recipe.temperature);
    return spans.map((span) => layerReadings(doping, flow, span));
  };
  console.log(`depth mesh: ${doping.depth.length} nodes, ${spans.length} layers`);
  line('profile: recipe, mesh, sampling', timed(build));
  const chain = timed(readings);
  line('carriers, mobility, layers', chain);
  line('temperature coefficients', timed(() => temperatureCoefficients(doping, model, recipe.temperature, spans)));
  line('whole: validated study to result document', timed(() => solve(STUDY)));
  return chain;
}

function numpyChain(ours: Timing, nodes: string): void {
  const script = resolve('bench/chain.py');
  const run = spawnSync('python3', [script, String(RUNS)], { encoding: 'utf8' });
  if (run.status !== 0) {
    console.log('NumPy chain skipped: python3 with numpy and scipy was not found');
    return;
  }
  const { median_ms: median } = JSON.parse(run.stdout) as { median_ms: number };
  console.log(`${'same chain in NumPy, 600 depths'.padEnd(46)} ${median.toFixed(3).padStart(9)} ms`);
  console.log(`NumPy / ours (carriers, mobility, layers, ${nodes}): ${(median / ours.median).toFixed(2)}`);
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
numpyChain(coreStages(), 'mesh above');
commandLine();
