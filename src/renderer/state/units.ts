/** Units as they stand beside fields and readings. */

import type { parseQuantity } from '../../core/index';

const SHOWN = {
  um: 'µm',
  nm: 'nm',
  'cm-3': 'cm⁻³',
  'cm-2': 'cm⁻²',
  keV: 'keV',
  C: '°C',
  min: 'min',
  'ohm cm': 'Ω cm',
  'ohm/sq': 'Ω/sq',
  V: 'V',
  fraction: 'of 1',
} as const;

/** A unit by the name the core's quantity reader uses for it. */
export type DisplayUnit = keyof typeof SHOWN;

export const shownUnit = (unit: DisplayUnit): string => SHOWN[unit];

const KINDS: Record<DisplayUnit, Parameters<typeof parseQuantity>[1]['kind']> = {
  um: 'length',
  nm: 'length',
  'cm-3': 'concentration',
  'cm-2': 'dose',
  keV: 'energy',
  C: 'temperature',
  min: 'time',
  'ohm cm': 'resistivity',
  'ohm/sq': 'sheetResistance',
  V: 'voltage',
  fraction: 'plain',
};

/** What kind of quantity a unit measures, as the core's quantity reader calls it. */
export const quantityKind = (unit: DisplayUnit): (typeof KINDS)[DisplayUnit] => KINDS[unit];
