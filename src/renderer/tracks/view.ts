/** How the tracks are looked at, as plain data. */

import type { Theme } from './palette';

export type DepthUnit = 'nm' | 'um';
export type ConcentrationScale = 'log' | 'linear';

export interface TrackView {
  readonly theme: Theme;
  readonly depthUnit: DepthUnit;
  readonly scale: ConcentrationScale;
  /** Font of the figure; exports use one that every viewer has. */
  readonly font: string;
  readonly fontSize: number;
}

export const PER_UM: Record<DepthUnit, number> = { um: 1, nm: 1000 };
export const DEPTH_UNIT_NAMES: Record<DepthUnit, string> = { um: 'µm', nm: 'nm' };

/** The typeface of the window, for figures in it. */
export const WINDOW_FONT = "'Source Sans 3 Variable', system-ui, sans-serif";
