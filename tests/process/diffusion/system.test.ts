import { describe, expect, test } from 'vitest';
import { integrateDiffusion } from '../../../src/core/process/diffusion/integrate';
import {
  DiffusionSystem,
  type Species,
  type StepConditions,
} from '../../../src/core/process/diffusion/system';

const UM = 1e-4;
const even = (cells: number, end: number) =>
  Float64Array.from({ length: cells + 1 }, (_, i) => (end * i) / cells);
const NO_LIMIT = 1e40;
const constantD = (D: number, ni = 1e40): StepConditions => ({
  diffusivity: [{ neutral: D, positive: 0, negative: 0, doubleNegative: 0 }],
  limit: [NO_LIMIT],
  ni,
});

/** Runs one species and gives its concentration at the nodes. */
function run(
  nodes: Float64Array,
  start: Species,
  time: number,
  conditions: StepConditions,
  tolerance = { tolerance: 1e-3, shift: 1e-9, floor: 1e13 },
): Float64Array {
  const species = [start];
  integrateDiffusion(new DiffusionSystem(nodes), species, time, () => conditions, tolerance);
  return species[0].concentration;
}

describe('with a constant diffusivity', () => {
  const [D, time, start] = [1e-14, 1800, 0.05 * UM];
  const exact = (x: number) => {
    const variance = start * start + 2 * D * time;
    const lobe = (at: number) => Math.exp(-(at * at) / (2 * variance));
    return 1e17 * (start / Math.sqrt(variance)) * (lobe(x - 0.3 * UM) + lobe(x + 0.3 * UM));
  };
  const worst = (cells: number) => {
    const nodes = even(cells, UM);
    const concentration = nodes.map((x) => 1e17 * Math.exp(-((x - 0.3 * UM) ** 2) / (2 * start * start)));
    const tight = { tolerance: 1e-6, shift: 0, floor: 1e15 };
    const found = run(nodes, { sign: -1, concentration }, time, constantD(D), tight);
    return Math.max(
      ...Array.from(nodes, (x, i) => (exact(x) > 1e15 ? Math.abs(found[i] / exact(x) - 1) : 0)),
    );
  };

  test('a Gaussian stays one, to 1e-4, and the error falls with the square of the cells', () => {
    const [coarse, fine] = [worst(200), worst(400)];
    expect(coarse / fine).toBeGreaterThan(3.5);
    expect(worst(800)).toBeLessThan(2e-4);
  }, 20_000);

  test('a held surface gives the complementary error function', () => {
    const nodes = even(800, 0.6 * UM);
    const found = run(
      nodes,
      { sign: -1, concentration: nodes.map(() => 1), surface: { held: 1e17 } },
      time,
      constantD(D),
    );
    const length = 2 * Math.sqrt(D * time);
    const at = (um: number) => found[Math.round((um / 0.6) * 800)] / 1e17;
    // erfc by its values at 0.5, 1 and 1.5 (M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions, table 7.1).
    for (const [z, erfc] of [
      [0.5, 0.4795001],
      [1, 0.1572992],
      [1.5, 0.0338949],
    ]) {
      const i = (z * length) / ((0.6 * UM) / 800);
      const [low, part] = [Math.floor(i), i - Math.floor(i)];
      const value = found[low] ** (1 - part) * found[low + 1] ** part;
      expect(value / 1e17 / erfc).toBeCloseTo(1, 2);
    }
    expect(at(0)).toBe(1);
  });

  test('an evaporating surface loses what leaves, and nothing else does', () => {
    const nodes = even(200, UM);
    const system = new DiffusionSystem(nodes);
    const species: Species[] = [
      { sign: 1, concentration: nodes.map(() => 1e17), surface: { evaporation: 1e-9 } },
    ];
    const before = system.dose(species[0].concentration);
    integrateDiffusion(system, species, time, () => constantD(D), { tolerance: 1e-3, shift: 0, floor: 1e13 });
    const lost = before - system.dose(species[0].concentration);
    // Slow loss hardly lowers the surface: h N t, less what diffusion cannot bring.
    expect(lost / (1e-9 * 1e17 * time)).toBeGreaterThan(0.6);
    expect(lost / (1e-9 * 1e17 * time)).toBeLessThan(1);
  });
});

