import { describe, expect, test } from 'vitest';
import { concentrationOf, resistivityOf } from '../../src/core/material/mf723';
import { uniformResistivity } from '../../src/core/mobility/resistivity';
import { uniformSilicon } from '../../src/core/mobility/uniform';
import { IONISATION_NAMES, MOBILITY_NAMES } from '../../src/core/study/names';
import { NoSolution } from '../../src/core/study/problem';

describe('resistivity of uniformly doped silicon', () => {
  test.each(
    MOBILITY_NAMES.flatMap((name) => IONISATION_NAMES.map((ionisation) => [name, ionisation] as const)),
  )('by %s, %s ionisation: from a concentration to the resistivity and back', (mobility, ionisation) => {
    for (const dopant of ['boron', 'phosphorus', 'arsenic'] as const)
      for (const concentration of [1e12, 1e15, 3e17, 1e19, 1.5e20]) {
        const there = uniformResistivity({
          dopant,
          concentration,
          temperature: 298.15,
          mobility,
          ionisation,
        });
        const back = uniformResistivity({
          dopant,
          resistivity: there.resistivity,
          temperature: 298.15,
          mobility,
          ionisation,
        });
        expect(Math.abs(back.concentration / concentration - 1)).toBeLessThan(1e-10);
        expect(back.mobility).toBeCloseTo(there.mobility, 6);
      }
  });

  test('is what the mobility model says of that doping', () => {
    const answer = uniformResistivity({
      dopant: 'boron',
      concentration: 1e16,
      temperature: 300,
      mobility: 'arora',
      ionisation: 'levels',
    });
    expect(answer.resistivity).toBe(uniformSilicon('boron', 1e16, 300, 'arora').resistivity);
  });

  test('stands beside the answer of the standard for the same question', () => {
    const common = {
      dopant: 'phosphorus',
      temperature: 296.15,
      mobility: 'klaassen',
      ionisation: 'levels',
    } as const;
    expect(uniformResistivity({ ...common, concentration: 1e17 }).standard).toEqual(
      resistivityOf('phosphorus', 1e17),
    );
    expect(uniformResistivity({ ...common, resistivity: 3 }).standard).toEqual(
      concentrationOf('phosphorus', 3),
    );
  });

  test('carries the warnings of the model and of the intrinsic density', () => {
    const { warnings } = uniformResistivity({
      dopant: 'indium',
      concentration: 1e16,
      temperature: 480,
      mobility: 'masetti',
      ionisation: 'complete',
    });
    expect(warnings.map(({ code }) => code)).toEqual(
      expect.arrayContaining(['intrinsic-range', 'mobility-range', 'mobility-borrowed']),
    );
  });

  test.each([1e-6, 1e6])(
    '%d ohm cm is no resistivity silicon can have, and what can be reached is told',
    (resistivity) => {
      const ask = () =>
        uniformResistivity({
          dopant: 'boron',
          resistivity,
          temperature: 298.15,
          mobility: 'klaassen',
          ionisation: 'levels',
        });
      expect(ask).toThrow(NoSolution);
      expect(ask).toThrow(/from \S+ to \S+ ohm cm can be reached/);
    },
  );

  test('near intrinsic silicon the branch on which doping lowers the resistivity is meant', () => {
    // At 500 K ni is near 3e14: 1e14 atoms are hidden below it, 1e15 are not.
    const { resistivity } = uniformResistivity({
      dopant: 'boron',
      concentration: 2e15,
      temperature: 500,
      mobility: 'klaassen',
      ionisation: 'levels',
    });
    const back = uniformResistivity({
      dopant: 'boron',
      resistivity,
      temperature: 500,
      mobility: 'klaassen',
      ionisation: 'levels',
    });
    expect(Math.abs(back.concentration / 2e15 - 1)).toBeLessThan(1e-10);
  });
});
