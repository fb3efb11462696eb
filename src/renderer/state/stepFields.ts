/** Which fields a recipe step shows, in order, with the choices it shapes itself. Keys are those of the study document. */

import {
  DIFFUSIVITY_SETS,
  DOPANT_FACTS,
  DOPANTS,
  dopantOf,
  IMPLANT_SPECIES,
  RANGE_SETS,
  type Study,
  type StudyStep,
} from '../../core/index';
import type { DisplayUnit } from './units';

export interface QuantitySpec {
  readonly kind: 'quantity';
  /** Key inside the step. */
  readonly key: string;
  readonly label: string;
  readonly unit: DisplayUnit;
  /** What an empty field means; absent where a value is needed. */
  readonly whenEmpty?: string;
}

export interface ChoiceSpec {
  readonly kind: 'choice';
  readonly key: string;
  readonly label: string;
  readonly options: readonly { readonly value: string; readonly name: string }[];
  /** The chosen option; by default the value at `key`. */
  readonly chosen?: string;
  /** The step with another option; by default the value at `key` replaced. */
  readonly choose?: (option: string) => StudyStep;
}

export type FieldSpec = QuantitySpec | ChoiceSpec;
type Option = ChoiceSpec['options'][number];

const dopantOption = (dopant: (typeof DOPANTS)[number]): Option => ({
  value: dopant,
  name: `${dopant} (${DOPANT_FACTS[dopant].symbol}, ${DOPANT_FACTS[dopant].role})`,
});

export const DOPANT_OPTIONS: readonly Option[] = DOPANTS.map(dopantOption);
const SPECIES_OPTIONS: readonly Option[] = IMPLANT_SPECIES.map((species) =>
  species === 'BF2' ? { value: species, name: 'BF₂ (carries boron)' } : dopantOption(species),
);

const RANGE_NAMES: Record<(typeof RANGE_SETS)[number], string> = {
  universal: 'universal potential',
  lss1975: 'LSS tables of 1975',
};
const DIFFUSIVITY_NAMES: Record<(typeof DIFFUSIVITY_SETS)[number], string> = {
  fair1981: 'Fair 1981, intrinsic',
  plummer2000: 'Plummer, Deal, Griffin 2000',
  fuller1956: 'Fuller, Ditzenberger 1956',
};

export const RANGE_OPTIONS: readonly Option[] = RANGE_SETS.map((value) => ({
  value,
  name: RANGE_NAMES[value],
}));
export const DIFFUSIVITY_OPTIONS: readonly Option[] = DIFFUSIVITY_SETS.map((value) => ({
  value,
  name: DIFFUSIVITY_NAMES[value],
}));

const dopant: ChoiceSpec = { kind: 'choice', key: 'dopant', label: 'Dopant', options: DOPANT_OPTIONS };
const quantity = (key: string, label: string, unit: DisplayUnit, whenEmpty?: string): QuantitySpec => ({
  kind: 'quantity',
  key,
  label,
  unit,
  whenEmpty,
});

/** The fields of a step as it stands: some appear only beside others. */
export function stepFields(step: StudyStep, study: Study): FieldSpec[] {
  switch (step.step) {
    case 'implant':
      return implantFields(step, study);
    case 'anneal':
      return [
        quantity('temperature_C', 'Temperature', 'C'),
        quantity('time_min', 'Time', 'min'),
        quantity('endTemperature_C', 'Ramp to', 'C', 'constant'),
        {
          kind: 'choice',
          key: 'transient',
          label: 'Implant damage',
          chosen: step.transient ?? 'none',
          options: [
            { value: 'none', name: 'not computed' },
            { value: 'plusOne', name: '“+1” estimate (within about 3×)' },
          ],
          choose: (option) => {
            const { transient: _, ...bare } = step;
            return option === 'plusOne' ? { ...bare, transient: option } : bare;
          },
        },
      ];
    case 'predeposition':
      return [
        dopant,
        quantity('temperature_C', 'Temperature', 'C'),
        quantity('time_min', 'Time', 'min'),
        quantity('surface_cm3', 'Surface', 'cm-3', 'solid solubility'),
      ];
    case 'epitaxy':
      return epitaxyFields(step);
    case 'etch':
      return [quantity('thickness_um', 'Removed', 'um')];
    case 'oxidation':
      return [
        {
          kind: 'choice',
          key: 'ambient',
          label: 'Ambient',
          options: [
            { value: 'dry', name: 'dry oxygen' },
            { value: 'wet', name: 'steam' },
          ],
        },
        quantity('temperature_C', 'Temperature', 'C'),
        quantity('time_min', 'Time', 'min'),
      ];
    case 'stripOxide':
      return [];
    case 'table':
      return [dopant];
    case 'gaussian':
      return [
        dopant,
        quantity('peak_cm3', 'Peak', 'cm-3'),
        quantity('depth_um', 'Peak depth', 'um'),
        quantity('sigma_um', 'Sigma', 'um'),
      ];
    case 'erfc':
      return [dopant, quantity('surface_cm3', 'Surface', 'cm-3'), quantity('length_um', 'Length', 'um')];
    case 'uniform':
      return [
        dopant,
        quantity('concentration_cm3', 'Concentration', 'cm-3'),
        quantity('from_um', 'From', 'um'),
        quantity('to_um', 'To', 'um'),
      ];
  }
}

