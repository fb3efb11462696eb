/** Writes columns as comma-separated text that reads back to the last bit and cannot start a formula in a spreadsheet. */

import Papa from 'papaparse';

/** What a spreadsheet may take for a formula at the start of a text cell. */
const FORMULA_START = /^[=+\-@\t\r]/;
const NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;
const SEPARATOR_BEFORE_FORMULA = /([,;|]\s*)(?=[=+\-@])/g;

/**
 * One text: provenance lines led by `# `, the header, then the rows; UTF-8 once encoded, lines end in LF.
 *
 * Numbers carry the shortest digits that read back the same; NaN and infinities are blank cells. Text cells that could start a
 * formula get an apostrophe before it, also behind a separator that a spreadsheet of another country would cut at.
 * @throws RangeError when the columns differ in length or in number from the header.
 */
export function csvText(
  header: string[],
  columns: (Float64Array | string[])[],
  provenance: string[],
): string {
  const rows = columns[0]?.length ?? 0;
  if (columns.length !== header.length || columns.some((column) => column.length !== rows))
    throw new RangeError(
      `invalid columns: ${header.length} headings for columns of ${columns.map((c) => c.length).join(', ')} rows`,
    );
  const data = Array.from({ length: rows }, (_, i) => columns.map((column) => cell(column[i])));
  const table = Papa.unparse([header.map(cell), ...data], { newline: '\n' });
  const lines = provenance.map((line) => `# ${withoutFormula(line.replace(/\s+/g, ' ').trim())}\n`);
  return `${lines.join('')}${table}\n`;
}

function cell(content: number | string): string {
  if (typeof content === 'number') return Number.isFinite(content) ? String(content) : '';
  if (NUMBER.test(content)) return content;
  return withoutFormula(FORMULA_START.test(content) ? `'${content}` : content);
}

function withoutFormula(text: string): string {
  return text.replace(SEPARATOR_BEFORE_FORMULA, "$1'");
}
