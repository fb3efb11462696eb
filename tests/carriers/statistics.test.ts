import { describe, expect, test } from 'vitest';
import { carriersOf } from '../../src/core/carriers/carriers';
import { narrowingFactor } from '../../src/core/carriers/narrowing';
import { BOLTZMANN_EV } from '../../src/core/material/constants';
import { intrinsicDensity } from '../../src/core/material/intrinsic';
import { densitiesOfStates, thermalVoltage } from '../../src/core/material/silicon';
import { mobilityModel } from '../../src/core/mobility/list';
import { conduction } from '../../src/core/sheet/conduction';
import { layerReadings, layerSpans } from '../../src/core/sheet/layers';
import { choice } from '../support/carriers';
import { dopingOf } from '../support/doping';

const UM = 1e-4;
const film = (donors: number) =>
  dopingOf(
    () => donors,
    () => 1,
    UM,
  );
const sheet = (parts: Parameters<typeof choice>[0], donors = 1e20) => {
  const state = carriersOf(film(donors), choice(parts));
  return layerReadings(state, conduction(state, mobilityModel('klaassen')), layerSpans(state)[0])
    .sheetConductance;
};

describe('Fermi-Dirac statistics', () => {
  test('raise the potential of a degenerate layer as W. B. Joyce and R. W. Dixon say (1977, from memory)', () => {
    const [n, temperature] = [1e20, 300];
    const states = densitiesOfStates(temperature).conduction;
    const u = n / states;
    // eta = ln u + 0.353553 u - 4.95009e-3 u^2 + 1.48386e-4 u^3 - 4.42563e-6 u^4, good to 1e-3 at u = 3.5.
    const eta = Math.log(u) + 0.353553 * u - 4.95009e-3 * u ** 2 + 1.48386e-4 * u ** 3 - 4.42563e-6 * u ** 4;
    const state = carriersOf(film(n), choice({ temperature, statistics: 'fermi-dirac' }));
    const potential = state.electrostatics?.potential[0] ?? 0;
    const expected = eta + Math.log(states / intrinsicDensity(temperature));
    expect(potential / thermalVoltage(temperature)).toBeCloseTo(expected, 2);
  });

  test('agree with Boltzmann where silicon is not degenerate', () => {
    const potential = (statistics: 'boltzmann' | 'fermi-dirac') =>
      carriersOf(film(1e15), choice({ statistics })).electrostatics?.potential[0] ?? 0;
    expect(potential('fermi-dirac')).toBeCloseTo(potential('boltzmann'), 5);
  });

  test('leave the sheet resistance of a neutral layer alone: its majority is set by the doping', () => {
    for (const carriers of ['poisson', 'neutral'] as const)
      expect(sheet({ carriers, statistics: 'fermi-dirac' }) / sheet({ carriers })).toBeCloseTo(1, 6);
  });
});

describe('apparent band-gap narrowing', () => {
  // Values computed independently from the recalled fits, in meV at 1e18, 1e19, 1e20 cm^-3.
  test.each([
    ['slotboom1976', [42, 83, 125]],
    ['klaassen1992', [29, 61, 92]],
  ] as const)('%s', (name, values) => {
    values.forEach((meV, k) => {
      const factor = narrowingFactor(name, 10 ** (18 + k), 300);
      expect(2e3 * BOLTZMANN_EV * 300 * Math.log(factor)).toBeCloseTo(meV, -0.5);
    });
  });

  test('raises the np product and leaves the majority alone', () => {
    const [plain, narrowed] = (['none', 'klaassen1992'] as const).map((narrowing) =>
      carriersOf(film(1e19), choice({ narrowing })),
    );
    expect(narrowed.electrons[0] / plain.electrons[0]).toBeCloseTo(1, 9);
    expect(narrowed.holes[0] / plain.holes[0]).toBeCloseTo(
      narrowingFactor('klaassen1992', 1e19, 298.15) ** 2,
      6,
    );
    expect(sheet({ narrowing: 'slotboom1976' }) / sheet({})).toBeCloseTo(1, 6);
  });

  test('of none is none', () => {
    expect(narrowingFactor('none', 1e20, 300)).toBe(1);
  });
});