function implantFields(step: Extract<StudyStep, { step: 'implant' }>, study: Study): FieldSpec[] {
  const { screen } = step;
  const chooseScreen = (option: string): StudyStep => {
    const { screen: _, ...bare } = step;
    if (option === 'none') return bare;
    return {
      ...bare,
      screen: { material: option as 'oxide' | 'nitride', thickness_nm: screen?.thickness_nm ?? 20 },
    };
  };
  const chooseRanges = (option: string): StudyStep => {
    const { ranges: _, ...rest } = step;
    return option === 'study' ? rest : { ...rest, ranges: option as (typeof RANGE_SETS)[number] };
  };
  return [
    {
      kind: 'choice',
      key: 'dopant',
      label: 'Species',
      options: SPECIES_OPTIONS,
      choose: (option) => {
        const { tail, ...bare } = step;
        const dopant = option as typeof step.dopant;
        return tail && dopantOf(dopant) === 'boron' ? { ...bare, dopant, tail } : { ...bare, dopant };
      },
    },
    quantity('dose_cm2', 'Dose', 'cm-2'),
    quantity('energy_keV', 'Energy', 'keV'),
    {
      kind: 'choice',
      key: 'screen',
      label: 'Screen film',
      chosen: screen?.material ?? 'none',
      options: [
        { value: 'none', name: 'none' },
        { value: 'oxide', name: 'oxide' },
        { value: 'nitride', name: 'nitride' },
      ],
      choose: chooseScreen,
    },
    ...(screen ? [quantity('screen.thickness_nm', 'Film thickness', 'nm')] : []),
    {
      kind: 'choice',
      key: 'shape',
      label: 'Shape',
      options: [
        { value: 'pearson', name: 'Pearson (four moments)' },
        { value: 'gaussian', name: 'Gaussian' },
      ],
    },
    ...(dopantOf(step.dopant) === 'boron' ? [tailField(step)] : []),
    {
      kind: 'choice',
      key: 'ranges',
      label: 'Ranges',
      chosen: step.ranges ?? 'study',
      options: [
        { value: 'study', name: `as in models (${RANGE_NAMES[study.models.ranges]})` },
        ...RANGE_OPTIONS,
      ],
      choose: chooseRanges,
    },
  ];
}

function tailField(step: Extract<StudyStep, { step: 'implant' }>): ChoiceSpec {
  return {
    kind: 'choice',
    key: 'tail',
    label: 'Channelling',
    chosen: step.tail ?? 'none',
    options: [
      { value: 'none', name: 'not computed' },
      { value: 'exponential', name: 'exponential tail, 45 nm' },
    ],
    choose: (option) => {
      const { tail: _, ...bare } = step;
      return option === 'exponential' ? { ...bare, tail: option } : bare;
    },
  };
}

function epitaxyFields(step: Extract<StudyStep, { step: 'epitaxy' }>): FieldSpec[] {
  const choose = (option: string): StudyStep => {
    const { dopant: _, concentration_cm3: concentration, ...bare } = step;
    if (option === 'none') return bare;
    return { ...bare, dopant: option as (typeof DOPANTS)[number], concentration_cm3: concentration ?? 1e16 };
  };
  return [
    quantity('thickness_um', 'Thickness', 'um'),
    {
      kind: 'choice',
      key: 'dopant',
      label: 'Dopant',
      chosen: step.dopant ?? 'none',
      options: [{ value: 'none', name: 'undoped' }, ...DOPANT_OPTIONS],
      choose,
    },
    ...(step.dopant ? [quantity('concentration_cm3', 'Concentration', 'cm-3')] : []),
  ];
}
