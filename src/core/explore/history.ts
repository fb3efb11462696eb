/** What a wafer would read after every step of its recipe, and how far heat has moved its dopants by then. */

import { DOPANT_FACTS } from '../material/dopants';
import { solve } from '../solve';
import type { Study } from '../study/schema';

export interface HistoryLayer {
  index: number;
  type: 'n' | 'p';
  bottom_um: number;
  sheetResistance_ohmSq: number;
}

export interface HistoryEntry {
  /** Position of the step in the document, from 1; 0 for the wafer before any step. */
  step: number;
  title: string;
  layers: HistoryLayer[];
  /** sqrt(sum of Dt) of every dopant over the heat so far, um, by symbol, accepted transients included: with the constant diffusivities of the set. */
  diffusionLength_um: Record<string, number>;
}

export interface HistoryResult {
  format: 'ohmstrata-history/1';
  study: string;
  entries: HistoryEntry[];
}

const UM_PER_CM = 1e4;

/**
 * Solves the study after none, one, two ... of its enabled steps. What is implanted and not annealed yet reads as if it were active.
 * @throws InputProblem when a table step still names a file.
 */
export function recipeHistory(study: Study): HistoryResult {
  const enabled = study.steps.flatMap((step, i) => (step.disabled ? [] : [i]));
  const Dt = new Map<string, number>();
  const entries = [-1, ...enabled].map((last): HistoryEntry => {
    const { layers, steps } = solve({ ...study, steps: study.steps.slice(0, last + 1) }).result;
    const report = steps.find(({ index }) => index === last + 1);
    for (const [name, value] of Object.entries(report?.figures ?? {})) {
      const symbol = /^(?:Dt|transientDt)_(\w+)_cm2$/.exec(name)?.[1];
      if (symbol && typeof value === 'number') Dt.set(symbol, (Dt.get(symbol) ?? 0) + value);
    }
    return {
      step: last + 1,
      title: report?.title ?? `wafer, ${DOPANT_FACTS[study.wafer.dopant].symbol}`,
      layers: layers.map(({ index, type, bottom_um, sheetResistance_ohmSq }) => ({
        index,
        type,
        bottom_um,
        sheetResistance_ohmSq,
      })),
      diffusionLength_um: Object.fromEntries(
        [...Dt].map(([symbol, value]) => [symbol, Math.sqrt(value) * UM_PER_CM]),
      ),
    };
  });
  return { format: 'ohmstrata-history/1', study: study.name, entries };
}
