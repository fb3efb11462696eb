/** What an option's text means: a quantity with or without its unit, a dopant by name or symbol, one of a list. */

import { InvalidArgumentError } from 'commander';
import {
  DOPANT_FACTS,
  DOPANTS,
  type Dopant,
  IMPLANT_SPECIES,
  type ImplantSpecies,
  parseQuantity,
} from '../core/index';

type Field = Parameters<typeof parseQuantity>[1];

/** A reader for a quantity: a bare number is in `unit`, a typed unit wins; at least `low`, at most `high`. */
export function quantity(kind: Field['kind'], unit: string, low: number, high: number) {
  return (text: string): number => {
    const parsed = parseQuantity(text, { kind, shown: unit });
    if ('problem' in parsed) throw new InvalidArgumentError(`${parsed.problem}.`);
    if (parsed.value < low || parsed.value > high)
      throw new InvalidArgumentError(`${low} to ${high} ${unit} are allowed.`);
    return parsed.value;
  };
}

export function dopant(text: string): Dopant {
  return named(text, DOPANTS, (each) => DOPANT_FACTS[each].symbol);
}

export function ion(text: string): ImplantSpecies {
  return named(text, IMPLANT_SPECIES, (each) => (each === 'BF2' ? 'BF2' : DOPANT_FACTS[each].symbol));
}

/** `text` as a name or a symbol, upper or lower case. */
function named<Name extends string>(
  text: string,
  names: readonly Name[],
  symbolOf: (name: Name) => string,
): Name {
  const wanted = text.trim().toLowerCase();
  const found = names.find((each) => [each, symbolOf(each)].some((word) => word.toLowerCase() === wanted));
  if (!found)
    throw new InvalidArgumentError(
      `Allowed are ${names.map((each) => (each === symbolOf(each) ? each : `${each} (${symbolOf(each)})`)).join(', ')}.`,
    );
  return found;
}
