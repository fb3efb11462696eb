/** A profile as a path on a small picture: depth linear, concentration logarithmic. */

const EDGE = 3;

/** An SVG path inside `width` by `height`; empty with fewer than two points. Concentrations are positive. */
export function thumbnailPath(
  depth: readonly number[],
  concentration: readonly number[],
  width: number,
  height: number,
): string {
  if (depth.length < 2) return '';
  const powers = concentration.map(Math.log10);
  const [low, high] = [Math.min(...powers), Math.max(...powers)];
  const span = high - low || 1;
  const deepest = depth[depth.length - 1] || 1;
  const points = depth.map((um, i) => {
    const x = EDGE + (um / deepest) * (width - 2 * EDGE);
    const y = height - EDGE - ((powers[i] - low) / span) * (height - 2 * EDGE);
    return `${x.toFixed(1)} ${y.toFixed(1)}`;
  });
  return `M${points.join('L')}`;
}
