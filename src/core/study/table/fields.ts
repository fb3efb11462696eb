/** Cutting a line into fields, and telling comments from rows. */

import Papa from 'papaparse';
import type { TableDelimiter } from '../names';

const SIGNS: Record<Exclude<TableDelimiter, 'space'>, string> = {
  tab: '\t',
  semicolon: ';',
  comma: ',',
  pipe: '|',
};

/**
 * The fields of one line, blanks around them removed.
 *
 * A line without quotes is cut directly: handing a million such lines to Papa Parse one by one takes several times as long,
 * and all at once would hold every field as a string and let one stray quote of the preamble swallow the table.
 */
export function fieldsOf(line: string, delimiter: TableDelimiter): string[] {
  if (line.includes('"')) return quotedFields(line, delimiter);
  if (delimiter === 'space') {
    const trimmed = line.trim();
    return trimmed === '' ? [] : trimmed.split(/[ \t]+/);
  }
  const fields = line.split(SIGNS[delimiter]);
  for (let i = 0; i < fields.length; i++) fields[i] = fields[i].trim();
  return fields;
}

function quotedFields(line: string, delimiter: TableDelimiter): string[] {
  const sign = delimiter === 'space' ? ' ' : SIGNS[delimiter];
  const source = delimiter === 'space' ? line.replace(/[ \t]+/g, ' ') : line;
  const { data } = Papa.parse<string[]>(source, { delimiter: sign, newline: '\n' });
  const fields = (data[0] ?? []).map((field) => field.replace(/\s+/g, ' ').trim());
  return delimiter === 'space' ? fields.filter((field) => field !== '') : fields;
}

/** The text behind a comment mark (`#`, `%`, `//`, `!`, `*`, and `;` where it does not delimit); undefined for other lines. */
export function commentOf(line: string, delimiter: TableDelimiter): string | undefined {
  const mark = /^\s*(?:[#%!*]+|\/\/+|;+)/.exec(line)?.[0];
  if (mark === undefined || (delimiter === 'semicolon' && mark.trimStart().startsWith(';'))) return undefined;
  return line.slice(mark.length).trim();
}

/** Number of fields that are not trailing blanks. */
export function filledLength(fields: readonly string[]): number {
  let length = fields.length;
  while (length > 0 && fields[length - 1] === '') length--;
  return length;
}
