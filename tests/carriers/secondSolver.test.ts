import { describe, expect, test } from 'vitest';
import { equilibrium } from '../../src/core/carriers/equilibrium';
import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { thermalVoltage } from '../../src/core/material/silicon';
import { mobilityModel } from '../../src/core/mobility/list';
import { integrate } from '../../src/core/numeric/simpson';
import { conduction } from '../../src/core/sheet/conduction';
import { layerReadings, layerSpans } from '../../src/core/sheet/layers';
import { choice } from '../support/carriers';
import { dopingOf } from '../support/doping';
import { type PlainExtras, plainPoisson } from '../support/plainPoisson';

const UM = 1e-4;
const klaassen = mobilityModel('klaassen');
const gauss = (peak: number, centre: number, width: number) => (x: number) =>
  peak * Math.exp(-(((x / UM - centre) / width) ** 2));
const sum =
  (...parts: ((x: number) => number)[]) =>
  (x: number) =>
    parts.reduce((all, part) => all + part(x), 0);
const flat = (value: number) => () => value;

interface Stack {
  donors: (x: number) => number;
  acceptors: (x: number) => number;
  end: number;
  temperature: number;
}

const STACKS: Record<string, Stack> = {
  'a resistor': { donors: flat(1e15), acceptors: gauss(5e17, 0.15, 0.2), end: 30, temperature: 298 },
  'a light resistor': { donors: flat(1e15), acceptors: gauss(2e16, 0.2, 0.3), end: 30, temperature: 298 },
  'a heavy layer': { donors: gauss(2e20, 0, 0.1), acceptors: flat(1e15), end: 30, temperature: 298 },
  'emitter and base': {
    donors: sum(gauss(1e20, 0, 0.12), flat(5e15)),
    acceptors: gauss(1e18, 0.1, 0.4),
    end: 20,
    temperature: 298,
  },
  'a narrow base': {
    donors: sum(gauss(1e20, 0, 0.12), flat(1e16)),
    acceptors: gauss(4e17, 0.1, 0.22),
    end: 20,
    temperature: 298,
  },
  hot: { donors: flat(1e15), acceptors: gauss(3e17, 0.1, 0.3), end: 30, temperature: 425 },
  cold: { donors: flat(1e15), acceptors: gauss(3e17, 0.1, 0.3), end: 30, temperature: 215 },
  'a buried layer': { donors: flat(2e16), acceptors: gauss(3e17, 1, 0.25), end: 10, temperature: 298 },
  compensated: {
    donors: gauss(9e17, 0, 0.5),
    acceptors: sum(gauss(1e18, 0, 0.5), flat(2e15)),
    end: 20,
    temperature: 298,
  },
  'a film': { donors: gauss(1e18, 0.05, 0.1), acceptors: flat(1e16), end: 0.6, temperature: 298 },
};

/** Sheet conductance of every layer by trapezoids over the plain solution, layers cut where n = p. */
function plainSheets({ donors, acceptors, end, temperature }: Stack, count: number): number[] {
  const { depth, electrons, holes } = plainPoisson(
    (x) => donors(x) - acceptors(x),
    end * UM,
    0.3 * UM,
    count,
    temperature,
  );
  const columns = [donors, acceptors].map((of) => Float64Array.from(depth, of));
  const [n, p] = [Float64Array.from(electrons), Float64Array.from(holes)];
  const mobility = { electrons: new Float64Array(n.length), holes: new Float64Array(n.length) };
  klaassen.evaluate(
    {
      temperature,
      donors: columns[0],
      acceptors: columns[1],
      electrons: n,
      holes: p,
      donorParts: [{ dopant: 'phosphorus', ionised: columns[0] }],
      acceptorParts: [{ dopant: 'boron', ionised: columns[1] }],
    },
    mobility,
  );
  const sheets = [0];
  for (let i = 1; i < n.length; i++) {
    if (n[i] > p[i] !== n[i - 1] > p[i - 1]) sheets.push(0);
    const at = (k: number) => n[k] * mobility.electrons[k] + p[k] * mobility.holes[k];
    sheets[sheets.length - 1] += ((depth[i] - depth[i - 1]) * ELEMENTARY_CHARGE * (at(i) + at(i - 1))) / 2;
  }
  return sheets;
}

