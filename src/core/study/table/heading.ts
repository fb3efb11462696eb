/** What stands above the numbers: names, units and, over pairs of columns, what each pair belongs to. */

import type { TableDelimiter } from '../names';
import { type QuantityKind, type Unit, unitOf } from '../units';
import { type Block, inOtherRun } from './block';
import { dopantNamed } from './dopantNames';
import { commentOf, fieldsOf, filledLength } from './fields';
import type { Lines } from './lines';
import { looksNumeric, wordOf } from './numbers';

export interface Heading {
  /** Whole text above the column. */
  text: string;
  /** Without its unit. */
  name: string;
  unit?: Unit;
  /** A unit in brackets that is not known. */
  unknownUnit?: string;
}

export interface Head {
  /** One for each column; empty texts when the table has no headings. */
  headings: Heading[];
  /** Everything above the numbers as it stands, comment marks removed. */
  metadata: string[];
}

const TABLE_UNITS: readonly QuantityKind[] = ['length', 'concentration'];
/** Lines kept as metadata, and lines above the numbers in which headings are looked for. */
const METADATA_LINES = 200;
const HEADING_LINES = 30;
const LONGEST_HEADING = 200;
/** Lines over which a quoted heading may stretch. */
const QUOTED_LINES = 10;

/** Reads the headings of `width` columns above a block. */
export function readHead(lines: Lines, block: Block, width: number, skip: number): Head {
  const metadata: string[] = [];
  for (let i = skip; i < block.first && metadata.length < METADATA_LINES; i++) {
    const text = plainText(lines.at(i), block.delimiter);
    if (text !== '' && !inOtherRun(block, i)) metadata.push(text);
  }
  const rows = headingRows(lines, block, width, skip);
  const unitRow = rows.length > 0 && isUnitRow(rows[0]) ? rows.shift() : undefined;
  const [names, above] = rows;
  const groups = above?.some(dopantNamed) ? above : undefined;
  const headings = Array.from({ length: width }, (_, i): Heading => {
    const text = names?.[i] ?? '';
    const heading = splitHeading(text);
    const below = unitRow?.[i] ? splitHeading(unitRow[i]) : undefined;
    const group = groups && groupOver(groups, i);
    return {
      text: [group, text].filter(Boolean).join(' ') || (unitRow?.[i] ?? ''),
      name: [group, heading.name].filter(Boolean).join(' '),
      unit: below?.unit ?? heading.unit,
      unknownUnit: below?.unknownUnit ?? heading.unknownUnit,
    };
  });
  return { headings, metadata };
}

function plainText(line: string, delimiter: TableDelimiter): string {
  return (commentOf(line, delimiter) ?? line).trim();
}

/** Up to three rows of words directly above the numbers, nearest first, each with as many fields as the table or fewer. */
function headingRows(lines: Lines, block: Block, width: number, skip: number): string[][] {
  const above: string[] = [];
  for (let i = Math.max(skip, block.first - HEADING_LINES); i < block.first; i++) above.push(lines.at(i));
  const rows: string[][] = [];
  for (const line of joinQuoted(above).reverse()) {
    const text = plainText(line, block.delimiter);
    if (/^[-=_+|;, \t]*$/.test(text)) continue;
    const fields = headingFields(text, block.delimiter, width);
    if (!fields || rows.length === 3) break;
    rows.push(fields.map((field) => field.slice(0, LONGEST_HEADING)));
    if (rows.length === 1 && !isUnitRow(fields) && fields.every((field) => splitHeading(field).unit)) break;
  }
  return rows;
}

/** Joins the lines of a quoted heading that contains line breaks. */
function joinQuoted(above: string[]): string[] {
  const joined: string[] = [];
  for (let i = 0; i < above.length; i++) {
    let text = above[i];
    let end = i;
    while (oddQuotes(text) && end + 1 < above.length && end - i < QUOTED_LINES) text += `\n${above[++end]}`;
    if (oddQuotes(text)) joined.push(above[i]);
    else {
      joined.push(text);
      i = end;
    }
  }
  return joined;
}

const oddQuotes = (text: string): boolean => (text.split('"').length - 1) % 2 === 1;

function headingFields(text: string, delimiter: TableDelimiter, width: number): string[] | undefined {
  const fits = (fields: string[]): boolean => {
    const length = filledLength(fields);
    return (
      length >= 1 &&
      length <= width &&
      fields.length >= Math.min(2, width) &&
      !fields.some((field) => field !== '' && (looksNumeric(field) || wordOf(field) === 'below'))
    );
  };
  if (delimiter !== 'space') {
    const fields = fieldsOf(text, delimiter);
    return fits(fields) ? fields : undefined;
  }
  const wide = text.split(/\t+| {2,}/).map((field) => field.trim());
  const bracketed = text.match(/[^\s([]+(?:\s*(?:\([^)]*\)|\[[^\]]*\]))?/g) ?? [];
  const candidates = [fieldsOf(text, 'space'), wide, bracketed, fieldsOf(text, 'comma')];
  return candidates.find((fields) => fields.length === width && fits(fields));
}

function isUnitRow(fields: readonly string[]): boolean {
  const filled = fields.filter((field) => field !== '');
  return filled.length > 0 && filled.some((field) => bareUnit(field)) && filled.every(couldBeUnit);
}

function bareUnit(field: string): Unit | undefined {
  return unitOf(field.replace(/^[([]|[)\]]$/g, ''), TABLE_UNITS);
}

/** A known unit, anything in brackets, or a short word with a sign of division as in `c/s`. */
function couldBeUnit(field: string): boolean {
  return bareUnit(field) !== undefined || /^[([].*[)\]]$/.test(field) || /^\S{0,4}\/\S{1,4}$/.test(field);
}

/** The name over a pair of columns stands over its first one, or over each. */
function groupOver(groups: readonly string[], column: number): string | undefined {
  return groups[column] || (column > 0 ? groups[column - 1] : undefined) || undefined;
}

/** Splits `name (unit)`, `name [unit]`, `name / unit`, `name, unit`, `name_unit` and `name unit`. */
export function splitHeading(text: string): Omit<Heading, 'text'> {
  const bare = bareUnit(text);
  if (bare && !/^[a-z]$/i.test(text)) return { name: '', unit: bare };
  const brackets = [...text.matchAll(/\(([^()]*(?:\([^()]*\))?[^()]*)\)|\[([^\]]*)\]/g)].reverse();
  for (const found of brackets) {
    const unit = unitOf(found[1] ?? found[2], TABLE_UNITS);
    if (unit) return { name: text.replace(found[0], ' ').replace(/\s+/g, ' ').trim(), unit };
  }
  for (const separator of text.matchAll(/[/,_ ]+/g)) {
    const unit = suffixUnit(text.slice(separator.index + separator[0].length), separator[0]);
    if (unit) return { name: text.slice(0, separator.index).trim(), unit };
  }
  const last = brackets[0];
  if (!last) return { name: text };
  return { name: text.replace(last[0], ' ').trim(), unknownUnit: (last[1] ?? last[2]).trim() };
}

/** `depth_nm` and `boron_cm3` as this program's own tables say it, where `_cm3` means per cubic centimetre. */
function suffixUnit(rest: string, separator: string): Unit | undefined {
  if (separator === '_' && /^c?m3$/.test(rest)) return unitOf(`/${rest}`, TABLE_UNITS);
  return unitOf(rest, TABLE_UNITS);
}
