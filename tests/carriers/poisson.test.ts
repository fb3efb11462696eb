import { describe, expect, test } from 'vitest';
import { ChargeModel } from '../../src/core/carriers/charge';
import { equilibrium, equilibriumNear } from '../../src/core/carriers/equilibrium';
import { PoissonSystem, solvePoisson } from '../../src/core/carriers/poisson';
import type { CarrierState, Depletion, ElectricalJunction } from '../../src/core/carriers/state';
import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { intrinsicDensity } from '../../src/core/material/intrinsic';
import { debyeLength, PERMITTIVITY, thermalVoltage } from '../../src/core/material/silicon';
import { mobilityModel } from '../../src/core/mobility/list';
import { integrate } from '../../src/core/numeric/simpson';
import type { SampledDoping } from '../../src/core/profile/doping';
import { conduction } from '../../src/core/sheet/conduction';
import { layerReadings, layerSpans } from '../../src/core/sheet/layers';
import { choice } from '../support/carriers';
import { dopingOf } from '../support/doping';

const UM = 1e-4;
const ROOM = 298.15;
const none = () => 1;
const box = (value: number, from: number, to: number) => (x: number) => (x >= from && x < to ? value : 1);
/** p on n, abrupt: net doping of `acceptors` in the first micrometre of an n wafer of `donors`. */
const abrupt = (acceptors: number, donors: number, refinement = 1) =>
  dopingOf(() => donors, box(acceptors + donors, 0, UM), 40 * UM, [], refinement, [UM]);

const electrical = (doping: SampledDoping, parts: Parameters<typeof choice>[0] = {}) => {
  const state = equilibrium(doping, choice(parts));
  const found = state.electrostatics;
  if (!found) throw new Error('no electrostatics');
  return { state, ...found };
};

function depletionOf(junction: ElectricalJunction | undefined): Depletion {
  if (!junction?.depletion) throw new Error('no depletion');
  return junction.depletion;
}

describe('an abrupt junction', () => {
  const [acceptors, donors] = [2e17, 1e16];
  const volt = thermalVoltage(ROOM);
  const builtIn = volt * Math.log((acceptors * donors) / intrinsicDensity(ROOM) ** 2);

  test('has the built-in voltage of its two dopings', () => {
    const { junctions, potential } = electrical(abrupt(acceptors, donors));
    expect(junctions[0].builtIn).toBeCloseTo(builtIn, 4);
    expect(potential[potential.length - 1] - potential[0]).toBeCloseTo(builtIn, 6);
  });

  // From some 40 V on there are places where neither carrier is left, not even as the smallest floating-point number.
  test.each([5, 10, 20, 100, 400])(
    'at %i V reverse is depleted as the depletion approximation says',
    (reverse) => {
      // Width sqrt(2 eps (Vbi + V - 2kT/q)(1/Na + 1/Nd)/q): the correction by 2kT/q is S. M. Sze's (from memory); what is left of
      // it is of the order of the built-in voltage's share of kT/q.
      const { junctions } = electrical(abrupt(acceptors, donors), { reverseBias: [reverse] });
      const across = builtIn + reverse - 2 * volt;
      const width = Math.sqrt(
        ((2 * PERMITTIVITY * across) / ELEMENTARY_CHARGE) * (1 / acceptors + 1 / donors),
      );
      const { edges, capacitance } = depletionOf(junctions[0]);
      const [upper, lower] = edges;
      expect((lower - upper) / width).toBeCloseTo(1, 4);
      expect((UM - upper) / (lower - UM)).toBeCloseTo(donors / acceptors, 3);
      expect(capacitance / (PERMITTIVITY / width)).toBeCloseTo(1, 4);
    },
  );

  test('its capacitance is the change of its charge with voltage', () => {
    const at = (reverse: number) => choice({ reverseBias: [reverse] });
    const state = equilibrium(abrupt(acceptors, donors), at(3));
    const charge = (reverse: number): number => {
      const { doping, electrons, holes } = equilibriumNear(state, at(reverse));
      const density = doping.depth.map((_, i) => holes[i] - electrons[i] + doping.net[i]);
      return ELEMENTARY_CHARGE * integrate(doping.depth, density, 0, state.cuts[0]);
    };
    const step = 0.05;
    const slope = Math.abs(charge(3 + step) - charge(3 - step)) / (2 * step);
    // The central difference is good to (step/V)^2/8 = 2e-5.
    expect(depletionOf(state.electrostatics?.junctions[0]).capacitance / slope).toBeCloseTo(1, 4);
  });

  test('the distance of its depletion edges is permittivity over capacitance', () => {
    for (const reverse of [0, 0.5, 4]) {
      const [junction] = electrical(abrupt(acceptors, donors), { reverseBias: [reverse] }).junctions;
      const { edges, capacitance } = depletionOf(junction);
      expect(((edges[1] - edges[0]) * capacitance) / PERMITTIVITY).toBeCloseTo(1, 9);
    }
  });
});