describe('with a diffusivity that follows the concentration', () => {
  // L. R. Weisberg and J. Blanch, Phys. Rev. 131, 149 (1963): fronts of D ~ C and D ~ C^2 at 1.616 and 1.092 sqrt(Ds t). The field
  // of its own carriers doubles the diffusivity here.
  test.each([
    ['C', 'negative', 1.616],
    ['C^2', 'doubleNegative', 1.092],
  ] as const)(
    'D ~ %s has its front where the similarity solution has it, to 1 percent',
    (_what, term, front) => {
      const [surface, ni, Ds, time] = [1e20, 1e15, 1e-13, 1800];
      const nodes = even(1200, 0.5 * UM);
      const states = { neutral: 0, positive: 0, negative: 0, doubleNegative: 0 };
      const conditions: StepConditions = {
        diffusivity: [{ ...states, [term]: Ds / (surface / ni) ** (term === 'negative' ? 1 : 2) }],
        limit: [NO_LIMIT],
        ni,
      };
      const found = run(
        nodes,
        { sign: 1, concentration: nodes.map(() => 1e10), surface: { held: surface } },
        time,
        conditions,
        { tolerance: 1e-2, shift: 2e-8, floor: 1e16 },
      );
      const at = found.findIndex((value) => value < 1e-2 * surface);
      expect(nodes[at] / Math.sqrt(2 * Ds * time) / front).toBeGreaterThan(0.98);
      expect(nodes[at] / Math.sqrt(2 * Ds * time) / front).toBeLessThan(1.01);
    },
    30_000,
  );

  test('arsenic has the shape 1 - 0.87 Y - 0.45 Y^2 of its closed form (J. C. C. Tsai in Sze, VLSI Technology, from memory)', () => {
    const [surface, ni, Di, time] = [2e20, 7e18, 1.5e-15, 1800];
    const nodes = even(800, 0.3 * UM);
    const found = run(
      nodes,
      { sign: 1, concentration: nodes.map(() => 1e14), surface: { held: surface } },
      time,
      // All of it carried by negative defects: D = Di n/ni, doubled by the field.
      { diffusivity: [{ neutral: 0, positive: 0, negative: Di, doubleNegative: 0 }], limit: [NO_LIMIT], ni },
      { tolerance: 1e-2, shift: 2e-8, floor: 1e16 },
    );
    const length = Math.sqrt((8 * surface * Di * time) / ni);
    for (const Y of [0.1, 0.3, 0.5]) {
      const i = Math.round((Y * length) / (nodes[1] - nodes[0]));
      expect(Math.abs(found[i] / surface - (1 - 0.87 * Y - 0.45 * Y * Y))).toBeLessThan(0.01);
    }
  }, 30_000);
});

describe('several dopants', () => {
  test('keep their doses to 1e-9 and never become negative, whatever the steps', () => {
    const nodes = even(300, UM);
    const gauss = (peak: number, centre: number, width: number) =>
      nodes.map((x) => peak * Math.exp(-(((x / UM - centre) / width) ** 2)) + 1);
    const system = new DiffusionSystem(nodes);
    const species: Species[] = [
      { sign: 1, concentration: gauss(1e21, 0.05, 0.03) },
      { sign: -1, concentration: gauss(1e19, 0.2, 0.1) },
    ];
    const before = species.map(({ concentration }) => system.dose(concentration));
    const state = { neutral: 1e-15, positive: 1e-14, negative: 3e-15, doubleNegative: 1e-17 };
    integrateDiffusion(
      system,
      species,
      900,
      () => ({ diffusivity: [state, state], limit: [3e20, 1e20], ni: 7e18 }),
      {
        tolerance: 5e-3,
        shift: 2e-8,
        floor: 1e14,
      },
    );
    species.forEach(({ concentration }, k) => {
      expect(Math.abs(system.dose(concentration) / before[k] - 1)).toBeLessThan(1e-9);
      expect(Math.min(...concentration)).toBeGreaterThanOrEqual(0);
    });
  });

  test('what lies above its limit does not move until it is dissolved', () => {
    const nodes = even(200, 0.4 * UM);
    const clustered = nodes.map((x) => (x < 0.1 * UM ? 1e21 : 1e15));
    const found = run(
      nodes,
      { sign: 1, concentration: clustered },
      600,
      { ...constantD(1e-15), limit: [1e20] },
      { tolerance: 1e-2, shift: 1e-8, floor: 1e15 },
    );
    expect(found[10] / 1e21).toBeCloseTo(1, 3);
    expect(found[70]).toBeLessThan(1e20);
    expect(found[70]).toBeGreaterThan(1e16);
  });

  test('the field of a donor pulls an acceptor below it towards the donor', () => {
    const nodes = even(300, 0.6 * UM);
    const boron = (withArsenic: boolean) => {
      const species: Species[] = [
        { sign: -1, concentration: nodes.map(() => 1e18) },
        {
          sign: 1,
          concentration: nodes.map((x) => (withArsenic ? 1e20 * Math.exp(-((x / (0.1 * UM)) ** 4)) + 1 : 1)),
        },
      ];
      const still = { neutral: 1e-19, positive: 0, negative: 0, doubleNegative: 0 };
      const moving = { neutral: 1e-14, positive: 0, negative: 0, doubleNegative: 0 };
      integrateDiffusion(
        new DiffusionSystem(nodes),
        species,
        3600,
        () => ({ diffusivity: [moving, still], limit: [NO_LIMIT, NO_LIMIT], ni: 7e18 }),
        { tolerance: 5e-3, shift: 1e-8, floor: 1e15 },
      );
      return species[0].concentration;
    };
    const pulled = boron(true);
    // Acceptors gather where electrons are: C p stays even along a quasi-equilibrium, so that they are denser in the n layer.
    expect(pulled[5]).toBeGreaterThan(1.5e18);
    expect(pulled[80]).toBeLessThan(1e18);
    expect(boron(false)[5] / 1e18).toBeCloseTo(1, 9);
  });
});
