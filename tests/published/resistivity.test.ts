/** Resistivity of uniformly doped silicon against printed tables, figures and worked examples. */

import { describe, expect, test } from 'vitest';
import type { Dopant } from '../../src/core/material/dopants';
import { MF723_TEMPERATURE, resistivityOf } from '../../src/core/material/mf723';
import { klaassen } from '../../src/core/mobility/klaassen';
import { uniformSilicon } from '../../src/core/mobility/uniform';
import type { MobilityName } from '../../src/core/study/names';
import { deviation, oneDepth } from '../mobility/oneDepth';
import { modelTable } from './modelTable';
import { publishedTable } from './table';
import { thurberBoronResistivity, thurberPhosphorusResistivity } from './thurber';

interface ResistivityRow {
  dopant: Dopant;
  concentration_cm3: number;
  resistivity_ohmCm: number;
}

describe('R. Hull (ed.), Properties of Crystalline Silicon (1999), pp 413-416', () => {
  const table = publishedTable<ResistivityRow>('hull-1999');

  test('prints the resistivities that the standard relation gives', () => {
    // Three printed digits: 0.5 %; 430 at 1e13 carries two: 1.2 %; boron at 1e21 stands 4 % above the standard's formula.
    expect(table).toHaveLength(14);
    for (const { dopant, concentration_cm3, resistivity_ohmCm } of table) {
      const tolerance = dopant === 'phosphorus' ? 0.012 : concentration_cm3 === 1e21 ? 0.05 : 0.005;
      const { value } = resistivityOf(dopant, concentration_cm3);
      expect(deviation(value, resistivity_ohmCm)).toBeLessThan(tolerance);
    }
  });

  test.each<[MobilityName, number]>([
    ['klaassen', 0.1],
    ['masetti', 0.12],
    ['arora', 0.12],
  ])('is met by %s to 1e20 when every dopant atom is ionised', (model, tolerance) => {
    // Around 1e18 up to a quarter of the atoms are not ionised, which is in the table and not in the models: 12 % (phosphorus)
    // and 13 % (boron) is what that costs, a little less for models that lean the other way.
    for (const { dopant, concentration_cm3, resistivity_ohmCm } of table) {
      if (concentration_cm3 > 1e20) continue;
      const { resistivity } = uniformSilicon(dopant, concentration_cm3, MF723_TEMPERATURE, model);
      expect(deviation(resistivity, resistivity_ohmCm)).toBeLessThan(tolerance + 1e-3);
    }
  });
});

describe('a public conversion table for boron', () => {
  test('prints the resistivities that the standard relation gives', () => {
    // Three printed digits.
    for (const { concentration_cm3, resistivity_ohmCm } of publishedTable<ResistivityRow>('boron-conversion'))
      expect(deviation(resistivityOf('boron', concentration_cm3).value, resistivity_ohmCm)).toBeLessThan(
        0.005,
      );
  });
});

describe('S. M. Sze and J. C. Irvin, Solid-State Electron. 11, 599 (1968)', () => {
  test('shows p-type resistivities within the reading of the figure', () => {
    // The digitised curve, drawn before the mobility data of 1980, scatters by 11 % about the standard: 12 %; and 3 % for 300 K.
    const points = publishedTable<ResistivityRow>('sze-irvin-1968');
    expect(points).toHaveLength(10);
    for (const { concentration_cm3, resistivity_ohmCm } of points) {
      expect(deviation(resistivityOf('boron', concentration_cm3).value, resistivity_ohmCm)).toBeLessThan(
        0.12,
      );
      const { resistivity } = uniformSilicon('boron', concentration_cm3, 300, 'klaassen');
      expect(deviation(resistivity, resistivity_ohmCm)).toBeLessThan(0.15);
    }
  });
});

describe('W. R. Thurber et al., J. Electrochem. Soc. 127, 1807 and 2291 (1980)', () => {
  test('give the resistivity of the standard, 4 C warmer', () => {
    // Lightly doped silicon gains 0.75 %/C, 2.9 % for 3.85 C; above 1e18 next to nothing. The standard refits the same data: 0.9 %.
    const light = [1e14, 1e15, 1e16];
    for (const concentration of light) {
      const boron = resistivityOf('boron', concentration).value / thurberBoronResistivity(concentration);
      const phosphorus =
        resistivityOf('phosphorus', concentration).value / thurberPhosphorusResistivity(concentration);
      expect(Math.abs(boron - 0.972)).toBeLessThan(0.004);
      expect(Math.abs(phosphorus - 0.972)).toBeLessThan(0.004);
    }
    for (const concentration of [1e18, 1e19, 1e20]) {
      const boron = thurberBoronResistivity(concentration);
      const phosphorus = thurberPhosphorusResistivity(concentration);
      expect(deviation(resistivityOf('boron', concentration).value, boron)).toBeLessThan(0.01);
      expect(deviation(resistivityOf('phosphorus', concentration).value, phosphorus)).toBeLessThan(0.01);
    }
  });
});

