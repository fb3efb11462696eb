/** The study's solution: asked of the worker at every change, shown only while it belongs to the newest study. */

import { batch, computed, effect, signal } from '@preact/signals';
import * as Comlink from 'comlink';
import type { Solution, Study, StudyProblem } from '../../core/index';
import type { Calculations, Solved } from '../worker';
import { latestWins } from './latest';
import { study } from './studySession';

/** A solution with the study it belongs to. */
export interface Shown {
  readonly runId: number;
  readonly study: Study;
  readonly solution: Solution;
  readonly milliseconds: number;
}

/** After this long without an answer the readings are greyed. */
const BUSY_AFTER_MS = 100;

const worker = new Worker(new URL('../worker.ts', import.meta.url), { type: 'module' });
export const calculations = Comlink.wrap<Calculations>(worker);

export const shown = signal<Shown | null>(null);
/** Why the newest study has no solution; null when it has one. */
export const solveProblem = signal<StudyProblem | null>(null);
export const slow = signal(false);
/** True when what is shown is the solution of an earlier study. */
export const outdated = computed(() => slow.value || solveProblem.value !== null);

let slowTimer: ReturnType<typeof setTimeout> | undefined;

function show(answer: Solved, solvedStudy: Study, runId: number): void {
  clearTimeout(slowTimer);
  slowTimer = undefined;
  batch(() => {
    slow.value = false;
    if (answer.ok) {
      const { solution, milliseconds } = answer;
      shown.value = { runId, study: solvedStudy, solution, milliseconds };
      solveProblem.value = null;
    } else solveProblem.value = { key: answer.key, message: answer.message };
  });
}

const crashed = (error: unknown): Solved => ({
  ok: false,
  key: '',
  message: `the calculation stopped: ${error instanceof Error ? error.message : String(error)}`,
});

const runner = latestWins<Study, Solved>((next) => calculations.solve(next).catch(crashed), show);

/** Begins to follow the study. */
export function followStudy(): void {
  effect(() => {
    const next = study.value;
    performance.mark('ohmstrata:edit');
    runner.ask(next);
    slowTimer ??= setTimeout(() => {
      slow.value = true;
    }, BUSY_AFTER_MS);
  });
}
