/** What implants into a crystal do that neither amorphous ranges nor a constant diffusivity know: said once for a recipe. */

import { ZERO_CELSIUS } from '../material/constants';
import { dopantOf } from '../material/dopants';
import { OXIDATION_RANGE } from '../material/oxidation';
import type { Warning } from '../study/problem';
import type { OxidationStep, RecipeStep } from '../study/recipe';
import { hottest } from './heat';

/** Below this, K, damage speeds diffusion up for as long as a furnace anneal lasts. */
const TRANSIENT_BELOW = 950 + ZERO_CELSIUS;

/**
 * Channelling and transient enhanced diffusion, both for boron and phosphorus, which travel on interstitial sites.
 * Both remarks are common knowledge of the field; temperatures from memory.
 */
export function implantRemarks(steps: readonly RecipeStep[]): Warning[] {
  const isFast = (step: RecipeStep): boolean =>
    step.kind === 'implant' && ['boron', 'phosphorus'].includes(dopantOf(step.species));
  const first = steps.findIndex(isFast);
  if (first < 0) return [];
  const warnings: Warning[] = [
    {
      code: 'amorphous-ranges',
      message:
        'implants are computed for amorphous silicon: in a crystal some boron or phosphorus channels deeper, from about a thousandth of the peak down',
      step: steps[first].index,
    },
  ];
  const heat = steps.slice(first).find((step) => step.kind === 'anneal');
  if (heat && hottest(heat) < TRANSIENT_BELOW)
    warnings.push({
      code: 'transient-diffusion',
      message:
        'implant damage can move boron and phosphorus several times further than this in an anneal below 950 °C (transient enhanced diffusion), which is not computed',
      step: heat.index,
    });
  return warnings;
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
