/** The wafer between two steps of a recipe, and what can be asked of it. */

import type { Dopant } from '../material/dopants';
import type { Contribution } from '../profile/doping';
import { doseOf } from '../profile/shape';
import type { Warning } from '../study/problem';
import type { RecipeStep } from '../study/recipe';
import type { StepReport } from './report';

/** What has become of the wafer so far. */
export interface Wafer {
  contributions: Contribution[];
  /** Hottest point of the last heat treatment, K. */
  lastHeat?: number;
  /** Steps of the implants that no heat has followed yet: their damage is there. */
  damaging: Set<number>;
  addedSilicon: number;
  /** Grown on the wafer and not stripped, cm. */
  oxide: number;
  /** Of the meshes of solved steps. */
  refinement: number;
  reports: StepReport[];
  warnings: Warning[];
}

export function report(step: RecipeStep, wafer: Wafer, title: string, figures: StepReport['figures']): void {
  wafer.reports.push({ index: step.index, kind: step.kind, title, figures });
}

/** What recipe steps and the depth that is solved hold of a dopant, cm^-2; the wafer itself is endless. */
export function doseIn(wafer: Wafer, dopant: Dopant): number {
  return wafer.contributions
    .filter((part) => part.dopant === dopant && !(part.stepIndex === 0 && part.shape.kind === 'uniform'))
    .reduce((sum, { shape }) => sum + doseOf(shape, Number.POSITIVE_INFINITY), 0);
}

export function presentIn(wafer: Wafer): Set<Dopant> {
  return new Set(wafer.contributions.map(({ dopant }) => dopant));
}
