/** What a heat treatment does to the dopants already there: the product Dt, and what a constant D leaves out. */

import { ZERO_CELSIUS } from '../material/constants';
import { DIFFUSIVITY_RANGE, diffusivity } from '../material/diffusivity';
import type { Dopant } from '../material/dopants';
import { processIntrinsicDensity } from '../material/processIntrinsic';
import { gaussLegendre, integratePanels } from '../numeric/gaussLegendre';
import type { Contribution } from '../profile/doping';
import { diffuse, evaluator } from '../profile/shape';
import type { DiffusivitySet } from '../study/names';
import type { Warning } from '../study/problem';
import { short } from './report';

/** A constant temperature, or a linear ramp from one to the other; K and s. */
export interface HeatTreatment {
  readonly temperature: number;
  readonly endTemperature: number;
  readonly time: number;
}

const RULE = gaussLegendre(10);
/** Panels of a ramp: D changes by less than a factor of 40 across one even from room temperature to 1450 C. */
const RAMP_PANELS = 64;
/** Diffusion over less than a tenth of an angstrom moves no atom. */
const SMALLEST_SPREAD = 1e-9;
/** Diffusion of 1 nm is worth a remark. */
const NOTABLE_SPREAD = 1e-7;

export const hottest = (heat: HeatTreatment): number => Math.max(heat.temperature, heat.endTemperature);

/** Integral of D over the treatment, cm^2; a ramp by quadrature over time. */
export function dtOf(set: DiffusivitySet, dopant: Dopant, heat: HeatTreatment): number {
  const { temperature, endTemperature, time } = heat;
  if (temperature === endTemperature) return diffusivity(set, dopant, temperature) * time;
  const at = (part: number): number =>
    diffusivity(set, dopant, temperature + part * (endTemperature - temperature));
  const edges = Array.from({ length: RAMP_PANELS + 1 }, (_, i) => i / RAMP_PANELS);
  return time * integratePanels(at, edges, RULE);
}

/**
 * Diffuses everything by its own Dt behind a sealed surface. Each dopant has one constant diffusivity, so contributions
 * add; the one seat where a solver of the nonlinear equation would take over.
 */
export function heatUp(
  contributions: readonly Contribution[],
  set: DiffusivitySet,
  heat: HeatTreatment,
): Contribution[] {
  return contributions.map((part) => {
    const Dt = dtOf(set, part.dopant, heat);
    return Math.sqrt(2 * Dt) < SMALLEST_SPREAD ? part : { ...part, shape: diffuse(part.shape, Dt) };
  });
}

/**
 * Remarks on a treatment, from the profiles as it finds them: diffusivities extrapolated; dopants above the intrinsic
 * density, which really diffuse faster.
 */
export function heatWarnings(
  contributions: readonly Contribution[],
  set: DiffusivitySet,
  heat: HeatTreatment,
  step: number,
): Warning[] {
  const moving = contributions.filter(
    ({ dopant, stepIndex }) => stepIndex > 0 && Math.sqrt(2 * dtOf(set, dopant, heat)) > NOTABLE_SPREAD,
  );
  if (moving.length === 0) return [];
  const warnings: Warning[] = [];
  const temperature = hottest(heat);
  const celsius = `${short(temperature - ZERO_CELSIUS)} °C`;
  const [low, high] = DIFFUSIVITY_RANGE;
  if (temperature < low || temperature > high)
    warnings.push({
      code: 'diffusivity-range',
      message: `${celsius} is outside the ${low - ZERO_CELSIUS} to ${high - ZERO_CELSIUS} °C of the ${set} diffusivities: they are extrapolated`,
      step,
    });
  const ni = processIntrinsicDensity(temperature);
  const dense = [...new Set(moving.filter((part) => peakOf(part) > ni).map((part) => part.dopant))];
  if (dense.length > 0 && set === 'fair1981')
    warnings.push({
      code: 'extrinsic-diffusion',
      message: `${dense.join(', ')} exceeds the intrinsic density at ${celsius} (${ni.toExponential(1)} cm^-3), above which diffusion is faster than the intrinsic diffusivity used`,
      step,
    });
  return warnings;
}

function peakOf({ shape }: Contribution): number {
  const at = evaluator(shape);
  return Math.max(at(0), ...shape.marks.map(at));
}
