/** Numbers as instruments and spreadsheets of any country write them. The whole field must be a number. */

export type DecimalSign = '.' | ',';

/** What most fields of most tables match; tried first, since a table may hold millions of them. */
const PLAIN = {
  '.': /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/,
  ',': /^[+-]?(?:\d+,?\d*|,\d+)(?:[eE][+-]?\d+)?$/,
};

/** Signs that group digits in threes whatever the decimal sign: blanks that do not break, thin blanks, apostrophes. */
const GROUP_SIGNS = "\u00a0\u2009\u202f'\u2019";
const EXPONENT = '(?:[eEdD]([+-]?\\d+)|\\s*[xX\u00d7*\u00b7]\\s*10(?:\\^|\\*\\*)\\(?([+-]?\\d+)\\)?)?';

const pattern = (decimal: string, groups: string): RegExp =>
  new RegExp(
    `^([+-]?)(\\d+|\\d{1,3}(?:([${groups}])\\d{3})(?:\\3\\d{3})*)?(?:${decimal}(\\d*))?${EXPONENT}$`,
  );

const FULL = {
  '.': { grouped: pattern('\\.', `${GROUP_SIGNS},`), strict: pattern('\\.', GROUP_SIGNS) },
  ',': { grouped: pattern(',', `${GROUP_SIGNS}.`), strict: pattern(',', GROUP_SIGNS) },
};

/**
 * The number a field states; NaN when it is none.
 * @param otherGroups whether the sign that is not the decimal sign may group digits in threes.
 */
export function parseNumber(field: string, decimal: DecimalSign, otherGroups: boolean): number {
  if (PLAIN[decimal].test(field)) return finite(Number(decimal === '.' ? field : field.replace(',', '.')));
  const found = FULL[decimal][otherGroups ? 'grouped' : 'strict'].exec(field.replace(/\u2212/g, '-'));
  if (!found) return Number.NaN;
  const [, sign, whole = '', , fraction = '', exponent, power] = found;
  const digits = whole.replace(/\D/g, '');
  if (digits === '' && fraction === '') return Number.NaN;
  return finite(Number(`${sign}${digits || '0'}.${fraction || '0'}e${exponent ?? power ?? '0'}`));
}

function finite(value: number): number {
  return Number.isFinite(value) ? value : Number.NaN;
}

const MISSING = /^(?:nan|n\/a|na|#n\/a|null|none|-{1,3})?$/i;
const BELOW = /^(?:[<\u2264]\s*[\d.,].*|bdl|b\.d\.l\.?|n\.?d\.?)$/i;

/** What a field that is no number says. */
export function wordOf(field: string): 'missing' | 'below' | 'text' {
  if (MISSING.test(field)) return 'missing';
  return BELOW.test(field) ? 'below' : 'text';
}

/** A number under one decimal sign or the other, or `<` before one. */
export function looksNumeric(field: string): boolean {
  if (PLAIN['.'].test(field) || PLAIN[','].test(field)) return true;
  const first = field.charCodeAt(0);
  const bare = first === 60 || first === 0x2264 ? field.slice(1).trim() : field;
  return !Number.isNaN(parseNumber(bare, '.', true)) || !Number.isNaN(parseNumber(bare, ',', true));
}
