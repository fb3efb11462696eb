/** Recognising a dopant in a column's heading: by symbol, with or without its isotope, or by name. */

import { DOPANT_FACTS, DOPANTS, type Dopant } from '../../material/dopants';

const OTHER_NAMES: Partial<Record<Dopant, string>> = {
  phosphorus: 'phosphorous|phosphor',
  arsenic: 'arsen',
  antimony: 'antimon',
  aluminium: 'aluminum',
  boron: 'bor',
};

/** `B`, `11B`, `B11`, `B-11`, `11B+`, `^11B`, `[B]`, `N_B`, `boron conc`: the symbol or name stands alone among other words. */
const PATTERNS = DOPANTS.map((dopant) => {
  const names = [dopant, OTHER_NAMES[dopant]].filter(Boolean).join('|');
  const { symbol } = DOPANT_FACTS[dopant];
  return {
    dopant,
    name: new RegExp(`(?<![a-z])(?:${names})(?![a-z])`, 'i'),
    symbol: new RegExp(`(?<![A-Za-z0-9])\\^?(?:\\d{1,3}[ -]?)?${symbol}(?:-?\\d{1,3})?[+-]?(?![A-Za-z0-9])`),
    loose: new RegExp(`^(?:\\d{1,3})?${symbol}(?:\\d{1,3})?$`, 'i'),
  };
});

/** The one dopant a heading names; undefined when it names none or several. */
export function dopantNamed(heading: string): Dopant | undefined {
  const text = heading.replace(/_/g, ' ').trim();
  for (const key of ['name', 'symbol', 'loose'] as const) {
    const found = PATTERNS.filter((pattern) => pattern[key].test(text));
    if (found.length === 1) return found[0].dopant;
    if (found.length > 1) return undefined;
  }
  return undefined;
}
