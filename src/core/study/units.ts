/** How people write units: every spelling that is understood, in one place for typed quantities and table headings alike. */

export type QuantityKind =
  | 'length'
  | 'concentration'
  | 'dose'
  | 'energy'
  | 'temperature'
  | 'time'
  | 'resistivity'
  | 'sheetResistance'
  | 'voltage'
  | 'plain';

export interface Unit {
  /** The spelling that is shown. */
  name: string;
  kind: QuantityKind;
  /** Value in the kind's first unit = (value + shift) * scale / divisor; two whole numbers keep decimal fractions exact. */
  scale: number;
  divisor: number;
  shift: number;
  /** Pattern of the accepted spellings, upper or lower case, after {@link plainSpelling}. */
  spelling: string;
}

const unit = (
  kind: QuantityKind,
  name: string,
  spelling: string,
  scale = 1,
  divisor = 1,
  shift = 0,
): Unit => ({ name, kind, scale, divisor, shift, spelling });

const ATOMS = '(?:atoms?|at\\.?|ions?)';
/** `cm-3`, `cm^-3`, `1/cm3`, `/cm3`, `at/cm3`, `atoms/cc`, `atoms per cm3`, `atoms*cm^-3` and the like. */
const perVolume = (length: string, short: string): string =>
  `(?:${ATOMS}? ?\\*? ?${length} ?(?:\\^|\\*\\*)? ?\\(?-3\\)?|(?:${ATOMS}|1)? ?(?:/|per) ?(?:${length} ?(?:\\^|\\*\\*)? ?3${short}))`;
const perArea = (length: string): string =>
  `(?:${ATOMS}? ?\\*? ?${length} ?\\^? ?-2|(?:${ATOMS}|1)? ?(?:/|per) ?(?:sq ?)?${length} ?\\^? ?2)`;

/** The first unit of each kind is the one the others are stated in. */
export const UNITS: readonly Unit[] = [
  unit('length', 'um', 'um|microns?|micromet(?:er|re)s?'),
  unit('length', 'nm', 'nm|nanomet(?:er|re)s?', 1, 1e3),
  unit('length', 'A', 'a|ang|angstroe?ms?', 1, 1e4),
  unit('length', 'cm', 'cm', 1e4),
  unit('length', 'mm', 'mm', 1e3),
  unit('concentration', 'cm-3', perVolume('cm', '|cc')),
  unit('concentration', 'm-3', perVolume('m', ''), 1, 1e6),
  unit('dose', 'cm-2', perArea('cm')),
  unit('dose', 'm-2', perArea('m'), 1, 1e4),
  unit('energy', 'keV', 'kev'),
  unit('energy', 'eV', 'ev', 1, 1e3),
  unit('energy', 'MeV', 'mev', 1e3),
  unit('temperature', 'C', 'deg\\.? ?c|c|celsius'),
  unit('temperature', 'K', 'k|kelvins?', 1, 1, -273.15),
  unit('time', 'min', 'min|minutes?'),
  unit('time', 's', 's|secs?|seconds?', 1, 60),
  unit('time', 'h', 'h|hrs?|hours?', 60),
  unit('resistivity', 'ohm cm', 'ohms?[ *-]{0,3}cm'),
  unit('resistivity', 'mohm cm', 'mohms?[ *-]{0,3}cm', 1, 1e3),
  unit('resistivity', 'ohm m', 'ohms?[ *-]{0,3}m', 100),
  unit('sheetResistance', 'ohm/sq', 'ohms?(?: ?(?:/|per) ?sq(?:\\.|uare)?)?'),
  unit('voltage', 'V', 'v|volts?'),
  unit('voltage', 'mV', 'mv|millivolts?', 1, 1e3),
  unit('voltage', 'kV', 'kv|kilovolts?', 1e3),
  unit('sheetResistance', 'kohm/sq', 'kohms?(?: ?(?:/|per) ?sq(?:\\.|uare)?)?', 1e3),
];

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * Rewrites the signs a keyboard lacks: micro and ohm signs, angstrom, superscripts, minus, multiplication and degree
 * signs, blanks of every width.
 */
export function plainSpelling(text: string): string {
  return text
    .replace(/[\u00b5\u03bc]/g, 'u')
    .replace(/[\u212b\u00c5\u00e5]|A\u030a/g, 'A')
    .replace(/\u00f6/g, 'o')
    .replace(/[\u2126\u03a9\u03c9]/g, 'ohm')
    .replace(/\/\s*\u25a1/g, '/sq')
    .replace(/[\u207b\u207a]?[\u2070\u00b9\u00b2\u00b3\u2074-\u2079]+/g, superscript)
    .replace(/[\u2212\u2010-\u2013]/g, '-')
    .replace(/[\u00d7\u00b7\u22c5]/g, '*')
    .replace(/\u00b0/g, 'deg ')
    .replace(/[\s\u00a0\u2009\u202f]+/g, ' ');
}

function superscript(run: string): string {
  const digits = [...run].map((sign) => {
    const digit = SUPERSCRIPTS.indexOf(sign);
    return digit >= 0 ? digit : sign === '\u207b' ? '-' : '';
  });
  return `^${digits.join('')}`;
}

const WHOLE = UNITS.map((entry) => new RegExp(`^(?:${entry.spelling})$`, 'i'));
/** A unit ends where no letter or digit follows; a time may run on, as in `1h30min`. */
const STARTING = UNITS.map(
  ({ spelling, kind }) => new RegExp(`(?:${spelling})(?![a-z${kind === 'time' ? '' : '0-9'}])`, 'iy'),
);

/** The unit that a text as a whole spells, of one of the kinds asked for. */
export function unitOf(text: string, kinds: readonly QuantityKind[]): Unit | undefined {
  const plain = plainSpelling(text).trim();
  return UNITS.find((entry, i) => kinds.includes(entry.kind) && WHOLE[i].test(plain));
}

/** The longest unit that begins at `position` of a plainly spelled text; units of `kind` go first. */
export function unitAt(
  plain: string,
  position: number,
  kind: QuantityKind,
): { unit: Unit; length: number } | undefined {
  let best: { unit: Unit; length: number } | undefined;
  for (const [i, entry] of UNITS.entries()) {
    STARTING[i].lastIndex = position;
    const length = STARTING[i].exec(plain)?.[0].length ?? 0;
    const preferred = Number(entry.kind === kind) - Number(best?.unit.kind === kind);
    if (length > 0 && (!best || preferred > 0 || (preferred === 0 && length > best.length)))
      best = { unit: entry, length };
  }
  return best;
}

/** Names of the units of a kind, for messages. */
export function unitNames(kind: QuantityKind): string[] {
  return UNITS.filter((entry) => entry.kind === kind).map((entry) => entry.name);
}

/** The unit of a kind by its shown name. */
export function namedUnit(name: string): Unit | undefined {
  return UNITS.find((entry) => entry.name === name);
}

/** A value in `from` expressed in `to`, both of one kind; exact where the ratio of the units is a power of ten. */
export function convert(value: number, from: Unit, to: Unit): number {
  if (from === to) return value;
  const scale = from.scale * to.divisor;
  const divisor = from.divisor * to.scale;
  const shifted = from.shift === 0 ? value : value + from.shift;
  const inTarget = scale >= divisor ? shifted * (scale / divisor) : shifted / (divisor / scale);
  return to.shift === 0 ? inTarget : inTarget - to.shift;
}
