/** The open study: its draft with undo and redo, where it is saved, and whether it differs from what is saved. */

import { batch, computed, signal } from '@preact/signals';
import {
  type Dopant,
  type ImplantSpecies,
  type Study,
  type StudyProblem,
  studyProblems,
} from '../../core/index';
import { type Draft, draftOf, withStudy } from './draft';
import {
  change,
  giveUp,
  type History,
  redo,
  redoLabel,
  seal,
  startHistory,
  undo,
  undoLabel,
} from './history';
import { valueAt, withValueAt } from './path';

interface Place {
  /** The main process's name for the file; null when never saved. */
  readonly id: string | null;
  /** File name to show; null when never saved. */
  readonly fileName: string | null;
}

const history = signal<History<Draft>>(startHistory(draftOf(emptyStudy())));
/** The study as last saved or opened: by identity, so undoing back to it counts as saved. */
const savedStudy = signal<Study | null>(history.value.present.study);

export const place = signal<Place>({ id: null, fileName: null });
export const draft = computed(() => history.value.present);
export const study = computed(() => draft.value.study);
/** The dopants that the wafer and the steps bring, each once. */
export const shownDopants = computed<Dopant[]>(() => {
  const { wafer, steps } = study.value;
  const of = steps.flatMap((step) => ('dopant' in step && step.dopant ? [dopantOf(step.dopant)] : []));
  return [...new Set([wafer.dopant, ...of])];
});
export const unsaved = computed(() => savedStudy.value !== study.value);
export const undoName = computed(() => undoLabel(history.value));
export const redoName = computed(() => redoLabel(history.value));
/** Grows with every opening, undo and redo: fields drop what is typed in them. */
export const rewrites = signal(0);

export function emptyStudy(): Study {
  return {
    format: 'ohmstrata-study/1',
    name: 'untitled study',
    temperature_C: 25,
    wafer: {
      material: 'silicon',
      dopant: 'phosphorus',
      concentration_cm3: 1e15,
      thickness_um: 525,
      orientation: '100',
    },
    steps: [],
    models: {
      mobility: 'klaassen',
      carriers: 'poisson',
      ionisation: 'complete',
      statistics: 'boltzmann',
      narrowing: 'none',
      activation: 'full',
      ranges: 'universal',
      diffusivity: 'fair1981',
      diffusion: 'constant',
    },
  };
}

/** Starts over with another study; there is nothing to undo in it. */
export function startWith(opened: Study, where: Place, isSaved: boolean): void {
  batch(() => {
    history.value = startHistory(draftOf(opened));
    place.value = where;
    savedStudy.value = isSaved ? study.value : null;
    rewrites.value++;
  });
}

export function markSaved(saved: Study, where: Place): void {
  batch(() => {
    savedStudy.value = saved;
    place.value = where;
  });
}

/** A whole edit: one undo step. */
export function edit(label: string, apply: (draft: Draft) => Draft): void {
  const after = apply(draft.value);
  if (after !== draft.value) history.value = change(history.value, after, label);
}

/** Sets one value while it is being typed or stepped; a refused value leaves the study alone and says why. */
export function tryValue(path: string, value: unknown, label: string): StudyProblem[] {
  return Object.is(valueAt(study.value, path), value)
    ? []
    : tryStudy(withValueAt(study.value, path, value), path, label);
}

/** The same for an edit of several values, kept open under `key` until `finishEdit`. */
function tryStudy(next: Study, key: string, label: string): StudyProblem[] {
  const problems = studyProblems(withoutTableData(next));
  if (problems.length === 0) history.value = change(history.value, withStudy(draft.value, next), label, key);
  return problems;
}

/** What was typed at `path` becomes one undo step, or none when it came back to where it began. */
export function finishEdit(path: string): void {
  const { openKey, past } = history.value;
  const before = past.at(-1)?.before.study;
  if (openKey === path && Object.is(valueAt(before, path), valueAt(study.value, path))) cancelEdit(path);
  else history.value = seal(history.value);
}

/** Takes back what was typed at `path` since the last finished edit. */
export function cancelEdit(path: string): void {
  history.value = giveUp(history.value, path);
}

export const undoEdit = (): void => rewrite(undo);
export const redoEdit = (): void => rewrite(redo);

function rewrite(apply: (current: History<Draft>) => History<Draft>): void {
  batch(() => {
    history.value = apply(history.value);
    rewrites.value++;
  });
}

const dopantOf = (species: ImplantSpecies): Dopant => (species === 'BF2' ? 'boron' : species);

/** Embedded tables were checked when they came in and are not edited; leaving them out keeps checks instant. */
function withoutTableData(next: Study): Study {
  const steps = next.steps.map((step) =>
    step.step === 'table' && step.depth_um ? { ...step, depth_um: [0, 1], concentration_cm3: [1, 1] } : step,
  );
  return { ...next, steps };
}
