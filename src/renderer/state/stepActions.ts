/** What a person does to whole steps; each is one undo step, and the focus follows. */

import type { StudyStep } from '../../core/index';
import { duplicateStep, insertSteps, moveStep, removeStep, toggleStep } from './draft';
import { STEP_KINDS } from './stepKinds';
import { draft, edit, study } from './studySession';
import { focusRequest, focusStep, say } from './viewState';

const nameOf = (at: number): string => {
  const step = study.value.steps[at];
  return step.label || STEP_KINDS[step.step].title.toLowerCase();
};

export function add(step: StudyStep): void {
  const at = study.value.steps.length;
  edit(`adding ${STEP_KINDS[step.step].title.toLowerCase()}`, (before) => insertSteps(before, at, [step]));
  focusStep(draft.value.stepIds[at], `steps[${at}]`);
}

/** Adds steps below the others, such as the profiles of a table. */
export function addAll(steps: readonly StudyStep[], label: string): void {
  edit(label, (before) => insertSteps(before, before.study.steps.length, steps));
  focusRequest.value = `steps[${study.value.steps.length - 1}]`;
}

export function move(from: number, to: number): void {
  if (to < 0 || to >= study.value.steps.length || from === to) return;
  const name = nameOf(from);
  edit(`moving ${name}`, (before) => moveStep(before, from, to));
  focusRequest.value = `steps[${to}]`;
  say(`${name} is now step ${to + 1} of ${study.value.steps.length}`);
}

export function remove(at: number): void {
  const name = nameOf(at);
  edit(`removing ${name}`, (before) => removeStep(before, at));
  const left = study.value.steps.length;
  focusRequest.value = left === 0 ? 'add' : `steps[${Math.min(at, left - 1)}]`;
  say(`${name} removed; undo brings it back`);
}

export function toggle(at: number): void {
  const { disabled } = study.value.steps[at];
  edit(`switching ${nameOf(at)} ${disabled ? 'on' : 'off'}`, (before) => toggleStep(before, at));
}

export function duplicate(at: number): void {
  edit(`duplicating ${nameOf(at)}`, (before) => duplicateStep(before, at));
  focusStep(draft.value.stepIds[at + 1], `steps[${at + 1}]`);
}