describe('the whole stack', () => {
  const stack = dopingOf(
    (x) => 1e16 + 3e19 * Math.exp(-((x / (0.15 * UM)) ** 2)),
    (x) => 1e18 * Math.exp(-(((x - 0.2 * UM) / (0.3 * UM)) ** 2)),
    50 * UM,
    [0.1 * UM, 0.2 * UM, 0.5 * UM, UM],
  );

  test.each([200, 250, 300, 400, 500])('is neutral at %i K to 1e-9 of its charges', (temperature) => {
    const { state } = electrical(stack, { temperature, ionisation: 'levels' });
    const { doping, electrons, holes, ionised } = state;
    const ionisedOf = (dopant: string) => ionised.find((part) => part.dopant === dopant)?.ionised;
    const [donors, acceptors] = [ionisedOf('phosphorus'), ionisedOf('boron')];
    if (!donors || !acceptors) throw new Error('a dopant is missing');
    const density = electrons.map((n, i) => holes[i] - n + donors[i] - acceptors[i]);
    const last = doping.depth.length - 1;
    const all = integrate(
      doping.depth,
      electrons.map((n, i) => n + holes[i]),
      0,
      last,
    );
    expect(Math.abs(integrate(doping.depth, density, 0, last)) / all).toBeLessThan(1e-9);
  });

  test('has one Fermi level: n p = ni^2 everywhere', () => {
    const { state } = electrical(stack);
    const square = intrinsicDensity(ROOM) ** 2;
    state.electrons.forEach((n, i) => {
      expect(Math.abs((n * state.holes[i]) / square - 1)).toBeLessThan(1e-12);
    });
  });

  test('reads the same mirrored, and with n and p exchanged', () => {
    const end = 4 * UM;
    const donors = (x: number) => 1e16 + 5e18 * Math.exp(-((x / (0.3 * UM)) ** 2));
    const acceptors = (x: number) => 2e17 * Math.exp(-(((x - 2 * UM) / (0.5 * UM)) ** 2));
    const marks = [0.3, 1, 2, 3, 3.7].map((um) => um * UM);
    const here = electrical(dopingOf(donors, acceptors, end, marks));
    const mirrored = electrical(
      dopingOf(
        (x) => donors(end - x),
        (x) => acceptors(end - x),
        end,
        marks.map((x) => end - x),
      ),
    );
    const exchanged = electrical(dopingOf(acceptors, donors, end, marks));
    const depths = here.junctions.map(({ depth }) => depth);
    expect(depths.length).toBe(2);
    // 0.01 nm: the meshes of the mirrored stack differ.
    mirrored.junctions.forEach(({ depth }, k) => {
      expect(Math.abs(end - depth - depths[depths.length - 1 - k])).toBeLessThan(1e-9);
    });
    exchanged.junctions.forEach(({ depth }, k) => {
      expect(Math.abs(depth - depths[k])).toBeLessThan(1e-12);
    });
  });

  test.each([
    ['a step from 1e21 to 1e13', dopingOf(box(1e21, 0, 0.1 * UM), () => 1e13, 500 * UM, [], 1, [0.1 * UM])],
    ['nearly intrinsic', dopingOf(() => 3e10, none, 50 * UM)],
    ['compensated to one in ten thousand', dopingOf(() => 1.0001e18, box(1e18, 0, UM), 5 * UM, [], 1, [UM])],
    [
      'thin alternating layers',
      dopingOf(
        (x) => (Math.floor(x / 5e-6) % 2 ? 1e18 : 1e15),
        () => 1e17,
        UM,
        [],
        1,
        Array.from({ length: 19 }, (_, k) => (k + 1) * 5e-6),
      ),
    ],
  ])('converges for %s from 200 to 500 K', (_what, doping) => {
    for (const temperature of [200, 300, 500])
      for (const statistics of ['boltzmann', 'fermi-dirac'] as const) {
        const { state } = electrical(doping, { temperature, statistics, ionisation: 'levels' });
        for (const column of [state.electrons, state.holes])
          for (const value of column) expect(value).toBeGreaterThan(0);
      }
  });
});

describe('the elements', () => {
  test('are of fourth order: sixteen times closer with half the cells', () => {
    const end = 0.6 * UM;
    const potentialAt = (cells: number): number => {
      const depth = Float64Array.from({ length: 2 * cells + 1 }, (_, i) => (end * i) / (2 * cells));
      const donors = depth.map(() => 2e17);
      const acceptors = depth.map((x) => 2e17 + 1e17 * Math.tanh((0.3 * UM - x) / (0.1 * UM)));
      const dopants = [
        { dopant: 'phosphorus', active: donors },
        { dopant: 'boron', active: acceptors },
      ] as const;
      const statistics = choice();
      const charges = new ChargeModel({ dopants, donors, acceptors }, statistics);
      const u = new Float64Array(depth.length);
      charges.neutralPotential(u, 0.1);
      solvePoisson(new PoissonSystem(depth, ROOM, false), charges, { charge: 0 }, u, 1e-8);
      return u[cells / 2];
    };
    const exact = potentialAt(1600);
    const [coarse, fine] = [40, 80].map((cells) => Math.abs(potentialAt(cells) - exact));
    expect(Math.log2(coarse / fine)).toBeGreaterThan(3.7);
    expect(Math.log2(coarse / fine)).toBeLessThan(4.3);
  });
});