describe('B. Van Zeghbroeck, Principles of Semiconductor Devices, example on resistivity', () => {
  test('gives 22.6 and 22.0 mOhm cm for phosphorus and arsenic, 24.5 S/cm for boron, at 1e18', () => {
    // https://ecee.colorado.edu/~bart/book/ex006.htm; three printed digits. Klaassen's model contains the coefficients it uses.
    expect(deviation(uniformSilicon('phosphorus', 1e18, 300, 'klaassen').resistivity, 0.0226)).toBeLessThan(
      0.005,
    );
    expect(deviation(uniformSilicon('arsenic', 1e18, 300, 'klaassen').resistivity, 0.022)).toBeLessThan(
      0.005,
    );
    expect(deviation(1 / uniformSilicon('boron', 1e18, 300, 'klaassen').resistivity, 24.5)).toBeLessThan(
      0.005,
    );
  });
});

describe('D. A. Neamen, Semiconductor Physics and Devices, compensated silicon', () => {
  const conductivity = (donors: number, acceptors: number) => {
    const net = donors - acceptors;
    const carriers = { electrons: Math.max(net, 0), holes: Math.max(-net, 0) };
    const at = oneDepth(klaassen, { dopants: { phosphorus: donors, boron: acceptors }, ...carriers });
    return 1.6e-19 * (carriers.electrons * at.electrons + carriers.holes * at.holes);
  };

  test('example 5.3: N_a = 1e17 and 16 S/cm need N_d = 3.5e17, by the mobility of all impurities', () => {
    // The mobility is read off a figure: 15 %.
    expect(deviation(conductivity(3.5e17, 1e17), 16)).toBeLessThan(0.15);
  });

  test('design example 5.4: N_a = 1.25e16 with N_d = 5e15 conduct 0.492 S/cm', () => {
    // 410 cm^2/Vs read off a figure: 3 %.
    expect(deviation(conductivity(5e15, 1.25e16), 0.492)).toBeLessThan(0.03);
  });
});

describe('the models against the standard MF723, 1e14 to 1e20 (arsenic 1e19 to 1e20), full ionisation, 23 C', () => {
  // Measured with this program and pinned: worst and median |deviation| of resistivity in per cent. They are facts about the
  // models against the standard; 0.05 is the allowance for rounding to the digits below.
  const pinned: [MobilityName, Dopant, number, number][] = [
    ['klaassen', 'boron', 7.53, 2.35],
    ['klaassen', 'phosphorus', 9.41, 1.49],
    ['klaassen', 'arsenic', 8.73, 4.84],
    ['masetti', 'boron', -10.61, 1.77],
    ['masetti', 'phosphorus', 10.68, 2.93],
    ['masetti', 'arsenic', 9.09, 5.21],
    ['arora', 'boron', -8.38, 2.68],
    ['arora', 'phosphorus', -12.03, 4.57],
    ['arora', 'arsenic', -29.69, 16.93],
    ['caughey-thomas', 'boron', 49.18, 12.8],
    ['caughey-thomas', 'phosphorus', 13.45, 8.79],
    ['caughey-thomas', 'arsenic', -10.94, 4.92],
    ['mf723', 'boron', 0, 0],
    ['mf723', 'phosphorus', 0, 0],
    ['mf723', 'arsenic', 0, 0],
  ];

  test('stay where they were measured', () => {
    const table = modelTable();
    expect(table.map(({ model, dopant }) => [model, dopant])).toEqual(pinned.map((row) => row.slice(0, 2)));
    for (const [index, [, , worst, median]] of pinned.entries()) {
      expect(Math.abs(table[index].worst_percent - worst)).toBeLessThan(0.05);
      expect(Math.abs(table[index].median_percent - median)).toBeLessThan(0.05);
    }
  });
});
