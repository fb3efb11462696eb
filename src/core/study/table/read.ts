/** Reads a text table of depth profiles. What the file leaves open is asked, never guessed; what is left out is told. */

import { InputProblem } from '../problem';
import type { TableChoice } from '../schema';
import { type Block, filledWidth, findBlock, inOtherRun } from './block';
import { type DecimalEvidence, type Sighting, weighDecimal } from './decimal';
import { decodeTable } from './decode';
import { commentOf, fieldsOf } from './fields';
import { readHead } from './heading';
import { type Lines, splitLines } from './lines';
import { type DecimalSign, looksNumeric, parseNumber } from './numbers';
import { cleanProfile } from './profile';
import type { ColumnChoice, TableProfile, TableQuestion, TableReading, TableWarning } from './reading';
import { assignRoles, type Pair, type Roles } from './roles';
import { type Rows, readRows } from './rows';

const PREVIEW_ROWS = 20;
/** Rows weighed first for the decimal sign; all the others only when these leave it open. */
const DECIMAL_SAMPLE = 5000;

/**
 * Reads a table from its bytes.
 * @param choice what a person stated or a study stored; whatever is absent is detected.
 * @param columns the depth and the concentration column, by position from 1 or by heading, when they are chosen.
 * @returns profiles in um and cm^-3, or `questions` and no profiles where the file is ambiguous.
 * @throws InputProblem with file and line when the bytes hold no usable table.
 */
export function readTable(
  bytes: Uint8Array,
  choice: TableChoice = {},
  fileName?: string,
  columns: ColumnChoice = {},
): TableReading {
  const decoded = decodeTable(bytes, choice.encoding, fileName);
  const lines = splitLines(decoded.text, fileName);
  const skip = choice.skip ?? 0;
  const block = findBlock(lines, choice.delimiter, skip, fileName);
  const warnings = [...decoded.warnings, ...leftOut(block)];
  const width = filledWidth(lines, block);
  const head = readHead(lines, block, width, skip);
  refuseDoubledCommas(block, width, head.metadata, fileName);
  const evidence = decimalOf(lines, block, choice.decimal, fileName);
  const roles = assignRoles(head.headings, choice, columns);
  const questions = [...decimalQuestion(evidence), ...roles.questions];
  const profiles =
    questions.length > 0 || !evidence.decimal
      ? []
      : readProfiles(lines, block, evidence.decimal, evidence.otherGroups, roles, warnings, fileName);
  return {
    choice: {
      delimiter: block.delimiter,
      decimal: evidence.decimal,
      skip,
      encoding: decoded.encoding,
      depthUnit: commonUnit(roles, 'depth') as TableChoice['depthUnit'],
      concentrationUnit: commonUnit(roles, 'concentration') as TableChoice['concentrationUnit'],
    },
    metadata: [...head.metadata, ...foot(lines, block)],
    columns: roles.columns,
    profiles,
    preview: preview(lines, block, width, evidence),
    warnings: [...warnings, ...roles.warnings],
    questions,
  };
}

function leftOut(block: Block): TableWarning[] {
  return block.others.map((other) => ({
    code: 'table-other',
    message: `lines ${other.first + 1} to ${other.last + 1} hold another table, which is left out; to read it, cut it into a file of its own`,
    line: other.first + 1,
  }));
}

/** Half as many headings as fields between commas: the comma is the decimal sign as well. */
function refuseDoubledCommas(block: Block, width: number, metadata: readonly string[], file?: string): void {
  const heading = metadata.at(-1);
  if (block.delimiter !== 'comma' || heading === undefined || looksNumeric(heading.split(',')[0])) return;
  const count = fieldsOf(heading, 'comma').length;
  if (count >= 2 && width === 2 * count)
    throw new InputProblem(
      `${width} fields stand below ${count} headings: the comma seems to be the decimal sign and the delimiter at once; save the table with tab or semicolon as delimiter`,
      { file, line: block.first + 1 },
    );
}

function decimalOf(
  lines: Lines,
  block: Block,
  wanted: DecimalSign | undefined,
  file?: string,
): DecimalEvidence {
  if (block.delimiter === 'comma') {
    if (wanted === ',')
      throw new InputProblem(
        'the comma cannot be delimiter and decimal sign at once; state another of the two',
        {
          file,
        },
      );
    return { decimal: '.', otherGroups: false };
  }
  if (wanted) return { decimal: wanted, otherGroups: true };
  const sample = weighDecimal(sightings(lines, block, Math.min(block.last, block.first + DECIMAL_SAMPLE)));
  const evidence =
    sample.open && block.last > block.first + DECIMAL_SAMPLE
      ? weighDecimal(sightings(lines, block, block.last))
      : sample;
  if (evidence.conflict) throw mixedDecimals(...evidence.conflict, file);
  return evidence;
}

