import { describe, expect, test } from 'vitest';
import { convert, namedUnit, plainSpelling, UNITS, type Unit, unitOf } from '../../src/core/study/units';

const unit = (name: string) => namedUnit(name) as Unit;

describe('unitOf', () => {
  test('knows every spelling of the length units', () => {
    const spellings = {
      um: ['um', 'µm', 'μm', 'micron', 'microns', 'UM', 'micrometre'],
      nm: ['nm', 'NM', 'nanometer'],
      A: ['A', 'Å', '\u212b', 'A\u030a', 'Ang', 'angstrom', 'Angstroms', 'Ångström'],
      cm: ['cm'],
    };
    for (const [name, texts] of Object.entries(spellings))
      for (const text of texts) expect([text, unitOf(text, ['length'])?.name]).toEqual([text, name]);
  });

  test('knows every spelling of the concentration units', () => {
    const spellings = {
      'cm-3': [
        'cm-3',
        'cm^-3',
        'cm⁻³',
        '1/cm3',
        '/cm3',
        '1/cm³',
        'at/cm3',
        'atoms/cc',
        'atoms/cm3',
        'Atoms/cm^3',
        'at./cm3',
        'at.cm-3',
        'atoms·cm⁻³',
        'atoms cm-3',
        'per cm3',
        'cm**-3',
        'cm\u22123',
        'ions/cm3',
      ],
      'm-3': ['m-3', 'm^-3', 'm⁻³', '1/m3', 'at/m3', 'atoms/m³'],
    };
    for (const [name, texts] of Object.entries(spellings))
      for (const text of texts) expect([text, unitOf(text, ['concentration'])?.name]).toEqual([text, name]);
  });

  test('does not take a volume, a count rate or a word for a unit', () => {
    for (const text of ['cm3', 'cc', 'c/s', 'counts', 'Depth', '', 'm', 'As'])
      expect([text, unitOf(text, ['length', 'concentration'])]).toEqual([text, undefined]);
  });

  test('every unit spells its own name, and no two share one', () => {
    for (const entry of UNITS) expect(unitOf(entry.name, [entry.kind])).toBe(entry);
    expect(new Set(UNITS.map((entry) => entry.name)).size).toBe(UNITS.length);
  });
});

describe('convert', () => {
  test('is exact where the units differ by a power of ten', () => {
    expect(convert(120, unit('nm'), unit('um'))).toBe(0.12);
    expect(convert(0.3, unit('um'), unit('nm'))).toBe(300);
    expect(convert(5000, unit('A'), unit('nm'))).toBe(500);
    expect(convert(0.7, unit('um'), unit('cm'))).toBe(7e-5);
    expect(convert(1e21, unit('m-3'), unit('cm-3'))).toBe(1e15);
    expect(convert(1e15, unit('cm-3'), unit('m-3'))).toBe(1e21);
    expect(convert(0.012, unit('ohm m'), unit('ohm cm'))).toBe(1.2);
  });

  test('shifts temperatures both ways', () => {
    expect(convert(25, unit('C'), unit('K'))).toBe(298.15);
    expect(convert(273.15, unit('K'), unit('C'))).toBe(0);
  });
});

test('plainSpelling keeps ordinary text', () => {
  expect(plainSpelling('2 h 30 min')).toBe('2 h 30 min');
  expect(plainSpelling('10\u207b\u00b3 × 5 µm')).toBe('10^-3 * 5 um');
});
