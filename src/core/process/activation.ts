/** How much of each dopant conducts. */

import type { Dopant } from '../material/dopants';
import { activeLimit } from '../material/solubility';
import type { Activation } from '../profile/doping';
import type { Warning } from '../study/problem';
import type { ActivationChoice } from '../study/recipe';

/**
 * `full`: all of it. Fractions: that part of each dopant named, all of the others. `solubility`: no more than the
 * electrically active limit at the hottest point of the last heat treatment (anneal or predeposition): what a treatment
 * finds above the limit it takes out of solution, what an earlier, hotter one had dissolved included.
 * @param lastHeat K; undefined when nothing was ever heated, which leaves the dopants fully active, with a warning.
 */
export function activation(
  choice: ActivationChoice,
  present: Iterable<Dopant>,
  lastHeat: number | undefined,
): Activation & { readonly warnings: readonly Warning[] } {
  if (choice === 'full') return { fraction: {}, limit: {}, warnings: [] };
  if (choice !== 'solubility') return { fraction: choice, limit: {}, warnings: [] };
  if (lastHeat === undefined)
    return {
      fraction: {},
      limit: {},
      warnings: [
        {
          code: 'activation-no-heat',
          message:
            'activation by solubility needs an anneal or predeposition: without one all dopant counts as active',
        },
      ],
    };
  const limit: Partial<Record<Dopant, number>> = {};
  for (const dopant of present) limit[dopant] = activeLimit(dopant, lastHeat);
  return { fraction: {}, limit, warnings: [] };
}
