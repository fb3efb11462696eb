import { describe, expect, test } from 'vitest';
import { dopantNamed } from '../../../src/core/study/table/dopantNames';

describe('dopantNamed', () => {
  test('recognises symbols, isotopes and names in the ways tables write them', () => {
    const spellings = {
      boron: [
        'B',
        '11B',
        'B11',
        '10B',
        'B-11',
        '^11B',
        '11B+',
        '[B]',
        'boron',
        'Boron conc.',
        'N_B',
        'B (atoms/cc)',
        'b',
        'BORON',
        'boron_cm3',
        'B conc',
      ],
      phosphorus: ['P', '31P', 'Phosphorus', 'phosphorous', 'P conc'],
      arsenic: ['As', '75As', 'As75', 'arsenic', 'As (atoms/cc)', 'AS', '75As-'],
      antimony: ['Sb', '121Sb', '123Sb', 'Antimony'],
      indium: ['In', '115In', 'indium'],
      gallium: ['Ga', '69Ga'],
      aluminium: ['Al', '27Al', 'aluminum', 'aluminium'],
    };
    for (const [dopant, texts] of Object.entries(spellings))
      for (const text of texts) expect([text, dopantNamed(text)]).toEqual([text, dopant]);
  });

  test('sees no dopant in other words, other elements or two dopants at once', () => {
    for (const text of [
      'Depth',
      'Si',
      '28Si',
      '16O',
      'Pressure',
      'Basic',
      'in depth',
      'B and As',
      'boron/arsenic',
      '',
      'Ba',
      '11BF',
    ])
      expect([text, dopantNamed(text)]).toEqual([text, undefined]);
  });
});
