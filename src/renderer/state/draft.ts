/**
 * The study being edited together with an identity for each step, and the edits a person can make to it.
 * Every function returns a new draft; nothing is changed in place.
 */

import type { Study, StudyStep } from '../../core/index';

export interface Draft {
  readonly study: Study;
  /** One id a step, same order: what stays with a step while it moves. Never saved. */
  readonly stepIds: readonly number[];
}

/** A copy with `remove` entries at `at` replaced by `added`. */
function spliced<T>(list: readonly T[], at: number, remove: number, ...added: T[]): T[] {
  return [...list.slice(0, at), ...added, ...list.slice(at + remove)];
}

let lastId = 0;
const nextId = (): number => ++lastId;

export const draftOf = (study: Study): Draft => ({ study, stepIds: study.steps.map(nextId) });

/** The same study under another validated value with as many steps. */
export const withStudy = (draft: Draft, study: Study): Draft => ({ ...draft, study });

export function insertSteps(draft: Draft, at: number, steps: readonly StudyStep[]): Draft {
  return {
    study: { ...draft.study, steps: spliced(draft.study.steps, at, 0, ...steps) },
    stepIds: spliced(draft.stepIds, at, 0, ...steps.map(nextId)),
  };
}

export function removeStep(draft: Draft, at: number): Draft {
  return {
    study: { ...draft.study, steps: spliced(draft.study.steps, at, 1) },
    stepIds: spliced(draft.stepIds, at, 1),
  };
}

/** Moves a step so that it ends up at position `to`; the same draft when it cannot move there. */
export function moveStep(draft: Draft, from: number, to: number): Draft {
  if (to < 0 || to >= draft.stepIds.length || from === to) return draft;
  const moved = <T>(list: readonly T[]): T[] => spliced(spliced(list, from, 1), to, 0, list[from]);
  return { study: { ...draft.study, steps: moved(draft.study.steps) }, stepIds: moved(draft.stepIds) };
}

export const duplicateStep = (draft: Draft, at: number): Draft =>
  insertSteps(draft, at + 1, [structuredClone(draft.study.steps[at])]);

export function toggleStep(draft: Draft, at: number): Draft {
  const { disabled, ...rest } = draft.study.steps[at];
  const step = (disabled ? rest : { ...rest, disabled: true }) as StudyStep;
  return { ...draft, study: { ...draft.study, steps: spliced(draft.study.steps, at, 1, step) } };
}