describe('sheet conductance against a second solver, ten stacks', () => {
  test.each(Object.keys(STACKS))('%s, to 0.1 percent', (name) => {
    const stack = STACKS[name];
    const doping = dopingOf(
      stack.donors,
      stack.acceptors,
      stack.end * UM,
      [0.1, 0.2, 0.4, 0.8, 1, 1.3].map((um) => um * UM),
    );
    const state = equilibrium(doping, choice({ temperature: stack.temperature }));
    const flow = conduction(state, klaassen);
    const ours = layerSpans(state).map((span) => layerReadings(state, flow, span).sheetConductance);
    const [coarse, fine] = [3000, 6000].map((count) => plainSheets(stack, count));
    expect(ours.length).toBe(fine.length);
    ours.forEach((conductance, k) => {
      const extrapolated = fine[k] + (fine[k] - coarse[k]) / 3;
      expect(Math.abs(conductance / extrapolated - 1)).toBeLessThan(1e-3);
    });
  });
});

/** Integrals of electrons and holes of a plain solution, extrapolated from two meshes, cm^-2. */
function plainDoses(stack: Stack, extras: PlainExtras): { electrons: number; holes: number } {
  const [coarse, fine] = [6000, 12000].map((count) => {
    const net = (x: number) => stack.donors(x) - stack.acceptors(x);
    const found = plainPoisson(net, stack.end * UM, 0.3 * UM, count, stack.temperature, extras);
    const dose = (column: number[]) =>
      column.reduce((sum, value, i) => {
        const step = i > 0 ? found.depth[i] - found.depth[i - 1] : 0;
        return sum + (step * (value + column[Math.max(0, i - 1)])) / 2;
      }, 0);
    return { electrons: dose(found.electrons), holes: dose(found.holes) };
  });
  const extrapolated = (key: 'electrons' | 'holes') => fine[key] + (fine[key] - coarse[key]) / 3;
  return { electrons: extrapolated('electrons'), holes: extrapolated('holes') };
}

/** The same of the program's solution. */
function ourDoses(stack: Stack, parts: Parameters<typeof choice>[0]): { electrons: number; holes: number } {
  const marks = [0.05, 0.1, 0.2, 0.4, 0.6, 0.8, 1, 1.3].map((um) => um * UM);
  const doping = dopingOf(stack.donors, stack.acceptors, stack.end * UM, marks);
  const state = equilibrium(doping, choice({ temperature: stack.temperature, ...parts }));
  const dose = (column: Float64Array) => integrate(state.doping.depth, column, 0, column.length - 1);
  return { electrons: dose(state.electrons), holes: dose(state.holes) };
}

function expectSame(ours: ReturnType<typeof ourDoses>, plain: ReturnType<typeof plainDoses>): void {
  for (const key of ['electrons', 'holes'] as const)
    expect(Math.abs(ours[key] / plain[key] - 1), key).toBeLessThan(5e-4);
}

describe('doses of the carriers against the second solver', () => {
  const resistor = STACKS['a resistor'];

  test.each([-3e11, 2e11, 8e11])('under a surface charge of %f cm^-2', (charge) => {
    expectSame(ourDoses(resistor, { surface: { charge } }), plainDoses(resistor, { surfaceCharge: charge }));
  });

  test.each([230, 298, 420])('with dopant levels at %i K', (temperature) => {
    const stack: Stack = {
      donors: sum(gauss(4e18, 0, 0.1), flat(3e15)),
      acceptors: gauss(8e17, 0.1, 0.3),
      end: 20,
      temperature,
    };
    // Altermatt's levels (see the program's own file for the source), written out once more.
    const kT = 8.617333262e-5 * temperature;
    const t = temperature / 300;
    const phosphorus = (N: number, n: number) =>
      (N / (1 + (N / 6e18) ** 2.3)) *
      (n / (n + 0.5 * 2.86e19 * t ** 1.58 * Math.exp(-0.0455 / (1 + (N / 2.2e18) ** 2) / kT)));
    const boron = (N: number, p: number) =>
      (N / (1 + (N / 4.5e18) ** 2.4)) *
      (p / (p + 0.25 * 3.1e19 * t ** 1.85 * Math.exp(-0.04439 / (1 + (N / 1.3e18) ** 1.4) / kT)));
    const bound = (x: number, n: number, p: number) =>
      boron(stack.acceptors(x), p) - phosphorus(stack.donors(x), n);
    expectSame(ourDoses(stack, { ionisation: 'levels' }), plainDoses(stack, { bound }));
  });

  test.each([1, 10])('with %i V in reverse', (reverse) => {
    // Electrons keep the level of the wafer, holes that of the layer, which is the lower one.
    const level = -reverse / thermalVoltage(resistor.temperature);
    expectSame(
      ourDoses(resistor, { reverseBias: [reverse] }),
      plainDoses(resistor, { levels: () => [0, level] }),
    );
  });
});
