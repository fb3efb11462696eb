/**
 * The curves of the four tracks as plain columns, without any plotting library: which there are, what they are called,
 * how they are drawn and what they are worth at a depth. The tracks, the reading line and the table all use this list.
 */

import { DOPANT_FACTS, type SolvedColumns } from '../../core/index';
import { DASHES, DOPANT_DASHES, type Palette } from './palette';
import { DEPTH_UNIT_NAMES, type DepthUnit, PER_UM } from './view';

export type TrackName = 'doping' | 'carriers' | 'mobility' | 'share';

export interface Curve {
  readonly key: string;
  readonly track: TrackName;
  /** Short name beside the curve. */
  readonly name: string;
  /** With unit, for the table and for speech. */
  readonly longName: string;
  readonly unit: string;
  readonly colour: string;
  readonly dash: string;
  readonly width: number;
  /** Against `depth_um`; NaN where there is nothing to draw. */
  readonly values: Float64Array;
  /** Drawn against the right-hand axis, 0 to 100 %. */
  readonly rightAxis?: boolean;
  readonly fill?: string;
}

/** Chemical and active concentrations closer than this are drawn as one curve. */
const SAME = 1e-3;

/** `depthUnit` sets the length that the share of sheet conductance is stated per. */
export function trackCurves(columns: SolvedColumns, palette: Palette, depthUnit: DepthUnit): Curve[] {
  return [
    ...dopingCurves(columns, palette),
    ...carrierCurves(columns, palette),
    ...mobilityCurves(columns, palette),
    ...shareCurves(columns, palette, depthUnit),
  ];
}

function dopingCurves(columns: SolvedColumns, palette: Palette): Curve[] {
  const dopants = columns.dopants.flatMap(({ dopant, chemical_cm3, active_cm3 }): Curve[] => {
    const { symbol } = DOPANT_FACTS[dopant];
    const colour = palette.dopants[dopant];
    const base = { track: 'doping' as const, unit: 'cm⁻³', colour };
    const active: Curve = {
      ...base,
      key: dopant,
      name: symbol,
      longName: `${dopant}, active`,
      dash: DOPANT_DASHES[dopant],
      width: 1.6,
      values: active_cm3,
    };
    if (!differ(chemical_cm3, active_cm3)) return [{ ...active, longName: dopant }];
    return [
      active,
      {
        ...base,
        key: `${dopant}-chemical`,
        name: `${symbol} chemical`,
        longName: `${dopant}, chemical`,
        dash: DASHES.chemical,
        width: 1.6,
        values: chemical_cm3,
      },
    ];
  });
  return [
    ...dopants,
    {
      key: 'net',
      track: 'doping',
      name: '|net|',
      longName: 'net doping, magnitude',
      unit: 'cm⁻³',
      colour: palette.net,
      dash: DASHES.net,
      width: 2.2,
      values: columns.net_cm3.map(Math.abs),
    },
  ];
}

function differ(a: Float64Array, b: Float64Array): boolean {
  for (let i = 0; i < a.length; i++) if (Math.abs(a[i] - b[i]) > SAME * a[i]) return true;
  return false;
}

function carrierCurves(columns: SolvedColumns, palette: Palette): Curve[] {
  const base = { track: 'carriers' as const, unit: 'cm⁻³', width: 1.9 };
  return [
    {
      ...base,
      key: 'electrons',
      name: 'n',
      longName: 'electrons',
      colour: palette.electrons,
      dash: DASHES.electrons,
      values: columns.electrons_cm3,
    },
    {
      ...base,
      key: 'holes',
      name: 'p',
      longName: 'holes',
      colour: palette.holes,
      dash: DASHES.holes,
      values: columns.holes_cm3,
    },
  ];
}

function mobilityCurves(columns: SolvedColumns, palette: Palette): Curve[] {
  const { electrons_cm3: n, holes_cm3: p } = columns;
  const base = { track: 'mobility' as const, unit: 'cm²/Vs' };
  const ofMajority = (type: 'n' | 'p', mobility: Float64Array): Float64Array =>
    mobility.map((value, i) => (n[i] >= p[i] === (type === 'n') ? value : Number.NaN));
  const curves: Curve[] = [
    {
      ...base,
      key: 'electronMobility',
      name: 'electrons',
      longName: 'mobility of electrons where they are the majority',
      colour: palette.electrons,
      dash: DASHES.electronMobility,
      width: 2.2,
      values: ofMajority('n', columns.electronMobility_cm2Vs),
    },
    {
      ...base,
      key: 'holeMobility',
      name: 'holes',
      longName: 'mobility of holes where they are the majority',
      colour: palette.holes,
      dash: DASHES.holeMobility,
      width: 2.2,
      values: ofMajority('p', columns.holeMobility_cm2Vs),
    },
    {
      ...base,
      key: 'lattice',
      name: 'lattice limit',
      longName: 'lattice-limited mobility of the majority',
      colour: palette.lattice,
      dash: DASHES.lattice,
      width: 1.4,
      values: columns.latticeMobility_cm2Vs,
    },
    {
      ...base,
      key: 'impurity',
      name: 'impurity limit',
      longName: 'impurity-limited mobility of the majority',
      colour: palette.impurity,
      dash: DASHES.impurity,
      width: 1.4,
      values: columns.impurityMobility_cm2Vs,
    },
  ];
  return curves.filter((curve) => curve.values.some(Number.isFinite));
}

function shareCurves(columns: SolvedColumns, palette: Palette, depthUnit: DepthUnit): Curve[] {
  const unit = DEPTH_UNIT_NAMES[depthUnit];
  const perUnit = 100 / PER_UM[depthUnit];
  return [
    {
      key: 'share',
      track: 'share',
      name: `share per ${unit}`,
      longName: 'share of the layer’s sheet conductance',
      unit: `%/${unit}`,
      colour: palette.share,
      dash: DASHES.share,
      width: 1.6,
      fill: palette.shareFill,
      values: columns.share_perUm.map((value) => value * perUnit),
    },
    {
      key: 'cumulative',
      track: 'share',
      name: 'cumulative',
      longName: 'share of the layer’s sheet conductance above this depth',
      unit: '%',
      colour: palette.cumulative,
      dash: DASHES.cumulative,
      width: 1.4,
      rightAxis: true,
      values: columns.cumulativeShare.map((value) => value * 100),
    },
  ];
}
