/** What implants into a crystal do that neither amorphous ranges nor a constant diffusivity know: said where it bears on a recipe. */

import { ZERO_CELSIUS } from '../material/constants';
import { DOPANT_FACTS, type Dopant, dopantOf } from '../material/dopants';
import { OXIDATION_RANGE } from '../material/oxidation';
import type { Warning } from '../study/problem';
import type { ImplantStep, OxidationStep, RecipeStep } from '../study/recipe';
import { BORON_TAIL } from './channelling';
import { short } from './report';

const NM_PER_CM = 1e7;

/** Channelling, for boron and phosphorus (common knowledge of the field), and what stands in for it: each said once. */
export function implantRemarks(steps: readonly RecipeStep[]): Warning[] {
  const implants = steps.filter(
    (step): step is ImplantStep =>
      step.kind === 'implant' && ['boron', 'phosphorus'].includes(dopantOf(step.species)),
  );
  const bare = implants.find((step) => !step.hasTail);
  const tailed = implants.find((step) => step.hasTail);
  return [
    ...(bare
      ? [
          {
            code: 'amorphous-ranges',
            message:
              'implants are computed for amorphous silicon: in a crystal some boron or phosphorus channels deeper, from about a thousandth of the peak down',
            step: bare.index,
          },
        ]
      : []),
    ...(tailed
      ? [
          {
            code: 'channelling-tail',
            message: `an exponential tail with one decay length (${short(BORON_TAIL * NM_PER_CM)} nm) stands in for channelling: the real one hangs on tilt, twist, screen and dose`,
            step: tailed.index,
          },
        ]
      : []),
  ];
}

/**
 * What implant damage does in the first heat after it: the estimate, offered where the step has not
 * accepted it, and said to be an estimate where it has.
 * @param extraDt cm^2 of each dopant that damage moves; empty without damage.
 */
export function transientRemarks(
  step: RecipeStep,
  isAccepted: boolean,
  extraDt: ReadonlyMap<Dopant, number>,
): Warning[] {
  if (extraDt.size === 0)
    return isAccepted
      ? [
          {
            code: 'transient-nothing',
            message:
              'no implant damage can move boron or phosphorus here: neither was there, or no implant came since the last heat; the "+1" estimate adds nothing',
            step: step.index,
          },
        ]
      : [];
  const lengths = [...extraDt].map(
    ([dopant, Dt]) =>
      `${DOPANT_FACTS[dopant].symbol} ${short(Number((Math.sqrt(Dt) * NM_PER_CM).toPrecision(2)))} nm`,
  );
  const estimate = `√Dt ${lengths.join(', ')}, the Dt within a factor of about three`;
  if (isAccepted)
    return [
      {
        code: 'transient-estimate',
        message: `holds an estimate of transient enhanced diffusion by implant damage ("+1": ${estimate}, for doses that do not amorphise): do not release product on it`,
        step: step.index,
      },
    ];
  return [
    {
      code: 'transient-diffusion',
      message: `implant damage moves boron and phosphorus further than this below 950 °C (transient enhanced diffusion), which is not computed; the "+1" estimate is ${estimate}${step.kind === 'anneal' ? ': the step can take it in' : ''}`,
      step: step.index,
    },
  ];
}

/** What growing oxide does that is not computed, and where its rate is extrapolated. */
export function oxidationWarnings({ temperature, index }: OxidationStep): Warning[] {
  const [low, high] = OXIDATION_RANGE;
  const warnings: Warning[] = [
    {
      code: 'oxidation-redistribution',
      message:
        'oxidation draws boron into the oxide, piles phosphorus and arsenic up before it and speeds the diffusion of boron and phosphorus up: none of this is computed, only the silicon that is consumed',
      step: index,
    },
  ];
  if (temperature < low || temperature > high)
    warnings.push({
      code: 'oxidation-range',
      message: `the growth of oxide is extrapolated outside ${low - ZERO_CELSIUS} to ${high - ZERO_CELSIUS} °C`,
      step: index,
    });
  return warnings;
}
