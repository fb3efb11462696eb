import { describe, expect, test } from 'vitest';
import { equilibrium } from '../../src/core/carriers/equilibrium';
import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { mobilityModel } from '../../src/core/mobility/list';
import { conduction } from '../../src/core/sheet/conduction';
import { layerReadings, layerSpans } from '../../src/core/sheet/layers';
import { choice } from '../support/carriers';
import { dopingOf } from '../support/doping';
import { plainPoisson } from '../support/plainPoisson';

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
