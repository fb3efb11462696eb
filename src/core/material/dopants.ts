/** The dopants the program knows: what they are called, which sign they carry, what they weigh. */

export const DOPANTS = [
  'boron',
  'phosphorus',
  'arsenic',
  'antimony',
  'indium',
  'gallium',
  'aluminium',
] as const;
export type Dopant = (typeof DOPANTS)[number];

/** What an implanter can be asked for: every dopant, and the molecular ion that carries boron. */
export const IMPLANT_SPECIES = [...DOPANTS, 'BF2'] as const;
export type ImplantSpecies = (typeof IMPLANT_SPECIES)[number];

export type DopantRole = 'donor' | 'acceptor';

/** Chemical symbol and electrical role of each dopant in silicon. */
export const DOPANT_FACTS: Record<Dopant, { symbol: string; role: DopantRole }> = {
  boron: { symbol: 'B', role: 'acceptor' },
  phosphorus: { symbol: 'P', role: 'donor' },
  arsenic: { symbol: 'As', role: 'donor' },
  antimony: { symbol: 'Sb', role: 'donor' },
  indium: { symbol: 'In', role: 'acceptor' },
  gallium: { symbol: 'Ga', role: 'acceptor' },
  aluminium: { symbol: 'Al', role: 'acceptor' },
};

/** The dopant an implanted species leaves in the silicon. */
export function dopantOf(species: ImplantSpecies): Dopant {
  return species === 'BF2' ? 'boron' : species;
}
