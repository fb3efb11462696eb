import { describe, expect, test } from 'vitest';
import { mobilityModel } from '../../src/core/mobility/list';
import { mobilityWarnings } from '../../src/core/mobility/warnings';
import { inputOf } from './oneDepth';

const warningsOf = (name: Parameters<typeof mobilityModel>[0], depth: Parameters<typeof inputOf>[0]) =>
  mobilityWarnings(mobilityModel(name), inputOf(depth));

describe('warnings about a mobility model', () => {
  test('are absent for ordinary doping at 25 C, whatever the model, but for the one with a known fault', () => {
    const depth = {
      dopants: { boron: 3e17, phosphorus: 1e15 },
      electrons: 1e3,
      holes: 3e17,
      temperature: 298.15,
    };
    for (const name of ['klaassen', 'masetti', 'arora', 'mf723'] as const)
      expect(warningsOf(name, depth)).toEqual([]);
    expect(warningsOf('caughey-thomas', depth)).toEqual([
      { code: 'mobility-caution', message: expect.stringContaining('22 to 40 % too low') },
    ]);
  });

  test('name the model, its range and the worst concentration, once', () => {
    const depths = { dopants: { phosphorus: 5e20, boron: 2e19 }, electrons: 4.8e20, holes: 1 };
    expect(warningsOf('arora', depths)).toEqual([
      {
        code: 'mobility-range',
        message: '5.2e20 cm^-3 of ionised impurities is above the range of Arora 1982 (1e13 to 1e20 cm^-3).',
      },
    ]);
    const light = { dopants: { phosphorus: 2e12 }, electrons: 2e12, holes: 1e7 };
    expect(warningsOf('klaassen', light)[0].message).toContain('2e12 cm^-3 of ionised impurities is below');
  });

  test('say what a temperature outside the range means', () => {
    const hot = { dopants: { boron: 1e17 }, electrons: 1e8, holes: 1e17, temperature: 523.15 };
    expect(warningsOf('klaassen', hot)).toEqual([
      {
        code: 'mobility-range',
        message: '250 C is outside the range of Klaassen 1992 (unified) (-196 to 227 C).',
      },
    ]);
    expect(warningsOf('masetti', { ...hot, temperature: 398.15 })[0].message).toBe(
      'Masetti 1983 gives the mobility at room temperature (22 to 32 C), not at 125 C: its values do not change with temperature.',
    );
  });

  test('name each dopant that borrows coefficients', () => {
    const depth = { dopants: { antimony: 1e18, gallium: 1e17 }, electrons: 9e17, holes: 1e2 };
    expect(warningsOf('klaassen', depth).map(({ code, message }) => [code, message])).toEqual([
      ['mobility-borrowed', expect.stringContaining('no coefficients for antimony; those of phosphorus')],
      ['mobility-borrowed', expect.stringContaining('no coefficients for gallium; those of boron')],
    ]);
    expect(warningsOf('arora', depth)).toEqual([]);
  });
});
