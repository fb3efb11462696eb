/** Which column is depth, which is a concentration, of what, in which unit; what cannot be known becomes a question. */

import type { TableChoice } from '../schema';
import { namedUnit, type Unit } from '../units';
import { dopantNamed } from './dopantNames';
import type { Heading } from './heading';
import type { ColumnChoice, TableColumn, TableQuestion, TableWarning } from './reading';

const DEPTH_UNITS = ['nm', 'um', 'A', 'cm'] as const;
const CONCENTRATION_UNITS = ['cm-3', 'm-3'] as const;

export interface Pair {
  depth: number;
  concentration: number;
}

export interface Roles {
  columns: TableColumn[];
  /** Columns from 0 that make a profile each. */
  pairs: Pair[];
  questions: TableQuestion[];
  warnings: TableWarning[];
}

const DEPTH_NAME = /depth|tiefe|profondeur|profondit|profundidad|distance|^\s*[xz]\s*$/i;
const CONCENTRATION_NAME = /conc|konz|doping|density|^n(?:[ _]?[ad])?$/i;
const OTHER_NAME = /time|cycle|counts?\b|cps|intensit|raw|ratio|error|sigma|current|index|^#|^no\.?$/i;

/** Gives every column its role. `chosen` columns, by position or heading, go before anything the headings say. */
export function assignRoles(headings: readonly Heading[], choice: TableChoice, chosen: ColumnChoice): Roles {
  const questions: TableQuestion[] = [];
  const warnings: TableWarning[] = [];
  const columns = headings.map((heading, i): TableColumn => {
    const dopant = dopantNamed(heading.name) ?? (heading.name ? undefined : dopantNamed(heading.text));
    return { position: i + 1, heading: heading.text, role: roleOf(heading, dopant !== undefined), dopant };
  });
  const named = headings.some((heading) => heading.text !== '');
  if (!named) for (const [i, column] of columns.entries()) column.role = i === 0 ? 'depth' : 'concentration';
  else if (!columns.some((column) => column.role === 'concentration'))
    for (const column of columns)
      if (column.role === 'other' && !OTHER_NAME.test(column.heading)) column.role = 'concentration';
  const depthChosen = chosenColumn(columns, chosen.depth, 'depth');
  const concentrationChosen = chosenColumn(columns, chosen.concentration, 'concentration');
  for (const found of [depthChosen, concentrationChosen])
    if (typeof found === 'object') questions.push(found);
  if (typeof depthChosen === 'number') columns[depthChosen].role = 'depth';
  if (typeof concentrationChosen === 'number') columns[concentrationChosen].role = 'concentration';
  const pairs = questions.length > 0 ? [] : pairUp(columns, depthChosen, concentrationChosen);
  if (pairs.length === 0 && questions.length === 0) questions.push(whichColumns(columns));
  const used = new Set(pairs.flatMap((pair) => [pair.depth, pair.concentration]));
  for (const i of used) settleUnit(columns[i], headings[i], choice, questions, warnings);
  return { columns, pairs, questions, warnings };
}

function roleOf({ name, unit }: Heading, isDopant: boolean): TableColumn['role'] {
  if (unit?.kind === 'length') return 'depth';
  if (unit?.kind === 'concentration') return 'concentration';
  if (DEPTH_NAME.test(name)) return 'depth';
  if (OTHER_NAME.test(name)) return 'other';
  return isDopant || CONCENTRATION_NAME.test(name) ? 'concentration' : 'other';
}

function chosenColumn(
  columns: readonly TableColumn[],
  wanted: number | string | undefined,
  role: string,
): number | TableQuestion | undefined {
  if (wanted === undefined) return undefined;
  const fold = (text: string): string => text.replace(/\s+/g, ' ').trim().toLowerCase();
  const matches = columns.flatMap((column, i) =>
    (typeof wanted === 'number' ? column.position === wanted : fold(column.heading) === fold(wanted))
      ? [i]
      : [],
  );
  if (matches.length === 1) return matches[0];
  const found =
    matches.length > 1
      ? `${matches.length} columns are headed "${wanted}"; name the ${role} column by its position`
      : typeof wanted === 'number'
        ? `there is no column ${wanted}`
        : `no column is headed "${wanted}"`;
  return { ...whichColumns(columns), message: `${found}; the columns are ${list(columns)}` };
}

/** Every concentration with the nearest depth column to its left, or the first one. */
function pairUp(columns: readonly TableColumn[], depth: unknown, concentration: unknown): Pair[] {
  const depths = columns.flatMap((column, i) => (column.role === 'depth' ? [i] : []));
  return columns.flatMap((column, i): Pair[] => {
    if (column.role !== 'concentration') return [];
    if (typeof concentration === 'number' && i !== concentration) return [];
    const nearest = typeof depth === 'number' ? depth : (depths.filter((d) => d < i).at(-1) ?? depths[0]);
    return nearest === undefined || nearest === i ? [] : [{ depth: nearest, concentration: i }];
  });
}

function whichColumns(columns: readonly TableColumn[]): TableQuestion {
  const missing = columns.some((column) => column.role === 'depth') ? 'concentration' : 'depth';
  return {
    kind: 'columns',
    options: columns.map((column) => column.heading || String(column.position)),
    message: `no column is recognised as ${missing}; name the depth and the concentration column; the columns are ${list(columns)}`,
  };
}

function list(columns: readonly TableColumn[]): string {
  const shown = columns
    .slice(0, 12)
    .map(({ position, heading }) => (heading ? `${position} "${heading}"` : position));
  return shown.join(', ') + (columns.length > 12 ? ', ...' : '');
}

/** A chosen unit wins over the heading's, with a remark; one that is neither chosen nor known is asked for, once a kind. */
function settleUnit(
  column: TableColumn,
  heading: Heading,
  choice: TableChoice,
  questions: TableQuestion[],
  warnings: TableWarning[],
): void {
  const isDepth = column.role === 'depth';
  const allowed: readonly string[] = isDepth ? DEPTH_UNITS : CONCENTRATION_UNITS;
  const chosen = isDepth ? choice.depthUnit : choice.concentrationUnit;
  const stated = statedUnit(heading, isDepth ? 'length' : 'concentration');
  column.unit = chosen ?? (stated && allowed.includes(stated.name) ? stated.name : undefined);
  const where = `column ${column.position}${column.heading ? ` "${column.heading}"` : ''}`;
  if (chosen && stated && stated.name !== chosen)
    warnings.push({
      code: 'table-unit',
      message: `${where} says ${stated.name} and is read in ${chosen} as chosen`,
    });
  const kind = isDepth ? 'depthUnit' : 'concentrationUnit';
  if (column.unit || questions.some((question) => question.kind === kind)) return;
  const unknown = heading.unknownUnit ?? stated?.name ?? heading.unit?.name;
  questions.push({
    kind,
    options: [...allowed],
    message: `the ${isDepth ? 'depth' : 'concentration'} unit of ${where} is ${unknown ? `"${unknown}", which is not known` : 'not stated'}; state ${kind}: ${allowed.join(', ')}`,
  });
}

function statedUnit(heading: Heading, kind: Unit['kind']): Unit | undefined {
  return heading.unit?.kind === kind ? namedUnit(heading.unit.name) : undefined;
}
