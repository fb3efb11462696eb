/** The plotting library, fetched once and not before the window stands. */

import type { Plotly } from 'plotly.js-cartesian-dist-min';

let loading: Promise<Plotly> | undefined;

const frame = (): Promise<number> => new Promise((resolve) => requestAnimationFrame(resolve));

export function plotly(): Promise<Plotly> {
  loading ??= load();
  return loading;
}

async function load(): Promise<Plotly> {
  await frame();
  await frame();
  const library = await import('plotly.js-cartesian-dist-min');
  return library.default;
}
