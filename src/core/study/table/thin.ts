/** Thinning a table of too many points so that its dose stays and its peaks survive. */

import type { CleanProfile } from './profile';

type Points = Pick<CleanProfile, 'depth_um' | 'concentration_cm3'>;

/** Parts of a bin whose doses are compared to find out whether averages describe it. */
const PARTS = 4;

/**
 * A profile of at most `maxPoints` points with the dose of the given one.
 *
 * Half of the points go to bins of equally many rows, each standing for its rows by its mean concentration. The other half
 * keeps all rows of those bins that averages describe worst, relative to their own level: peaks, edges, kinks. A common
 * factor close to one then restores the dose of the log-linear integral exactly. Own method.
 * @param depth ascending; concentration positive; `maxPoints` at least 10.
 */
export function thinProfile(depth: Float64Array, concentration: Float64Array, maxPoints: number): Points {
  const rows = depth.length;
  if (rows <= maxPoints) return { depth_um: depth, concentration_cm3: concentration };
  const bins = Math.max(2, Math.floor(maxPoints / 2) - 2);
  const edge = (bin: number): number => 1 + Math.round(((rows - 2) * bin) / bins);
  const cumulative = cumulativeDose(depth, concentration);
  const average = binAverages(depth, cumulative, bins, edge);
  const kept = worstBins(depth, cumulative, average, edge, maxPoints - 2 - bins);
  const out = { x: new Float64Array(maxPoints), c: new Float64Array(maxPoints), count: 0 };
  const push = (x: number, c: number): void => {
    out.x[out.count] = x;
    out.c[out.count++] = c;
  };
  push(depth[0], concentration[0]);
  for (let bin = 0; bin < bins; bin++)
    if (kept[bin]) for (let i = edge(bin); i < edge(bin + 1); i++) push(depth[i], concentration[i]);
    else push(average.x[bin], average.c[bin]);
  push(depth[rows - 1], concentration[rows - 1]);
  const x = out.x.slice(0, out.count);
  const c = out.c.slice(0, out.count);
  const factor = cumulative[rows - 1] / logLinearDose(x, c);
  return { depth_um: x, concentration_cm3: c.map((value) => value * factor) };
}

/** Integral of the profile that is a straight line in the logarithm between neighbours. Concentrations positive. */
export function logLinearDose(depth: Float64Array, concentration: Float64Array): number {
  return cumulativeDose(depth, concentration)[depth.length - 1];
}

function cumulativeDose(depth: Float64Array, concentration: Float64Array): Float64Array {
  const dose = new Float64Array(depth.length);
  for (let i = 1; i < depth.length; i++)
    dose[i] = dose[i - 1] + (depth[i] - depth[i - 1]) * logMean(concentration[i - 1], concentration[i]);
  return dose;
}

/** (b - a) / ln(b / a), by its series where a and b nearly agree. */
function logMean(a: number, b: number): number {
  const t = (b - a) / (b + a);
  if (Math.abs(t) < 1e-3) return ((a + b) / 2) * (1 - (t * t) / 3);
  return (b - a) / Math.log(b / a);
}

/** Each bin by its middle depth and mean concentration, between the midpoints to its neighbours' rows. */
function binAverages(
  depth: Float64Array,
  cumulative: Float64Array,
  bins: number,
  edge: (bin: number) => number,
): { x: Float64Array; c: Float64Array } {
  const x = new Float64Array(bins);
  const c = new Float64Array(bins);
  for (let bin = 0; bin < bins; bin++) {
    const [from, to] = [edge(bin) - 1, edge(bin + 1)];
    x[bin] = (depth[edge(bin)] + depth[to - 1]) / 2;
    c[bin] = (cumulative[to] - cumulative[from]) / (depth[to] - depth[from]);
  }
  return { x, c };
}

/** Marks the bins whose parts differ most from the line through the averages, as many as `budget` extra points allow. */
function worstBins(
  depth: Float64Array,
  cumulative: Float64Array,
  average: { x: Float64Array; c: Float64Array },
  edge: (bin: number) => number,
  budget: number,
): Uint8Array {
  const bins = average.x.length;
  const misfit = Float64Array.from({ length: bins }, (_, bin) => {
    const [from, to] = [edge(bin) - 1, edge(bin + 1)];
    const parts = Math.min(PARTS, to - from);
    let worst = 0;
    for (let part = 0; part < parts; part++) {
      const a = from + Math.floor(((to - from) * part) / parts);
      const b = from + Math.floor(((to - from) * (part + 1)) / parts);
      const mean = (cumulative[b] - cumulative[a]) / (depth[b] - depth[a]);
      const expected = onAverages(average, bin, (depth[a] + depth[b]) / 2);
      worst = Math.max(worst, Math.abs(Math.log(mean / expected)));
    }
    return worst;
  });
  const order = Uint32Array.from(misfit, (_, bin) => bin).sort((a, b) => misfit[b] - misfit[a]);
  const kept = new Uint8Array(bins);
  let left = budget;
  for (const bin of order) {
    const extra = edge(bin + 1) - edge(bin) - 1;
    if (extra > left) break;
    kept[bin] = 1;
    left -= extra;
  }
  return kept;
}

/** Log-linear value on the averages near one bin. */
function onAverages({ x, c }: { x: Float64Array; c: Float64Array }, bin: number, at: number): number {
  const other = Math.min(x.length - 1, Math.max(0, at < x[bin] ? bin - 1 : bin + 1));
  if (other === bin) return c[bin];
  return c[bin] * (c[other] / c[bin]) ** ((at - x[bin]) / (x[other] - x[bin]));
}
