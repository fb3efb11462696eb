/** The closed lists of names a study may use, each with what it stands for. */

export const MOBILITY_NAMES = ['klaassen', 'masetti', 'arora', 'caughey-thomas', 'mf723'] as const;
export type MobilityName = (typeof MOBILITY_NAMES)[number];

/** `poisson`: electrostatic equilibrium through the whole stack; `neutral`: no charge anywhere. */
export const CARRIER_NAMES = ['poisson', 'neutral'] as const;

/** `complete`: every active dopant is ionised; `levels`: dopant levels that move into the band as doping grows. */
export const IONISATION_NAMES = ['complete', 'levels'] as const;

export const STATISTICS_NAMES = ['boltzmann', 'fermi-dirac'] as const;

/** Published apparent band-gap narrowing. */
export const NARROWING_NAMES = ['none', 'slotboom1976', 'klaassen1992'] as const;
export type NarrowingName = (typeof NARROWING_NAMES)[number];

/** `universal`: fits of transport moments with the universal potential; `lss1975`: the tables of 1975. */
export const RANGE_SETS = ['universal', 'lss1975'] as const;
export type RangeSet = (typeof RANGE_SETS)[number];

/** `fair1981`, `plummer2000`: intrinsic diffusivities and their charge states; `fuller1956`: those of heavily doped diffusions. */
export const DIFFUSIVITY_SETS = ['fair1981', 'plummer2000', 'fuller1956'] as const;
export type DiffusivitySet = (typeof DIFFUSIVITY_SETS)[number];

/** `constant`: closed forms with the intrinsic diffusivity; `extrinsic`: solved, all dopants coupled through the carriers. */
export const DIFFUSION_NAMES = ['constant', 'extrinsic'] as const;
export type DiffusionName = (typeof DIFFUSION_NAMES)[number];

export const TABLE_DELIMITERS = ['tab', 'semicolon', 'comma', 'pipe', 'space'] as const;
export type TableDelimiter = (typeof TABLE_DELIMITERS)[number];

export const TABLE_ENCODINGS = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const;
export type TableEncoding = (typeof TABLE_ENCODINGS)[number];
