/**
 * Diffusion over a heat treatment with steps as long as the error allows: each step is taken once whole and twice by halves, whose
 * difference tells the error and whose combination removes its first order.
 */

import {
  type DiffusionSystem,
  differenceOf,
  type Species,
  type StepConditions,
  type Tolerance,
} from './system';

const FIRST_PART = 1e-5;
const MOST_STEPS = 20_000;

/**
 * Advances `species` in place over `duration` (s); `at` gives the conditions at a time from the start.
 * @returns the number of steps taken.
 * @throws Error when the steps become absurdly short, which would be a defect.
 */
export function integrateDiffusion(
  system: DiffusionSystem,
  species: readonly Species[],
  duration: number,
  at: (time: number) => StepConditions,
  tolerance: Tolerance,
): number {
  let time = 0;
  let step = duration * FIRST_PART;
  let taken = 0;
  for (let tries = 0; time < duration; tries++) {
    if (tries > MOST_STEPS) throw new Error('the diffusion did not get through its time');
    step = Math.min(step, duration - time);
    const before = species.map(({ concentration }) => concentration);
    const middle = at(time + step / 2);
    const end = at(time + step);
    const half = system.advance(species, before, before, step / 2, middle, tolerance);
    const two = half && system.advance(species, half, half, step / 2, end, tolerance);
    const one = two && system.advance(species, before, two, step, end, tolerance);
    if (!one || !two) {
      step /= 4;
      continue;
    }
    const error = differenceOf(system.depth, one, two, tolerance);
    if (error > 4) {
      step *= Math.max(0.2, 0.9 / Math.sqrt(error));
      continue;
    }
    species.forEach((each, k) => {
      each.concentration = extrapolated(one[k], two[k]);
    });
    time += step;
    taken++;
    step *= Math.min(3, Math.max(0.3, 0.9 / Math.sqrt(Math.max(error, 1e-12))));
  }
  return taken;
}

/** 2 two - one where that stays positive everywhere; the halves alone, which always are, where it does not. */
function extrapolated(one: Float64Array, two: Float64Array): Float64Array {
  const better = two.map((value, i) => 2 * value - one[i]);
  return better.every((value) => value >= 0) ? better : two;
}
