/** A solution as tables: the readings per layer, and every column against depth. Heads carry units. */

import type { LayerResult, Solution } from '../result';

export interface ColumnTable {
  header: string[];
  columns: Float64Array[];
}

export interface RowTable {
  header: string[];
  rows: (string | number | null)[][];
}

const LAYER_KEYS = [
  'index',
  'type',
  'top_um',
  'bottom_um',
  'bottomEdge',
  'sheetResistance_ohmSq',
  'sheetConductance_S',
  'netDose_cm2',
  'carrierDose_cm2',
  'meanResistivity_ohmCm',
  'conductivityMobility_cm2Vs',
  'hallMobility_cm2Vs',
  'hallDose_cm2',
  'surfaceNet_cm3',
  'peakNet_cm3',
  'peakDepth_um',
  'tcr1_ppmK',
] as const satisfies readonly (keyof LayerResult)[];

/** One row a layer, the names of the result document as heads. */
export function readingsTable({ result }: Solution): RowTable {
  return { header: [...LAYER_KEYS], rows: result.layers.map((layer) => LAYER_KEYS.map((key) => layer[key])) };
}

/** Every sampled column; two for each dopant: chemical and active. */
export function columnsTable({ columns }: Solution): ColumnTable {
  const { dopants, depth_um, ...rest } = columns;
  const named: [string, Float64Array][] = [
    ['depth_um', depth_um],
    ...dopants.flatMap(({ dopant, chemical_cm3, active_cm3 }): [string, Float64Array][] => [
      [`${dopant}_cm3`, chemical_cm3],
      [`${dopant}Active_cm3`, active_cm3],
    ]),
    ...Object.entries(rest),
  ];
  return { header: named.map(([name]) => name), columns: named.map(([, column]) => column) };
}
