import { describe, expect, test } from 'vitest';
import { equilibrium } from '../../src/core/carriers/equilibrium';
import { degeneracyWarnings } from '../../src/core/carriers/warnings';
import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { intrinsicDensity } from '../../src/core/material/intrinsic';
import { densitiesOfStates, PERMITTIVITY, thermalVoltage } from '../../src/core/material/silicon';
import { mobilityModel } from '../../src/core/mobility/list';
import { integrate } from '../../src/core/numeric/simpson';
import type { SampledDoping } from '../../src/core/profile/doping';
import { conduction } from '../../src/core/sheet/conduction';
import { layerReadings, layerSpans } from '../../src/core/sheet/layers';
import { choice } from '../support/carriers';
import { dopingOf } from '../support/doping';

const UM = 1e-4;
const ROOM = 298.15;
const volt = thermalVoltage(ROOM);
const ni = intrinsicDensity(ROOM);
const box = (value: number, to: number) => (x: number) => (x < to ? value : 1);
const solved = (doping: SampledDoping, parts: Parameters<typeof choice>[0] = {}) => {
  const state = equilibrium(doping, choice(parts));
  if (!state.electrostatics) throw new Error('no electrostatics');
  return { state, junctions: state.electrostatics.junctions };
};

describe('the built-in voltage', () => {
  test('is that of the doping beside the junction, whatever lies beyond neutral silicon', () => {
    // n+ substrate under an n layer: a collector on its buried layer.
    const stepped = dopingOf((x) => (x < 4 * UM ? 5e15 : 1e18), box(1e17, UM), 8 * UM, [], 1, [UM, 4 * UM]);
    const [{ builtIn }] = solved(stepped).junctions;
    expect(builtIn).toBeCloseTo(volt * Math.log(((1e17 - 5e15) * 5e15) / ni ** 2), 4);
  });

  test('is not lost where carriers spill out of a shallow layer over its junction', () => {
    // The upper edge of the depletion lies below the junction of the doping, where there is no doping of its kind at all.
    const shallow = dopingOf(
      (x) => 1.5e20 * Math.exp(-((x / (0.03 * UM)) ** 2)),
      () => 1.3e15,
      30 * UM,
      [0.01, 0.03, 0.06, 0.1].map((um) => um * UM),
    );
    const [{ builtIn, depletion }] = solved(shallow).junctions;
    expect(depletion?.edges[0]).toBeGreaterThan(shallow.depth[shallow.junctions[0]] * 0.9);
    const substrate = volt * Math.log(1.3e15 / ni);
    expect(builtIn).toBeGreaterThan(substrate + volt * Math.log(1e17 / ni));
    expect(builtIn).toBeLessThan(substrate + volt * Math.log(1.5e20 / ni));
  });

  test('follows the statistics: with Fermi and Dirac a degenerate layer is further from its substrate', () => {
    const heavy = dopingOf(
      (x) => (x < UM ? 1e20 : 1),
      () => 1e16,
      20 * UM,
      [],
      1,
      [UM],
    );
    const [boltzmann, fermi] = (['boltzmann', 'fermi-dirac'] as const).map(
      (statistics) => solved(heavy, { statistics }).junctions[0].builtIn ?? 0,
    );
    // eta - ln u by W. B. Joyce and R. W. Dixon, Appl. Phys. Lett. 31, 354 (1977, from memory), good to 1e-3 here.
    const u = 1e20 / densitiesOfStates(ROOM).conduction;
    const excess = 0.353553 * u - 4.95009e-3 * u ** 2 + 1.48386e-4 * u ** 3 - 4.42563e-6 * u ** 4;
    expect((fermi - boltzmann) / volt).toBeCloseTo(excess, 2);
  });

  test('does not change with a reverse bias', () => {
    const doping = dopingOf(() => 1e16, box(2.1e17, UM), 40 * UM, [], 1, [UM]);
    const [still, biased] = [0, 30].map(
      (reverse) => solved(doping, { reverseBias: [reverse] }).junctions[0].builtIn,
    );
    expect(biased).toBeCloseTo(still ?? 0, 6);
  });
});

