/** What is to be said about the carriers at a temperature. */

import { INTRINSIC_RANGE, INTRINSIC_SOURCE } from '../material/intrinsic';
import { densitiesOfStates } from '../material/silicon';
import type { SampledDoping } from '../profile/doping';
import type { Warning } from '../study/problem';
import type { CarrierChoice } from './carriers';
import { hasLevel } from './ionisation';
import type { CarrierState } from './state';

/** A remark when `temperature` (K) lies outside the measurements behind the intrinsic density. */
export function intrinsicWarnings(temperature: number): Warning[] {
  const [low, high] = INTRINSIC_RANGE;
  if (temperature >= low && temperature <= high) return [];
  return [
    {
      code: 'intrinsic-range',
      message: `intrinsic density at ${temperature.toFixed(1)} K is extrapolated: ${INTRINSIC_SOURCE} measured ${low} to ${high} K`,
    },
  ];
}

/** What is to be said of how the carriers were found; `asked` is the ionisation the study names. */
export function carrierWarnings(
  { carriers, ionisation, temperature, reverseBias }: CarrierChoice,
  asked: 'complete' | 'levels',
  doping: SampledDoping,
): Warning[] {
  const warnings = intrinsicWarnings(temperature);
  if (asked === 'levels' && ionisation === 'complete')
    warnings.push({
      code: 'ionisation-implied',
      message: 'this mobility model was made from dopant densities: all active dopants are taken as ionised',
    });
  if (ionisation === 'levels')
    for (const { dopant } of doping.dopants)
      if (!hasLevel(dopant))
        warnings.push({
          code: 'ionisation-no-level',
          message: `no published level of ${dopant} is known here: all of it is taken as ionised`,
        });
  if (carriers === 'neutral' && reverseBias.some((volts) => volts > 0))
    warnings.push({
      code: 'bias-neutral',
      message: 'neutral carriers know no bias: reverseBias_V has no effect with models.carriers "neutral"',
    });
  return warnings;
}

/**
 * A remark when a charged surface piles up more carriers than the band has states and the stack has dopants: Boltzmann statistics
 * then know no bounds.
 */
export function degeneracyWarnings(
  { doping, electrons, holes, temperature }: CarrierState,
  { statistics }: CarrierChoice,
): Warning[] {
  if (statistics !== 'boltzmann') return [];
  const { conduction, valence } = densitiesOfStates(temperature);
  const most = (column: Float64Array): number => column.reduce((a, b) => Math.max(a, b), 0);
  const dopants = Math.max(most(doping.donors), most(doping.acceptors));
  return [
    { kind: 'electrons', peak: most(electrons), states: conduction },
    { kind: 'holes', peak: most(holes), states: valence },
  ]
    .filter(({ peak, states }) => peak > Math.max(states, 2 * dopants))
    .map(({ kind, peak, states }) => ({
      code: 'statistics-range',
      message: `the surface piles up ${peak.toExponential(1)} cm^-3 of ${kind}, more than the band's ${states.toExponential(1)} states: Boltzmann statistics exaggerate there; set models.statistics to "fermi-dirac"`,
    }));
}
