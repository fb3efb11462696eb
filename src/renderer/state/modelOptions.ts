/** What the choices about carriers are called for people. */

import {
  CARRIER_NAMES,
  DIFFUSION_NAMES,
  IONISATION_NAMES,
  NARROWING_NAMES,
  STATISTICS_NAMES,
} from '../../core/index';

type Option = { readonly value: string; readonly name: string };

const named = <T extends string>(values: readonly T[], names: Record<T, string>): readonly Option[] =>
  values.map((value) => ({ value, name: names[value] }));

export const CARRIER_OPTIONS = named(CARRIER_NAMES, {
  poisson: 'Poisson, in equilibrium',
  neutral: 'neutral everywhere',
});

export const IONISATION_OPTIONS = named(IONISATION_NAMES, {
  levels: 'dopant levels (Altermatt 2006)',
  complete: 'complete',
});

export const DIFFUSION_OPTIONS = named(DIFFUSION_NAMES, {
  constant: 'closed forms, constant D',
  extrinsic: 'solved, coupled by carriers',
});

export const STATISTICS_OPTIONS = named(STATISTICS_NAMES, {
  boltzmann: 'Boltzmann',
  'fermi-dirac': 'Fermi-Dirac',
});

export const NARROWING_OPTIONS = named(NARROWING_NAMES, {
  none: 'no band-gap narrowing',
  slotboom1976: 'Slotboom 1976',
  klaassen1992: 'Klaassen 1992',
});
