/** What the arrow keys do to a number: a nudge that keeps its magnitude, or a jump along 1-2-5. */

const NICE = [1, 2, 5, 10];

/** The next of 1, 2, 5, 10, 20 ... above (below) a positive value. */
function alongNice(value: number, up: boolean): number {
  const decade = 10 ** Math.floor(Math.log10(value) + 1e-12);
  const mantissa = value / decade;
  if (up) return clean((NICE.find((nice) => nice > mantissa * (1 + 1e-9)) as number) * decade);
  const below = [...NICE].reverse().find((nice) => nice < mantissa * (1 - 1e-9));
  return clean(below === undefined ? decade / 2 : below * decade);
}

/** Twelve digits: takes away what binary fractions add, never what a person typed. */
const clean = (value: number): number => Number(value.toPrecision(12));

/**
 * The value after one press of an arrow key. Fine: one unit of the second digit, so about 1 to 10 % (a decade is crossed
 * cleanly: 1.0 goes down to 0.99). Coarse: the next value of the 1-2-5 series. Zero and below step by 0.01 and 0.1.
 */
export function stepped(value: number, up: boolean, coarse: boolean): number {
  if (value <= 0) {
    const step = coarse ? 0.1 : 0.01;
    return clean(value + (up ? step : -step));
  }
  if (coarse) return alongNice(value, up);
  const exponent = Math.floor(Math.log10(value) + 1e-12);
  const atDecade = clean(value / 10 ** exponent) === 1;
  const step = 10 ** (exponent - (!up && atDecade ? 2 : 1));
  return clean(value + (up ? step : -step));
}