describe('a layer that a bias has emptied', () => {
  // 0.3 um of 1e16 between two junctions at 60 V: nothing is left of it.
  const pinched = dopingOf(
    (x) => (x > UM && x < 1.3 * UM ? 1 : 3e16),
    (x) => (x > UM && x < 1.3 * UM ? 1e16 : 1),
    20 * UM,
    [],
    1,
    [UM, 1.3 * UM],
  );
  const { state, junctions } = solved(pinched, { reverseBias: [60, 60] });

  test('is no layer, and nothing is said of its junctions that could not be', () => {
    expect(layerSpans(state).every(({ type }) => type === 'n')).toBe(true);
    for (const { depletion, builtIn } of junctions) {
      expect(depletion).toBeNull();
      expect(builtIn).toBeNull();
    }
  });

  test('may be all there is: a thin film that 14 V empty of electrons keeps the charge of its holes', () => {
    const film = dopingOf(
      (x) => (x < 0.381 * UM ? 1 : 3.2e15),
      (x) => (x < 0.381 * UM ? 1.95e14 : 1),
      0.3868 * UM,
      [],
      1,
      [0.381 * UM],
    );
    const { state: found } = solved(film, { reverseBias: [14] });
    const { depth, acceptors, donors } = found.doping;
    const dose = (column: Float64Array) => integrate(depth, column, 0, depth.length - 1);
    // All that holes can neutralise is the excess of acceptors.
    expect(dose(found.holes) / (dose(acceptors) - dose(donors))).toBeCloseTo(1, 9);
    expect(layerSpans(found).map(({ type }) => type)).toEqual(['p']);
  });

  test('leaves finite readings of the layers around it', () => {
    const flow = conduction(state, mobilityModel('klaassen'));
    for (const span of layerSpans(state))
      for (const value of Object.values(layerReadings(state, flow, span)))
        expect(Number.isFinite(value)).toBe(true);
  });
});

describe('what a surface of fixed potential piles up', () => {
  const wafer = dopingOf(
    () => 1e16,
    () => 1,
    20 * UM,
  );
  const charge = (potential: number, refinement = 1): number => {
    const { state } = solved(wafer, { surface: { potential }, refinement });
    const density = state.doping.depth.map(
      (_, i) => state.electrons[i] - state.holes[i] - state.doping.net[i],
    );
    return integrate(state.doping.depth, density, 0, density.length - 1);
  };

  test.each([0.1, 0.2, 0.4])(
    'is, at %f V, the charge of the first integral of Poisson and Boltzmann',
    (potential) => {
      // Q = sqrt(2 eps kT N) sqrt(exp(u) - u - 1) for majority carriers of density N (C. E. Young 1961; S. M. Sze, from memory).
      const u = potential / volt;
      const exact = Math.sqrt(((2 * PERMITTIVITY * volt) / ELEMENTARY_CHARGE) * 1e16 * (Math.exp(u) - u - 1));
      expect(Math.abs(charge(potential) / exact - 1)).toBeLessThan(3e-4);
      expect(Math.abs(charge(potential, 2) / exact - 1)).toBeLessThan(3e-5);
    },
  );

  test('does not hang on the mesh', () => {
    for (const potential of [0.15, 0.3, 0.45])
      expect(Math.abs(charge(potential, 2) / charge(potential) - 1)).toBeLessThan(2e-4);
  });

  test('is warned about where Boltzmann statistics know no bounds, and only there', () => {
    const warned = (potential: number, statistics: 'boltzmann' | 'fermi-dirac') => {
      const parts = { surface: { potential }, statistics };
      return degeneracyWarnings(solved(wafer, parts).state, choice(parts)).map(({ code }) => code);
    };
    expect(warned(0.1, 'boltzmann')).toEqual([]);
    expect(warned(0.5, 'boltzmann')).toEqual(['statistics-range']);
    expect(warned(0.5, 'fermi-dirac')).toEqual([]);
  });
});
