/** What implants into a crystal do that neither amorphous ranges nor a constant diffusivity know: said once for a recipe. */

import { ZERO_CELSIUS } from '../material/constants';
import { dopantOf } from '../material/dopants';
import type { Warning } from '../study/problem';
import type { RecipeStep } from '../study/recipe';
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
