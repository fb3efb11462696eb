/** From two columns of numbers to a profile: ascending, positive, each depth once; whatever is dropped or mended is told. */

import { convert, namedUnit, type Unit } from '../units';
import type { TableWarning } from './reading';

/** What stands in a concentration or depth column where there is no number. */
export const MISSING = Number.NaN;
/** A row marked as below the detection limit; concentrations are never stored as minus infinity otherwise. */
export const BELOW = Number.NEGATIVE_INFINITY;

export interface RawColumns {
  depth: Float64Array;
  concentration: Float64Array;
  /** Line of each row, from 1. */
  lines: Uint32Array;
  depthUnit: string;
  concentrationUnit: string;
  /** For messages: what the concentration column is called. */
  heading: string;
}

export interface CleanProfile {
  depth_um: Float64Array;
  concentration_cm3: Float64Array;
  belowDetection: number;
  warnings: TableWarning[];
}

const UM = namedUnit('um') as Unit;
const PER_CM3 = namedUnit('cm-3') as Unit;

/** Rows counted with the first line they occur in. */
class Tally {
  count = 0;
  line = 0;

  add(line: number): void {
    if (this.count++ === 0) this.line = line;
  }
}

/**
 * Cleans one profile. Values below detection, zero or negative are left out, since a profile is interpolated in the logarithm;
 * the profile then ends at its last positive value.
 */
export function cleanProfile(raw: RawColumns): CleanProfile {
  const { depth, concentration, lines } = raw;
  const [from, per] = [namedUnit(raw.depthUnit) as Unit, namedUnit(raw.concentrationUnit) as Unit];
  const kept = { depth: new Float64Array(depth.length), value: new Float64Array(depth.length), rows: 0 };
  const keptLines = new Uint32Array(depth.length);
  const [missing, below, zero, negative, outside] = Array.from({ length: 5 }, () => new Tally());
  for (let i = 0; i < depth.length; i++) {
    const [x, c] = [depth[i], concentration[i]];
    const hasDepth = Number.isFinite(x);
    if (c === BELOW) below.add(lines[i]);
    else if (Number.isNaN(c) || !hasDepth) {
      if (hasDepth || !Number.isNaN(c)) missing.add(lines[i]);
    } else if (c === 0) zero.add(lines[i]);
    else if (c < 0) negative.add(lines[i]);
    else if (x < 0) outside.add(lines[i]);
    else {
      kept.depth[kept.rows] = convert(x, from, UM);
      kept.value[kept.rows] = convert(c, per, PER_CM3);
      keptLines[kept.rows++] = lines[i];
    }
  }
  const warnings = [
    dropped(raw, missing, 'table-missing', 'lack a value'),
    dropped(raw, below, 'table-below-detection', 'are marked as below detection'),
    dropped(raw, zero, 'table-zero', 'have a concentration of zero'),
    dropped(raw, negative, 'table-negative', 'have a negative concentration'),
    dropped(raw, outside, 'table-depth', 'lie above the surface (negative depth)'),
  ].flat();
  const sorted = ascending(
    kept.depth.subarray(0, kept.rows),
    kept.value.subarray(0, kept.rows),
    keptLines,
    raw.heading,
    warnings,
  );
  plausible(sorted.depth, sorted.value, raw.heading, warnings);
  return {
    depth_um: sorted.depth,
    concentration_cm3: sorted.value,
    belowDetection: below.count + zero.count + negative.count,
    warnings,
  };
}

function dropped(raw: RawColumns, tally: Tally, code: string, what: string): TableWarning[] {
  if (tally.count === 0) return [];
  const message = `${raw.heading}: ${tally.count} of ${raw.depth.length} rows ${what} and are left out, the first in line ${tally.line}`;
  return [{ code, message, line: tally.line }];
}

interface Sorted {
  depth: Float64Array;
  value: Float64Array;
}

/** Sorts by depth where needed; a depth that repeats gets the average of the logarithms. */
function ascending(
  depth: Float64Array,
  value: Float64Array,
  lines: Uint32Array,
  heading: string,
  warnings: TableWarning[],
): Sorted {
  const n = depth.length;
  let turn = -1;
  let repeats = false;
  for (let i = 1; i < n; i++) {
    if (depth[i] < depth[i - 1] && turn < 0) turn = i;
    if (depth[i] === depth[i - 1]) repeats = true;
  }
  if (turn < 0 && !repeats) return { depth: depth.slice(), value: value.slice() };
  if (turn >= 0)
    warnings.push({
      code: 'table-order',
      message: `${heading}: the depths do not ascend, first in line ${lines[turn]}; the rows were sorted`,
      line: lines[turn],
    });
  const order = Uint32Array.from(depth, (_, i) => i);
  if (turn >= 0) order.sort((a, b) => depth[a] - depth[b] || a - b);
  return mergeRepeats(depth, value, lines, order, heading, warnings);
}

function mergeRepeats(
  depth: Float64Array,
  value: Float64Array,
  lines: Uint32Array,
  order: Uint32Array,
  heading: string,
  warnings: TableWarning[],
): Sorted {
  const out: Sorted = { depth: new Float64Array(order.length), value: new Float64Array(order.length) };
  const repeated = new Tally();
  let rows = 0;
  for (let i = 0; i < order.length; ) {
    const x = depth[order[i]];
    let end = i + 1;
    let logs = Math.log(value[order[i]]);
    for (; end < order.length && depth[order[end]] === x; end++) {
      logs += Math.log(value[order[end]]);
      repeated.add(lines[order[end]]);
    }
    out.depth[rows] = x;
    out.value[rows++] = end === i + 1 ? value[order[i]] : Math.exp(logs / (end - i));
    i = end;
  }
  if (repeated.count > 0)
    warnings.push({
      code: 'table-repeated',
      message: `${heading}: ${repeated.count} rows repeat a depth, the first in line ${repeated.line}; their logarithms were averaged`,
      line: repeated.line,
    });
  return { depth: out.depth.slice(0, rows), value: out.value.slice(0, rows) };
}

/** Concentrations that silicon rarely shows, cm^-3, and extents a profile rarely has, um. */
const USUAL_CONCENTRATION = { low: 1e10, high: 1e23 };
const USUAL_EXTENT = { low: 1e-3, high: 1e3 };

function plausible(
  depth: Float64Array,
  value: Float64Array,
  heading: string,
  warnings: TableWarning[],
): void {
  if (depth.length === 0) return;
  const low = value.reduce((a, b) => Math.min(a, b));
  const high = value.reduce((a, b) => Math.max(a, b));
  if (low < USUAL_CONCENTRATION.low || high > USUAL_CONCENTRATION.high)
    warnings.push({
      code: 'table-concentration',
      message: `${heading}: concentrations run from ${low.toPrecision(3)} to ${high.toPrecision(3)} cm^-3, outside 1e10 to 1e23; is the unit right?`,
    });
  const extent = depth[depth.length - 1];
  if (extent < USUAL_EXTENT.low || extent > USUAL_EXTENT.high)
    warnings.push({
      code: 'table-extent',
      message: `${heading}: the profile reaches ${extent.toPrecision(3)} um deep, ${extent < USUAL_EXTENT.low ? 'less than 1 nm' : 'more than 1 mm'}; is the unit right?`,
    });
}
