/** Tables that a study names in its own folder become data of the study; nothing outside that folder can be named. */

import { sha256Hex } from './hash';
import { InputProblem } from './problem';
import type { Study } from './schema';
import { embedTable, type TableStepDocument } from './table/embed';
import { readTable } from './table/read';
import type { TableReading, TableWarning } from './table/reading';

const LONGEST_NAME = 255;
/** Device names of Windows, whatever their ending. */
const RESERVED = /^(?:con|prn|aux|nul|com[0-9\u00b9\u00b2\u00b3]|lpt[0-9\u00b9\u00b2\u00b3])(?:\.|$)/i;
const FORBIDDEN = '/\\:*?"<>|';

/** Whether a name is a plain file name on every system: no folder, no drive, no device, no control sign, no outer blanks. */
export function safeTableName(name: string): boolean {
  if (name === '' || name.length > LONGEST_NAME || name === '.' || name === '..') return false;
  if (name !== name.trim() || name.endsWith('.') || RESERVED.test(name)) return false;
  return [...name].every((sign) => sign >= ' ' && sign !== '\u007f' && !FORBIDDEN.includes(sign));
}

/**
 * Replaces every `file` table step by its embedded data. Disabled steps stay as they are.
 * @param read gives the bytes of a table by the name the study uses; what it throws is reported beside the step.
 * @param remark receives every warning of a table, with the step's position from 1.
 * @throws InputProblem with the table's file and line and the key of the step.
 */
export function resolveTables(
  study: Study,
  read: (name: string) => Uint8Array,
  remark: (warning: TableWarning, file: string) => void = () => {},
): Study {
  if (!study.steps.some((step) => step.step === 'table' && step.file !== undefined)) return study;
  return {
    ...study,
    steps: study.steps.map((step, i) =>
      step.step === 'table' && step.file !== undefined && !step.disabled
        ? resolveStep(step, step.file, i, read, remark)
        : step,
    ),
  };
}

function resolveStep(
  step: TableStepDocument,
  file: string,
  position: number,
  read: (name: string) => Uint8Array,
  remark: (warning: TableWarning, file: string) => void,
): TableStepDocument {
  const key = `steps[${position}]`;
  if (!safeTableName(file))
    throw new InputProblem(
      `"${file}" is not allowed; name a file in the study's own folder, without any path`,
      { key: `${key}.file` },
    );
  const bytes = bytesOf(file, `${key}.file`, read);
  const reading = located(key, () => readTable(bytes, step.reading, file, step.columns));
  for (const warning of reading.warnings) remark({ ...warning, step: position + 1 }, file);
  const question = reading.questions[0];
  if (question)
    throw new InputProblem(question.message, {
      file,
      line: question.line,
      key: question.kind === 'columns' ? `${key}.columns` : `${key}.reading.${question.kind}`,
    });
  const index = profileFor(step, reading, file, key);
  const source = { name: file, sha256: sha256Hex(bytes) };
  const { file: _file, columns: _columns, reading: _reading, ...kept } = step;
  return { ...kept, ...located(key, () => embedTable(reading, index, source, step.dopant)) };
}

function bytesOf(file: string, key: string, read: (name: string) => Uint8Array): Uint8Array {
  try {
    return read(file);
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    throw new InputProblem(`the table cannot be read: ${message.replace(/\s+/g, ' ')}`, { file, key });
  }
}

/** Adds the key of the step to a problem of the table. */
function located<T>(key: string, run: () => T): T {
  try {
    return run();
  } catch (error) {
    if (!(error instanceof InputProblem)) throw error;
    throw new InputProblem(error.message, { ...error.place, key: `${key}.file` });
  }
}

/** The profile of the step's dopant, or the only one there is when its heading does not speak against it. */
function profileFor(step: TableStepDocument, reading: TableReading, file: string, key: string): number {
  const { profiles } = reading;
  if (profiles.length === 1 && step.columns?.concentration !== undefined) return 0;
  const own = profiles.flatMap((profile, i) => (profile.dopant === step.dopant ? [i] : []));
  if (own.length === 1) return own[0];
  if (own.length === 0 && profiles.length === 1 && profiles[0].dopant === undefined) return 0;
  const headings = profiles.map(({ heading, concentrationColumn }) => `${concentrationColumn} "${heading}"`);
  throw new InputProblem(
    `${own.length === 0 ? 'no column is' : `${own.length} columns are`} recognised as ${step.dopant}; state one of the columns ${headings.join(', ')}`,
    { file, key: `${key}.columns.concentration` },
  );
}
