/** What a recipe step says it did. */

import { DOPANT_FACTS, type Dopant } from '../material/dopants';

export interface StepReport {
  /** Position in the document, from 1. */
  index: number;
  kind: string;
  title: string;
  /** Names carry their unit. */
  figures: Record<string, number | string>;
}

export const UM_PER_CM = 1e4;

/** Dt of each dopant present, as figures. */
export function dtFigures(
  present: Iterable<Dopant>,
  DtOf: (dopant: Dopant) => number,
  name = 'Dt',
): Record<string, number> {
  const figures: Record<string, number> = {};
  for (const dopant of present) figures[`${name}_${DOPANT_FACTS[dopant].symbol}_cm2`] = DtOf(dopant);
  return figures;
}

/** Four digits are enough for a title. */
export const short = (value: number): string => String(Number(value.toPrecision(4)));
