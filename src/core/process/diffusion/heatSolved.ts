/** A heat treatment computed: all dopants together, each in the field and with the defects that all of them make. */

import { chargedDiffusivity } from '../../material/chargedDiffusivity';
import { DOPANT_FACTS, type Dopant } from '../../material/dopants';
import { processIntrinsicDensity } from '../../material/processIntrinsic';
import { activeLimit } from '../../material/solubility';
import type { Contribution } from '../../profile/doping';
import { doseOf, evaluator, table, uniform } from '../../profile/shape';
import type { DiffusivitySet } from '../../study/names';
import { dtOf, type HeatTreatment, hottest } from '../heat';
import { integrateDiffusion } from './integrate';
import { diffusionNodes } from './mesh';
import type { Source } from './source';
import { DiffusionSystem, type Species, type StepConditions, type Tolerance } from './system';

/** Half a per cent of a concentration or a fifth of a nanometre of a front in one time step. */
const TOLERANCE: Omit<Tolerance, 'floor'> = { tolerance: 5e-3, shift: 2e-8 };
/** Concentrations below this part of the lightest doping anywhere matter to nobody. */
const FLOOR = 0.03;
/** Diffusion lengths from the deepest dopant to where nothing arrives. */
const REACH = 8;
/** A profile is held to be above this, so that its logarithm exists; cm^-3. */
const NOTHING = 1e-10;

/** The table holds its last depth itself; the wafer goes on right below, cm. */
const SEAM = 1e-11;

export interface SolvedHeat {
  readonly contributions: Contribution[];
  /** (dose after - dose before)/dose before of everything behind a sealed surface; null while a source is open. */
  readonly doseError: number | null;
  readonly nodes: number;
  readonly steps: number;
}

/** @param filmEnd depth of the silicon, cm. @param refinement 2 for half the cells and a quarter of the error in time. */
export function heatSolved(
  contributions: readonly Contribution[],
  set: DiffusivitySet,
  heat: HeatTreatment,
  filmEnd: number,
  source: Source | null,
  refinement: number,
): SolvedHeat {
  const dopants = [
    ...new Set([...contributions.map(({ dopant }) => dopant), ...(source ? [source.dopant] : [])]),
  ];
  const end = Math.min(filmEnd, reach(contributions, set, heat, source));
  const nodes = diffusionNodes(contributions, end, (dopant) => dtOf(set, dopant, heat), source, refinement);
  const system = new DiffusionSystem(nodes);
  const species = dopants.map(
    (dopant): Species => ({
      sign: DOPANT_FACTS[dopant].role === 'donor' ? 1 : -1,
      concentration: sampled(contributions, dopant, nodes),
      ...(source?.dopant === dopant && { surface: { held: source.surface } }),
    }),
  );
  const before = species.map(({ concentration }) => system.dose(concentration));
  const floor = FLOOR * leastTotal(species);
  const squared = refinement * refinement;
  const steps = integrateDiffusion(system, species, heat.time, conditions(set, dopants, heat), {
    tolerance: TOLERANCE.tolerance / squared,
    shift: TOLERANCE.shift / squared,
    floor,
  });
  const after = species.map(({ concentration }) => system.dose(concentration));
  const change = Math.max(...after.map((dose, k) => (before[k] > 0 ? Math.abs(dose / before[k] - 1) : 0)));
  return {
    contributions: dopants.flatMap((dopant, k) =>
      asContributions(dopant, species[k].concentration, nodes, after[k], contributions, source),
    ),
    doseError: source ? null : change,
    nodes: nodes.length,
    steps,
  };
}

/** Where nothing arrives: below the deepest dopant by the longest diffusion there could be at its concentration. */
function reach(
  contributions: readonly Contribution[],
  set: DiffusivitySet,
  heat: HeatTreatment,
  source: Source | null,
): number {
  const temperature = hottest(heat);
  const ni = processIntrinsicDensity(temperature);
  const fromSteps = contributions.filter(({ stepIndex }) => stepIndex > 0);
  const deepest = Math.max(1e-5, ...fromSteps.flatMap(({ shape }) => [...shape.marks, ...shape.jumps]));
  const dopants = [...fromSteps.map(({ dopant }) => dopant), ...(source ? [source.dopant] : [])];
  const longest = dopants.map((dopant) => {
    const { neutral, positive, negative, doubleNegative } = chargedDiffusivity(set, dopant, temperature);
    const ratio = Math.max(1, activeLimit(dopant, temperature) / ni);
    const enhanced = neutral + ratio * (positive + negative + ratio * doubleNegative);
    return Math.sqrt(
      2 * Math.min(enhanced, 30 * (neutral + positive + negative + doubleNegative)) * heat.time,
    );
  });
  return deepest + REACH * Math.max(0, ...longest);
}

function leastTotal(species: readonly Species[]): number {
  const total = new Float64Array(species[0].concentration.length);
  for (const { concentration } of species)
    for (let i = 0; i < total.length; i++) total[i] += concentration[i];
  return total.reduce((least, value) => Math.min(least, value), Number.POSITIVE_INFINITY);
}

function sampled(contributions: readonly Contribution[], dopant: Dopant, nodes: Float64Array): Float64Array {
  const parts = contributions.filter((part) => part.dopant === dopant).map(({ shape }) => evaluator(shape));
  return nodes.map((x) => parts.reduce((sum, at) => sum + at(x), 0));
}

function conditions(
  set: DiffusivitySet,
  dopants: readonly Dopant[],
  heat: HeatTreatment,
): (time: number) => StepConditions {
  const at = (temperature: number): StepConditions => ({
    diffusivity: dopants.map((dopant) => chargedDiffusivity(set, dopant, temperature)),
    limit: dopants.map((dopant) => activeLimit(dopant, temperature)),
    ni: processIntrinsicDensity(temperature),
  });
  if (heat.temperature === heat.endTemperature) {
    const constant = at(heat.temperature);
    return () => constant;
  }
  return (time) => at(heat.temperature + ((heat.endTemperature - heat.temperature) * time) / heat.time);
}

/** The solved profile as a table that holds the dose of the solution, and the wafer below it. */
function asContributions(
  dopant: Dopant,
  concentration: Float64Array,
  nodes: Float64Array,
  dose: number,
  before: readonly Contribution[],
  source: Source | null,
): Contribution[] {
  const own = before.filter((part) => part.dopant === dopant);
  const newest = Math.max(
    ...own.map(({ stepIndex }) => stepIndex),
    source?.dopant === dopant ? source.stepIndex : 0,
  );
  const positive = concentration.map((value) => Math.max(value, NOTHING));
  const raw = table(nodes, positive);
  const scale = dose > 0 ? dose / doseOf(raw, Number.POSITIVE_INFINITY) : 1;
  const shape = table(
    nodes,
    positive.map((value) => value * scale),
  );
  const end = nodes[nodes.length - 1];
  const below = own.filter(({ stepIndex }) => stepIndex === 0).map(({ shape: of }) => evaluator(of)(end));
  return [
    { dopant, shape, stepIndex: newest },
    ...below.map((value) => ({
      dopant,
      shape: uniform(value, end + SEAM, Number.POSITIVE_INFINITY),
      stepIndex: 0,
    })),
  ];
}
