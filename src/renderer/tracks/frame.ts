/** Where the tracks stand in a figure of a given size: margins in pixels and each track's part of the height. */

import type { TrackName } from './curves';

export interface Size {
  readonly width: number;
  readonly height: number;
}

export interface Frame {
  readonly margin: { readonly l: number; readonly r: number; readonly t: number; readonly b: number };
  /** From bottom 0 to top 1 of the area inside the margins. */
  readonly domains: Readonly<Record<TrackName | 'band', readonly [number, number]>>;
}

const WEIGHTS: readonly [TrackName, number][] = [
  ['doping', 0.35],
  ['carriers', 0.25],
  ['mobility', 0.2],
  ['share', 0.2],
];

/** `fontSize` in pixels scales everything that holds text. */
export function frameOf(size: Size, fontSize: number): Frame {
  const em = fontSize;
  const margin = { l: 4.9 * em, r: 3.7 * em, t: 0.3 * em, b: 3.3 * em };
  const inside = Math.max(1, size.height - margin.t - margin.b);
  const band = 1.5 * em;
  const gap = 0.75 * em;
  const tracks = inside - band - 1.6 * em - 3 * gap;
  let top = inside - band - 1.6 * em;
  const domains: Record<string, readonly [number, number]> = { band: [1 - band / inside, 1] };
  for (const [name, weight] of WEIGHTS) {
    const height = weight * tracks;
    domains[name] = [Math.max(0, (top - height) / inside), top / inside];
    top -= height + gap;
  }
  return { margin, domains: domains as Frame['domains'] };
}