describe('a surface', () => {
  const wafer = dopingOf(none, () => 1e16, 20 * UM);

  test('with a charge is screened by just that charge', () => {
    for (const charge of [-3e11, 1e11]) {
      const { state } = electrical(wafer, { surface: { charge } });
      const density = state.doping.depth.map(
        (_, i) => state.holes[i] - state.electrons[i] + state.doping.net[i],
      );
      const screening = integrate(state.doping.depth, density, 0, density.length - 1);
      expect(screening / -charge).toBeCloseTo(1, 9);
    }
  });

  test('with charge enough to invert it has an n layer of its own', () => {
    const { state, junctions } = electrical(wafer, { surface: { charge: 2e12 } });
    expect(layerSpans(state).map(({ type }) => type)).toEqual(['n', 'p']);
    expect(junctions[0].metallurgical).toBeNull();
  });

  test('a little off its neutral potential heals over a Debye length', () => {
    // Linearised: u = u0 exp(-x/L) with L from n + p; the next term is of the order of u0 = 0.4 % of kT/q.
    const potential = 1e-4;
    const { state, potential: found } = electrical(wafer, { surface: { potential }, refinement: 4 });
    const { depth } = state.doping;
    const bulk = found[found.length - 1];
    expect(found[0] - bulk).toBeCloseTo(potential, 9);
    const length = debyeLength(1e16, ROOM);
    depth.forEach((x, i) => {
      if (x < 3 * length)
        expect(Math.abs((found[i] - bulk) / (potential * Math.exp(-x / length)) - 1)).toBeLessThan(1e-2);
    });
  });
});

describe('bias', () => {
  test('of no volts is equilibrium', () => {
    const doping = abrupt(1e17, 1e16);
    const [still] = electrical(doping).junctions;
    const [biased] = electrical(doping, { reverseBias: [0] }).junctions;
    expect(biased).toEqual(still);
  });

  test('of 70 V and a changed temperature start from the potential found before', () => {
    const doping = abrupt(2e17, 1e16);
    const biased = choice({ reverseBias: [70] });
    const warmer = choice({ reverseBias: [70], temperature: ROOM + 2 });
    const near = equilibriumNear(equilibrium(doping, biased), warmer);
    const afresh = equilibrium(doping, warmer);
    const capacitanceOf = ({ electrostatics }: CarrierState) =>
      depletionOf(electrostatics?.junctions[0]).capacitance;
    expect(capacitanceOf(near) / capacitanceOf(afresh)).toBeCloseTo(1, 6);
  });

  test('pinches a layer until nothing of it is left', () => {
    const pinched = dopingOf(() => 1e16, box(3e16, UM, 1.6 * UM), 20 * UM, [], 1, [UM, 1.6 * UM]);
    const sheet = (reverse: number) => {
      const state = equilibrium(pinched, choice({ reverseBias: [reverse, reverse] }));
      const flow = conduction(state, mobilityModel('klaassen'));
      const layer = layerSpans(state).find(({ type }) => type === 'p');
      return layer ? layerReadings(state, flow, layer).sheetConductance : 0;
    };
    const conductances = [0, 0.2, 0.5, 1, 5].map(sheet);
    for (let k = 1; k < conductances.length; k++)
      expect(conductances[k]).toBeLessThanOrEqual(conductances[k - 1]);
    expect(conductances[4]).toBeLessThan(1e-6 * conductances[0]);
  });
});

test('the neutral potential is found where net doping is lost in rounding and a bias has taken the carriers', () => {
  const acceptors = Float64Array.from({ length: 400 }, (_, i) => 1e18 + 1e15 * i);
  const donors = acceptors.map((value, i) => value + 128 * ((i % 9) - 4));
  const dopants = [
    { dopant: 'phosphorus', active: donors },
    { dopant: 'boron', active: acceptors },
  ] as const;
  const charges = new ChargeModel({ dopants, donors, acceptors }, choice({ ionisation: 'levels' }));
  charges.electronLevel.fill(700);
  charges.noteBias();
  charges.neutralPotential(new Float64Array(donors.length), 1e-10);
  charges.charge.forEach((charge, i) => {
    expect(Math.abs(charge)).toBeLessThan(1e-15 * (donors[i] + acceptors[i]));
  });
});
