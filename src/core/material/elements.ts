/** Elements as ions and as atoms of targets. */

export interface Element {
  readonly symbol: string;
  /** Atomic number. */
  readonly Z: number;
  /** As an ion: the isotope that is implanted, u. */
  readonly ionMass: number;
  /** As part of a target: the mean of the natural isotopes, u. */
  readonly mass: number;
}

const element = (symbol: string, Z: number, ionMass: number, mass: number): [string, Element] => [
  symbol,
  { symbol, Z, ionMass, mass },
];

/** Masses: IUPAC standard atomic weights, isotopes as implanters select them (common practice, from memory). */
export const ELEMENTS: ReadonlyMap<string, Element> = new Map([
  element('H', 1, 1.008, 1.008),
  element('B', 5, 11.009, 10.81),
  element('C', 6, 12, 12.011),
  element('N', 7, 14.003, 14.007),
  element('O', 8, 15.995, 15.999),
  element('F', 9, 18.998, 18.998),
  element('Al', 13, 26.982, 26.982),
  element('Si', 14, 27.977, 28.086),
  element('P', 15, 30.974, 30.974),
  element('Ga', 31, 68.926, 69.723),
  element('Ge', 32, 73.921, 72.63),
  element('As', 33, 74.922, 74.922),
  element('In', 49, 114.904, 114.818),
  element('Sb', 51, 120.904, 121.76),
]);
