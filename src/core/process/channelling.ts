/** An exponential tail in place of the channelling that ranges in an amorphous target leave out. */

import { brent } from '../numeric/brent';
import { doseOf, evaluator, type Shape, table } from '../profile/shape';

/** Decay length of boron in silicon, cm, whatever the energy: Ryssel and Ruge (from memory); Bykadorova 2003 gives the same. */
export const BORON_TAIL = 45e-7;

const BODY_POINTS = 400;
/** The tail ends where it is this small against the peak: below any doping that a reading feels. */
const SMALLEST = 1e-16;

/**
 * The profile with a tail: below the depth where it has fallen to half of its peak, half the peak times exp(-x/lambda) wherever that is
 * more than the profile itself; the whole scaled so that the dose in the silicon stays. As a table of points.
 * Source: H. Ryssel and I. Ruge, Ion Implantation; S. Selberherr 1984 (both from memory). Range: boron in crystalline silicon, ordinary tilt.
 * @param implanted with a peak that falls off with depth.
 */
export function withTail(implanted: Shape, lambda = BORON_TAIL): Shape {
  const at = evaluator(implanted);
  const step = (2 * (implanted.marks.at(-1) ?? 0)) / BODY_POINTS;
  const body = Array.from({ length: BODY_POINTS + 1 }, (_, i) => i * step);
  const peak = Math.max(...body.map(at), ...implanted.marks.map(at));
  if (!(peak > 0)) return implanted;
  const last = body.map((x) => at(x) >= peak / 2).lastIndexOf(true);
  if (last < 0) return implanted;
  const half = brent((x) => at(x) - peak / 2, body[last], body[last] + step, 1e-12);
  const end = Math.max(body[BODY_POINTS], half + lambda * Math.log(0.5 / SMALLEST));
  const beyond = Array.from({ length: 50 }, (_, i) => half + ((end - half) * (i + 1)) / 50);
  const depth = Float64Array.from([...new Set([...body, half, ...beyond])].sort((a, b) => a - b));
  const tailed = depth.map((x) =>
    x <= half ? at(x) : Math.max(at(x), (peak / 2) * Math.exp((half - x) / lambda)),
  );
  const scale =
    doseOf(implanted, Number.POSITIVE_INFINITY) / doseOf(table(depth, tailed), Number.POSITIVE_INFINITY);
  return table(
    depth,
    tailed.map((c) => c * scale),
  );
}