function* sightings(lines: Lines, block: Block, last: number): Generator<Sighting> {
  for (let i = block.first; i <= last; i++) {
    const line = lines.at(i);
    if (commentOf(line, block.delimiter) !== undefined) continue;
    for (const field of fieldsOf(line, block.delimiter)) yield { field, line: i + 1 };
  }
}

function mixedDecimals(point: Sighting, comma: Sighting, file?: string): InputProblem {
  return new InputProblem(
    `found "${comma.field}", while line ${point.line} has "${point.field}"; one table may use one decimal sign only`,
    { file, line: comma.line },
  );
}

function decimalQuestion({ open }: DecimalEvidence): TableQuestion[] {
  if (!open) return [];
  const message = `"${open.field}" can be read with the comma as decimal sign or with the comma grouping thousands; state decimal: "." or ","`;
  return [{ kind: 'decimal', options: ['.', ','], message, line: open.line }];
}

function readProfiles(
  lines: Lines,
  block: Block,
  decimal: DecimalSign,
  otherGroups: boolean,
  roles: Roles,
  warnings: TableWarning[],
  file?: string,
): TableProfile[] {
  const wanted = [...new Set(roles.pairs.flatMap((pair) => [pair.depth, pair.concentration]))];
  const rows = readRows(lines, block, { decimal, otherGroups }, wanted, file);
  warnings.push(...rows.warnings);
  const remarks: TableWarning[] = [];
  const profiles = roles.pairs.flatMap((pair) => readProfile(pair, rows, roles, remarks));
  warnings.push(...remarks);
  if (profiles.length > 0) return profiles;
  const reason = remarks[0]?.message ?? 'no row holds a depth and a concentration';
  throw new InputProblem(`no profile can be used: ${reason}`, { file, line: block.first + 1 });
}

function readProfile(pair: Pair, rows: Rows, roles: Roles, warnings: TableWarning[]): TableProfile[] {
  const column = roles.columns[pair.concentration];
  const heading = column.heading || `column ${column.position}`;
  const clean = cleanProfile({
    depth: rows.columns.get(pair.depth) as Float64Array,
    concentration: rows.columns.get(pair.concentration) as Float64Array,
    lines: rows.lines,
    depthUnit: roles.columns[pair.depth].unit as string,
    concentrationUnit: column.unit as string,
    heading,
  });
  warnings.push(...clean.warnings);
  const { depth_um, concentration_cm3, belowDetection } = clean;
  if (depth_um.length < 2) {
    warnings.push({
      code: 'table-empty',
      message: `${heading}: ${depth_um.length} usable rows; a profile needs two or more and this one is left out`,
    });
    return [];
  }
  return [
    {
      dopant: column.dopant,
      heading,
      depth_um,
      concentration_cm3,
      depthColumn: pair.depth + 1,
      concentrationColumn: pair.concentration + 1,
      belowDetection,
    },
  ];
}

/** The unit shared by all columns of a role; none while one is unknown or they differ. */
function commonUnit(roles: Roles, role: 'depth' | 'concentration'): string | undefined {
  const units = new Set(
    roles.pairs.map((pair) => roles.columns[role === 'depth' ? pair.depth : pair.concentration].unit),
  );
  return units.size === 1 ? [...units][0] : undefined;
}

function foot(lines: Lines, block: Block): string[] {
  const texts: string[] = [];
  for (let i = block.last + 1; i < lines.count && texts.length < PREVIEW_ROWS; i++) {
    const text = lines.at(i).trim();
    if (text !== '' && !inOtherRun(block, i)) texts.push(text);
  }
  return texts;
}

function preview(lines: Lines, block: Block, width: number, evidence: DecimalEvidence): string[][] {
  const { decimal, otherGroups } = evidence;
  const rows: string[][] = [];
  for (let i = block.first; i <= block.last && rows.length < PREVIEW_ROWS; i++) {
    const line = lines.at(i);
    if (line.trim() === '' || commentOf(line, block.delimiter) !== undefined) continue;
    rows.push(
      fieldsOf(line, block.delimiter)
        .slice(0, width)
        .map((field) => {
          const value = decimal ? parseNumber(field, decimal, otherGroups) : Number.NaN;
          return Number.isNaN(value) ? field : String(value);
        }),
    );
  }
  return rows;
}
