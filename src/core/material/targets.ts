/** What ions are shot into: amorphous materials by their atoms and densities. */

export interface Target {
  /** g/cm^3 */
  readonly density: number;
  /** Atoms of each element in a formula unit. */
  readonly formula: Readonly<Record<string, number>>;
}

/**
 * Silicon 2.33, thermal oxide 2.20, nitride 3.10 g/cm^3; a novolak photoresist as C8H8O at 1.25 g/cm^3. Common practice, no source; resists
 * differ in density by a tenth.
 */
export const TARGETS = {
  silicon: { density: 2.33, formula: { Si: 1 } },
  oxide: { density: 2.2, formula: { Si: 1, O: 2 } },
  nitride: { density: 3.1, formula: { Si: 3, N: 4 } },
  photoresist: { density: 1.25, formula: { C: 8, H: 8, O: 1 } },
} as const satisfies Record<string, Target>;

export type TargetName = keyof typeof TARGETS;

const AVOGADRO = 6.02214076e23;

/** Atoms of each element in a cubic centimetre; `massOf` gives u. */
export function atomDensities(target: Target, massOf: (symbol: string) => number): Map<string, number> {
  const entries = Object.entries(target.formula);
  const molar = entries.reduce((sum, [symbol, count]) => sum + count * massOf(symbol), 0);
  return new Map(entries.map(([symbol, count]) => [symbol, (count * target.density * AVOGADRO) / molar]));
}
