/** Numbers for people: four significant digits, trailing zeros kept, powers of ten where they are shorter. */

const DIGITS = 4;
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

const raised = (exponent: number): string =>
  (exponent < 0 ? '⁻' : '') +
  [...String(Math.abs(exponent))].map((digit) => SUPERSCRIPTS[Number(digit)]).join('');

/** "1473", "0.07340", "1.300×10¹⁵"; a dash for what is absent or not a number. */
export function digits(value: number | null, count = DIGITS): string {
  if (value === null || Number.isNaN(value)) return '–';
  if (!Number.isFinite(value)) return value > 0 ? '∞' : '−∞';
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size < 1e-3 || size >= 1e6) {
    const [mantissa, exponent] = value.toExponential(count - 1).split('e');
    return `${mantissa}×10${raised(Number(exponent))}`.replace('-', '−');
  }
  const whole = Math.max(count, Math.floor(Math.log10(size)) + 1);
  return value.toPrecision(size >= 1e3 ? whole : count).replace('-', '−');
}

/** A depth with its junction digits: three decimals of a micrometre at least. */
export const depthDigits = (um: number): string =>
  um >= 100 ? um.toFixed(1) : um >= 10 ? um.toFixed(2) : um.toFixed(3);

/** Shortest digits that give the same number again, for the clipboard. */
export const exactDigits = (value: number): string => String(value);
