/** The one pass over all rows of a table that turns the wanted columns into numbers. */

import { InputProblem } from '../problem';
import type { Block } from './block';
import { commentOf, fieldsOf } from './fields';
import type { Lines } from './lines';
import { type DecimalSign, parseNumber, wordOf } from './numbers';
import { BELOW, MISSING } from './profile';
import type { TableWarning } from './reading';

export interface Rows {
  /** By column from 0; MISSING and BELOW stand for what is no number. */
  columns: Map<number, Float64Array>;
  /** Line of each row, from 1. */
  lines: Uint32Array;
  warnings: TableWarning[];
}

/** Damaged rows named in a warning. */
const NAMED_LINES = 5;

interface Signs {
  decimal: DecimalSign;
  otherGroups: boolean;
}

/**
 * Reads the wanted columns of a block.
 * @throws InputProblem when a number uses the other decimal sign.
 */
export function readRows(
  lines: Lines,
  block: Block,
  signs: Signs,
  wanted: readonly number[],
  file?: string,
): Rows {
  const most = block.last - block.first + 1;
  const buffers = wanted.map(() => new Float64Array(most));
  const lineOf = new Uint32Array(most);
  const damaged: { line: number; found: string }[] = [];
  let damagedCount = 0;
  let rows = 0;
  for (let i = block.first; i <= block.last; i++) {
    const line = lines.at(i);
    if (line.trim() === '' || commentOf(line, block.delimiter) !== undefined) continue;
    const fields = fieldsOf(line, block.delimiter);
    let wrong = fields.length === block.width ? undefined : `${fields.length} fields`;
    for (let k = 0; k < wanted.length && wrong === undefined; k++) {
      const field = fields[wanted[k]];
      const value = valueIn(field, signs, i + 1, file);
      if (value === undefined) wrong = `"${field}"`;
      else buffers[k][rows] = value;
    }
    if (wrong === undefined) lineOf[rows++] = i + 1;
    else if (damagedCount++ < NAMED_LINES) damaged.push({ line: i + 1, found: wrong });
  }
  return {
    columns: new Map(wanted.map((column, k) => [column, buffers[k].subarray(0, rows)])),
    lines: lineOf.subarray(0, rows),
    warnings: damagedRows(damaged, damagedCount, block.width),
  };
}

function valueIn(field: string, signs: Signs, line: number, file?: string): number | undefined {
  const value = parseNumber(field, signs.decimal, signs.otherGroups);
  if (!Number.isNaN(value)) return value;
  const word = wordOf(field);
  if (word === 'missing') return MISSING;
  if (word === 'below') return BELOW;
  const other = signs.decimal === '.' ? ',' : '.';
  if (field.includes(other) && !Number.isNaN(parseNumber(field, other, false)))
    throw new InputProblem(
      `found "${field}", while the table uses "${signs.decimal}" as decimal sign; one table may use one decimal sign only`,
      { file, line },
    );
  return undefined;
}

function damagedRows(
  named: readonly { line: number; found: string }[],
  count: number,
  width: number,
): TableWarning[] {
  if (count === 0) return [];
  const list = named.map(({ line, found }) => `line ${line} (${found})`).join(', ');
  const message = `${count} damaged rows are left out, where ${width} fields with numbers were expected: ${list}${count > named.length ? ', ...' : ''}`;
  return [{ code: 'table-damaged', message, line: named[0].line }];
}
