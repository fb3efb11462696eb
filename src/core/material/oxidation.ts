/** Growth of thermal oxide: x^2 + A x = B (t + tau). */

import { BOLTZMANN_EV } from './constants';

export type OxidationAmbient = 'dry' | 'wet';
export type Orientation = '100' | '111';

interface Rate {
  /** um^2/h or um/h */
  readonly factor: number;
  /** eV */
  readonly Ea: number;
}

/**
 * B. E. Deal and A. S. Grove, J. Appl. Phys. 36, 3770 (1965), as R. C. Jaeger, Introduction to Microelectronic Fabrication, Table 3.1, lists
 * them (from memory): dry oxygen with 25 nm that grow at once, steam of 640 Torr.
 */
const PARABOLIC: Record<OxidationAmbient, Rate> = {
  dry: { factor: 772, Ea: 1.23 },
  wet: { factor: 386, Ea: 0.78 },
};
const LINEAR: Record<OxidationAmbient, Record<Orientation, Rate>> = {
  dry: { '100': { factor: 3.71e6, Ea: 2.0 }, '111': { factor: 6.23e6, Ea: 2.0 } },
  wet: { '100': { factor: 9.7e7, Ea: 2.05 }, '111': { factor: 1.63e8, Ea: 2.05 } },
};
/** um of oxide that dry oxygen grows at once. */
const AT_ONCE: Record<OxidationAmbient, number> = { dry: 0.025, wet: 0 };

/** Temperatures the rates hold for, K (700 to 1200 C, from memory). */
export const OXIDATION_RANGE: readonly [number, number] = [973.15, 1473.15];
/** Silicon that goes into a thickness of oxide. */
export const CONSUMED = 0.44;

const UM_PER_CM = 1e4;
const SECONDS_PER_HOUR = 3600;

/**
 * Thickness after `time` (s) at `temperature` (K) on a surface that has `initial` (cm) of oxide already, cm.
 * Growth below the 25 nm of dry oxygen is faster than the law says and is not described by it.
 */
export function oxideThickness(
  ambient: OxidationAmbient,
  orientation: Orientation,
  temperature: number,
  time: number,
  initial: number,
): number {
  if (time <= 0) return initial;
  const at = ({ factor, Ea }: Rate): number => factor * Math.exp(-Ea / (BOLTZMANN_EV * temperature));
  const B = at(PARABOLIC[ambient]);
  const A = B / at(LINEAR[ambient][orientation]);
  const start = Math.max(initial * UM_PER_CM, AT_ONCE[ambient]);
  const tau = (start * start + A * start) / B;
  const hours = time / SECONDS_PER_HOUR + tau;
  return ((A / 2) * (Math.sqrt(1 + (4 * B * hours) / (A * A)) - 1)) / UM_PER_CM;
}
