/** What the ways to read a table are called for people. */

import { TABLE_DELIMITERS, TABLE_ENCODINGS } from '../../core/index';

export interface Option {
  readonly value: string;
  readonly name: string;
}

const DELIMITER_NAMES: Record<(typeof TABLE_DELIMITERS)[number], string> = {
  tab: 'tab',
  semicolon: 'semicolon ;',
  comma: 'comma ,',
  pipe: 'bar |',
  space: 'blanks',
};

export const DELIMITERS: readonly Option[] = TABLE_DELIMITERS.map((value) => ({
  value,
  name: DELIMITER_NAMES[value],
}));
export const ENCODINGS: readonly Option[] = TABLE_ENCODINGS.map((value) => ({ value, name: value }));
export const DECIMALS: readonly Option[] = [
  { value: '.', name: 'point  1.5' },
  { value: ',', name: 'comma  1,5' },
];
export const DEPTH_UNITS: readonly Option[] = [
  { value: 'nm', name: 'nm' },
  { value: 'um', name: 'µm' },
  { value: 'A', name: 'Å' },
  { value: 'cm', name: 'cm' },
];
export const CONCENTRATION_UNITS: readonly Option[] = [
  { value: 'cm-3', name: 'cm⁻³' },
  { value: 'm-3', name: 'm⁻³' },
];

export const nameOf = (options: readonly Option[], value: string | undefined): string =>
  options.find((option) => option.value === value)?.name ?? 'not clear';
