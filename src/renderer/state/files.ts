/** Studies and tables between the window and files: new, open, save, drop, import. */

import { batch, signal } from '@preact/signals';
import { InputProblem, parseStudy, type Study, writeStudy } from '../../core/index';
import type { OpenedDocument } from '../../main/bridge';
import { startTableReader } from '../import/tableReader';
import { bridge } from './bridge';
import { ask } from './confirm';
import { emptyStudy, markSaved, place, startWith, study, unsaved } from './studySession';
import { chosenWindow, crosshair_um, say, sayError } from './viewState';

/** The table whose import sheet is open. */
export const importing = signal<{ readonly name: string; readonly bytes: Uint8Array } | null>(null);

const TABLE_ENDINGS = /\.(csv|txt|tsv|dat|prn|asc)$/i;

export const inWords = (error: unknown): string =>
  error instanceof InputProblem ? error.oneLine : error instanceof Error ? error.message : String(error);

/** A file name for the study: its name without what file systems refuse. */
export function fileNameFor(name: string, ending: string): string {
  const safe = [...name].map((sign) => (sign < ' ' || '/\\:*?"<>|'.includes(sign) ? '-' : sign)).join('');
  return `${safe.trim().slice(0, 80) || 'study'}.${ending}`;
}

function show(opened: Study, where: { id: string | null; fileName: string | null }, isSaved: boolean): void {
  batch(() => {
    chosenWindow.value = null;
    crosshair_um.value = null;
    importing.value = null;
    startWith(opened, where, isSaved);
  });
}

/** Asks what to do with unsaved work; true when the way is free. */
async function mayLeave(): Promise<boolean> {
  if (!unsaved.value) return true;
  const answer = await ask('Unsaved changes', `“${study.value.name}” has changes that are not saved.`, [
    { value: 'save', name: 'Save' },
    { value: 'cancel', name: 'Cancel' },
    { value: 'discard', name: 'Discard changes', grave: true },
  ]);
  return answer === 'save' ? save() : answer === 'discard';
}

export async function newStudy(): Promise<void> {
  if (!(await mayLeave())) return;
  show(emptyStudy(), { id: null, fileName: null }, true);
  say('New study');
}

/** Opens a study that comes with the program; it has no file of its own yet. */
export async function openDemo(text: string): Promise<void> {
  if (!(await mayLeave())) return;
  show(parseStudy(text), { id: null, fileName: null }, true);
}

export async function openStudy(): Promise<void> {
  if (!(await mayLeave())) return;
  const outcome = await bridge.openStudy();
  if (!outcome.ok) sayError(outcome.message);
  else if (outcome.value) await openDocument(outcome.value);
}

/** Opens the study another start of the program was given. True when there was one. */
export async function openGiven(): Promise<boolean> {
  if (!(await mayLeave())) return false;
  const outcome = await bridge.initialStudy();
  if (!outcome.ok) sayError(outcome.message);
  return outcome.ok && outcome.value !== null && openDocument(outcome.value);
}

/** False when the study cannot be used; what was open stays. */
async function openDocument({ id, name, text, tables }: OpenedDocument): Promise<boolean> {
  try {
    const parsed = parseStudy(text, name);
    const resolved = await withTables(parsed, tables);
    if (!resolved.ok) throw new Error(resolved.message);
    show(resolved.value, { id: id || null, fileName: name }, true);
    say(`Opened ${name}`);
    return true;
  } catch (error) {
    sayError(`Not opened: ${inWords(error)}`);
    return false;
  }
}

async function withTables(parsed: Study, tables: OpenedDocument['tables']) {
  if (!parsed.steps.some((step) => step.step === 'table' && step.file !== undefined && !step.disabled))
    return { ok: true as const, value: parsed };
  const reader = startTableReader();
  try {
    return await reader.tables.resolve(parsed, tables);
  } finally {
    reader.end();
  }
}

/** True when the study is saved. */
export async function save(as = false): Promise<boolean> {
  const saving = study.value;
  const { id, fileName } = place.value;
  const outcome = await bridge.saveStudy({
    id,
    suggestedName: fileName ?? fileNameFor(saving.name, 'json'),
    text: writeStudy(saving),
    as,
  });
  if (!outcome.ok) {
    sayError(`Not saved: ${outcome.message}`);
    return false;
  }
  if (outcome.value === null) return false;
  markSaved(saving, { id: outcome.value.id || null, fileName: outcome.value.name });
  say(`Saved ${outcome.value.name}`);
  return true;
}

export async function importTable(): Promise<void> {
  const outcome = await bridge.openTable();
  if (!outcome.ok) sayError(outcome.message);
  else if (outcome.value) importing.value = outcome.value;
}

/** A file dropped on the window: a study is opened, anything else is looked at as a table. */
export async function takeDropped(files: FileList): Promise<void> {
  const file = files[0];
  if (!file) return;
  if (files.length > 1) say(`One file at a time: ${file.name} is taken`);
  if (/\.json$/i.test(file.name)) {
    if (await mayLeave())
      await openDocument({ id: '', name: file.name, text: await file.text(), tables: {} });
  } else if (TABLE_ENDINGS.test(file.name) || file.type.startsWith('text/') || file.type === '')
    importing.value = { name: file.name, bytes: new Uint8Array(await file.arrayBuffer()) };
  else sayError(`${file.name} is neither a study (.json) nor a text table (.csv, .txt, .tsv, .dat)`);
}
