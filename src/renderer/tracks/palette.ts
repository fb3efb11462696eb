/**
 * Colours and dashes of the curves: the Okabe-Ito set, each used only on a ground where it reaches 3:1.
 * Every curve of a track has its own dash as well, so that nothing hangs on colour.
 */

import type { Dopant } from '../../core/index';

export type Theme = 'light' | 'dark';

const LIGHT = {
  black: '#000000',
  blue: '#0072B2',
  vermillion: '#D55E00',
  green: '#009E73',
  purple: '#CC79A7',
};
const DARK = {
  white: '#FFFFFF',
  sky: '#56B4E9',
  orange: '#E69F00',
  green: '#009E73',
  yellow: '#F0E442',
  vermillion: '#D55E00',
  purple: '#CC79A7',
};

export interface Palette {
  ground: string;
  ink: string;
  faintInk: string;
  grid: string;
  axis: string;
  net: string;
  electrons: string;
  holes: string;
  lattice: string;
  impurity: string;
  share: string;
  shareFill: string;
  cumulative: string;
  junction: string;
  bandP: string;
  bandN: string;
  dopants: Record<Dopant, string>;
}

export const PALETTES: Record<Theme, Palette> = {
  light: {
    ground: '#ffffff',
    ink: '#1a2027',
    faintInk: '#56606b',
    grid: '#e6e9ed',
    axis: '#8b949e',
    net: LIGHT.black,
    electrons: LIGHT.blue,
    holes: LIGHT.vermillion,
    lattice: LIGHT.green,
    impurity: LIGHT.purple,
    share: LIGHT.green,
    shareFill: 'rgba(0, 158, 115, 0.16)',
    cumulative: LIGHT.black,
    junction: '#3d4650',
    bandP: '#fbe3d3',
    bandN: '#d8e9f5',
    dopants: {
      boron: LIGHT.vermillion,
      phosphorus: LIGHT.blue,
      arsenic: LIGHT.green,
      antimony: LIGHT.purple,
      indium: LIGHT.purple,
      gallium: LIGHT.green,
      aluminium: LIGHT.vermillion,
    },
  },
  dark: {
    ground: '#1b2026',
    ink: '#e8ebee',
    faintInk: '#a3adb8',
    grid: '#2b323a',
    axis: '#6f7a86',
    net: DARK.white,
    electrons: DARK.sky,
    holes: DARK.orange,
    lattice: DARK.yellow,
    impurity: DARK.purple,
    share: DARK.yellow,
    shareFill: 'rgba(240, 228, 66, 0.14)',
    cumulative: DARK.white,
    junction: '#c3cad2',
    bandP: '#4a3213',
    bandN: '#173a50',
    dopants: {
      boron: DARK.orange,
      phosphorus: DARK.sky,
      arsenic: DARK.yellow,
      antimony: DARK.purple,
      indium: DARK.purple,
      gallium: DARK.yellow,
      aluminium: DARK.vermillion,
    },
  },
};

/** Dash patterns in the plotting library's notation. */
export const DASHES = {
  net: 'solid',
  electrons: '7px,3px',
  holes: 'solid',
  electronMobility: '7px,3px',
  holeMobility: 'solid',
  lattice: '2px,3px',
  impurity: '8px,3px,2px,3px',
  share: 'solid',
  cumulative: '5px,3px',
  chemical: '1px,3px',
} as const;

export const DOPANT_DASHES: Record<Dopant, string> = {
  boron: '11px,4px',
  phosphorus: '5px,3px',
  arsenic: '10px,3px,2px,3px',
  antimony: '2px,3px',
  indium: '14px,5px',
  gallium: '4px,4px',
  aluminium: '8px,3px,2px,3px,2px,3px',
};
