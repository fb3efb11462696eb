/** Keeps a copy of unsaved work outside the user's file, and offers what an earlier session left behind. */

import { effect, signal } from '@preact/signals';
import { parseStudy, writeStudy } from '../../core/index';
import { bridge } from './bridge';
import { inWords } from './files';
import { startWith, study, unsaved } from './studySession';
import { sayError } from './viewState';

export const leftBehind = signal<{ name: string; text: string; savedAt: string } | null>(null);

const PAUSE_MS = 2000;

async function keep(): Promise<void> {
  const { name } = study.value;
  const outcome = await bridge.keepRecovery({ name, text: unsaved.value ? writeStudy(study.value) : null });
  if (!outcome.ok) sayError(outcome.message);
}

/** Copies the study two seconds after the last edit, and drops the copy once the study is saved. */
export function keepWork(): void {
  let timer: ReturnType<typeof setTimeout> | undefined;
  let wasUnsaved = false;
  effect(() => {
    void study.value;
    clearTimeout(timer);
    // An offer that is not answered yet must not be overwritten by the study that opened meanwhile.
    if (leftBehind.value) return;
    if (unsaved.value) timer = setTimeout(keep, PAUSE_MS);
    else if (wasUnsaved) void keep();
    wasUnsaved = unsaved.value;
  });
}

export async function lookForLeftBehind(): Promise<void> {
  const outcome = await bridge.takeRecovery();
  if (outcome.ok) leftBehind.value = outcome.value;
  else sayError(outcome.message);
}

export function restore(): void {
  const left = leftBehind.value;
  if (!left) return;
  try {
    startWith(parseStudy(left.text), { id: null, fileName: null }, false);
    leftBehind.value = null;
  } catch (error) {
    sayError(`The kept copy cannot be used: ${inWords(error)}`);
  }
}

export function discard(): void {
  leftBehind.value = null;
  void keep();
}
