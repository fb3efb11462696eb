/** Finding the table inside the text: which delimiter, which lines, how many fields. */

import { TABLE_DELIMITERS, type TableDelimiter } from '../names';
import { InputProblem } from '../problem';
import { commentOf, fieldsOf, filledLength } from './fields';
import type { Lines } from './lines';
import { looksNumeric, wordOf } from './numbers';

/** Fewest rows that make a table. */
const FEWEST_ROWS = 3;
/** Lines looked at to choose the delimiter. */
const SAMPLE = 5000;

export interface Block {
  delimiter: TableDelimiter;
  /** Lines from 0, the last one included. */
  first: number;
  last: number;
  /** Fields of every row. */
  width: number;
  /** Other runs of rows in the same text, left out. */
  others: { first: number; last: number }[];
}

/**
 * The longest run of rows with one number of fields; blank lines, comments and single damaged rows do not end a run, free
 * text and rows of another width do.
 * @throws InputProblem when there is no such run of at least three rows.
 */
export function findBlock(
  lines: Lines,
  wanted: TableDelimiter | undefined,
  skip: number,
  file?: string,
): Block {
  const delimiter = wanted ?? likeliestDelimiter(lines, skip);
  const runs = delimiter ? runsOfRows(lines, delimiter, skip, lines.count) : [];
  const longest = runs.reduce((best, run) => (run.rows > best.rows ? run : best), NO_RUN);
  if (!delimiter || longest.rows < FEWEST_ROWS)
    throw new InputProblem(
      `no table found: ${longest.rows === 0 ? 'no row' : `only ${longest.rows} rows`} with two or more columns of numbers; ` +
        `at least ${FEWEST_ROWS} are needed, delimited by tab, semicolon, comma, pipe or spaces`,
      { file, line: longest.rows > 0 ? longest.first + 1 : undefined },
    );
  const others = runs.filter((run) => run !== longest && run.rows >= FEWEST_ROWS);
  return { delimiter, first: longest.first, last: longest.last, width: longest.width, others };
}

interface Run {
  first: number;
  last: number;
  width: number;
  rows: number;
  /** Sum over the rows of the share of fields that are no words. */
  values: number;
}
const NO_RUN: Run = { first: 0, last: -1, width: 0, rows: 0, values: 0 };

/**
 * The delimiter under which most lines of a sample are rows of one width, each counted by its share of fields that are values:
 * a wrong delimiter leaves words behind. Ties go in the order of the list.
 */
function likeliestDelimiter(lines: Lines, skip: number): TableDelimiter | undefined {
  const end = Math.min(lines.count, skip + SAMPLE);
  let best: TableDelimiter | undefined;
  let most = 0;
  for (const delimiter of TABLE_DELIMITERS) {
    const values = runsOfRows(lines, delimiter, skip, end).reduce((top, run) => Math.max(top, run.values), 0);
    if (values > most) {
      most = values;
      best = delimiter;
    }
  }
  return best;
}

function runsOfRows(lines: Lines, delimiter: TableDelimiter, from: number, to: number): Run[] {
  const runs: Run[] = [];
  let run: Run | undefined;
  /** Rows of another width seen since the run's last row: three of them are a table of their own. */
  let rival: Run | undefined;
  const close = (): void => {
    if (run) runs.push(run);
    run = rival;
    rival = undefined;
  };
  for (let i = from; i < to; i++) {
    const line = lines.at(i);
    if (commentOf(line, delimiter) !== undefined) continue;
    const fields = fieldsOf(line, delimiter);
    const { kind, values } = rowKind(fields);
    if (kind === 'row') {
      if (!run) run = newRun(i, fields.length, values);
      else if (fields.length === run.width) {
        extend(run, i, values);
        rival = undefined;
      } else if (rival?.width === fields.length) {
        extend(rival, i, values);
        if (rival.rows >= FEWEST_ROWS || run.rows < FEWEST_ROWS) close();
      } else rival = newRun(i, fields.length, values);
    } else if (kind === 'text' && run) {
      close();
      close();
    }
  }
  close();
  close();
  return runs;
}

function newRun(line: number, width: number, values: number): Run {
  return { first: line, last: line, width, rows: 1, values };
}

function extend(run: Run, line: number, values: number): void {
  run.last = line;
  run.rows++;
  run.values += values;
}

/** `row`: two or more values of which one is a number, or one number among blanks; `damaged`: a number among words. */
function rowKind(fields: readonly string[]): { kind: 'row' | 'damaged' | 'text' | 'blank'; values: number } {
  let numbers = 0;
  let marks = 0;
  let words = 0;
  for (const field of fields) {
    if (field === '') continue;
    if (looksNumeric(field)) numbers++;
    else if (wordOf(field) === 'text') words++;
    else marks++;
  }
  const values = 1 - words / fields.length;
  if (numbers + marks + words === 0) return { kind: 'blank', values };
  if (numbers === 0) return { kind: words === 0 ? 'damaged' : 'text', values };
  const enough = fields.length >= 2 && (numbers + marks >= 2 || words === 0);
  return { kind: enough ? 'row' : 'damaged', values };
}

/** Whether a line belongs to another run of rows of the same text. */
export function inOtherRun(block: Block, line: number): boolean {
  return block.others.some(({ first, last }) => line >= first && line <= last);
}

/** Rows may end in blank fields that the heading lacks: the width that carries anything in the first rows. */
export function filledWidth(lines: Lines, block: Block): number {
  let width = 0;
  const end = Math.min(block.last, block.first + SAMPLE);
  for (let i = block.first; i <= end; i++)
    width = Math.max(width, filledLength(fieldsOf(lines.at(i), block.delimiter)));
  return Math.min(width, block.width);
}
