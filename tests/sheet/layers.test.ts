import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { MOBILITY_MODELS, mobilityModel } from '../../src/core/mobility/list';
import { uniformSilicon } from '../../src/core/mobility/uniform';
import type { SampledDoping } from '../../src/core/profile/doping';
import { conduction } from '../../src/core/sheet/conduction';
import { type LayerReadings, layerReadings, layerSpans } from '../../src/core/sheet/layers';
import { temperatureCoefficients } from '../../src/core/sheet/temperatureCoefficient';
import { neutralChoice, neutralState } from '../support/carriers';
import { dopingOf } from '../support/doping';

const UM = 1e-4;
const ROOM = 298.15;
const klaassen = mobilityModel('klaassen');
const none = () => 1; // 1 cm^-3: a mesh wants a positive total

function readings(doping: SampledDoping, model = klaassen): LayerReadings[] {
  const state = neutralState(doping);
  const flow = conduction(state, model);
  return layerSpans(state).map((span) => layerReadings(state, flow, span));
}

const first = (doping: SampledDoping, model = klaassen) => readings(doping, model)[0];

describe('a uniform film', () => {
  test('reads resistivity over thickness, whatever the model', () => {
    for (const model of MOBILITY_MODELS) {
      const { sheetConductance } = first(
        dopingOf(() => 1e17, none, 2 * UM),
        model,
      );
      const { resistivity } = uniformSilicon('phosphorus', 1e17, ROOM, model.name);
      expect(1 / sheetConductance / (resistivity / (2 * UM))).toBeCloseTo(1, 9);
    }
  });

  test('has the dose, the mobility and the Hall values of one mobility', () => {
    const made = first(dopingOf(() => 1e17, none, 2 * UM));
    expect(made.carrierDose / 2e13).toBeCloseTo(1, 9);
    expect(made.hallMobility / made.conductivityMobility).toBeCloseTo(1, 9);
    expect(made.hallDose / made.carrierDose).toBeCloseTo(1, 9);
  });

  test('halves its sheet resistance when its thickness doubles', () => {
    fc.assert(
      fc.property(fc.double({ min: 14, max: 20, noNaN: true }), (log) => {
        const film = (thickness: number) =>
          first(dopingOf(() => 10 ** log, none, thickness)).sheetConductance;
        expect(film(2 * UM) / film(UM)).toBeCloseTo(2, 9);
      }),
      { numRuns: 25, seed: 11 },
    );
  });
});

describe('layers', () => {
  const base = (x: number) => 1e18 * Math.exp(-(((x - 0.2 * UM) / (0.08 * UM)) ** 2) / 2);

  test('are cut at the junctions and named by their majority', () => {
    const doping = dopingOf(() => 1e15, base, 525 * UM, [0.2 * UM]);
    const spans = layerSpans(neutralState(doping));
    expect(spans.map(({ type }) => type)).toEqual(['p', 'n']);
    expect(doping.depth[spans[0].to]).toBe(doping.depth[spans[1].from]);
  });

  test('give the peak of the net doping by the parabola through the top, to 1e-4', () => {
    const made = first(dopingOf(() => 1e15, base, 525 * UM, []));
    expect(made.peakNet / (1e18 - 1e15)).toBeCloseTo(1, 4);
    expect(made.peakDepth / UM).toBeCloseTo(0.2, 3);
  });

  test('agree with the integral by a thousand times finer trapezoids to 1e-5', () => {
    const doping = dopingOf(() => 1e15, base, 525 * UM, [0.2 * UM]);
    const depth = doping.depth[doping.junctions[0]];
    const count = 40_001;
    const x = Float64Array.from({ length: count }, (_, i) => (depth * i) / (count - 1));
    const acceptors = x.map(base);
    const donors = x.map(() => 1e15);
    const dense: SampledDoping = {
      depth: x,
      dopants: [
        { dopant: 'phosphorus', chemical: donors, active: donors },
        { dopant: 'boron', chemical: acceptors, active: acceptors },
      ],
      donors,
      acceptors,
      net: x.map((_, i) => donors[i] - acceptors[i]),
      junctions: [],
    };
    const flow = conduction(neutralState(dense), klaassen);
    let reference = 0;
    for (let i = 1; i < count; i++)
      reference += ((x[i] - x[i - 1]) * (flow.conductivity[i] + flow.conductivity[i - 1])) / 2;
    expect(Math.abs(first(doping).sheetConductance / reference - 1)).toBeLessThan(1e-5);
  });

  test('have a Hall mobility not below the conductivity mobility, and a Hall dose not above the carriers', () => {
    // Cauchy-Schwarz: (Int c mu)^2 <= Int c * Int c mu^2.
    fc.assert(
      fc.property(
        fc.double({ min: 16, max: 20, noNaN: true }),
        fc.double({ min: 0.03, max: 0.3, noNaN: true }),
        (log, sigma) => {
          const made = first(
            dopingOf(
              () => 1e14,
              (x) => 10 ** log * Math.exp(-((x / UM / sigma) ** 2) / 2),
              100 * UM,
              [sigma * UM],
            ),
          );
          expect(made.hallMobility).toBeGreaterThan(made.conductivityMobility * (1 - 1e-6));
          expect(made.hallDose).toBeLessThan(made.carrierDose * (1 + 1e-6));
          expect(ELEMENTARY_CHARGE * made.hallDose * made.hallMobility).toBeCloseTo(made.sheetConductance, 9);
        },
      ),
      { numRuns: 30, seed: 5 },
    );
  });
});

describe('laws of conduction', () => {
  const layer = (peak: number) => (x: number) => peak * Math.exp(-((x / (0.2 * UM)) ** 2));

  test('more dopant of the same type never conducts less', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...MOBILITY_MODELS.filter(({ name }) => name !== 'mf723')),
        fc.double({ min: 15, max: 19.5, noNaN: true }),
        fc.double({ min: 1.01, max: 3, noNaN: true }),
        (model, log, factor) => {
          const conductance = (peak: number) =>
            first(dopingOf(layer(peak), none, 2 * UM, [0.2 * UM]), model).sheetConductance;
          expect(conductance(factor * 10 ** log)).toBeGreaterThan(conductance(10 ** log));
        },
      ),
      { numRuns: 60, seed: 3 },
    );
  });

  test('compensation always conducts less', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...MOBILITY_MODELS),
        fc.double({ min: 15, max: 19.5, noNaN: true }),
        fc.double({ min: 0.01, max: 0.9, noNaN: true }),
        (model, log, part) => {
          const donors = layer(10 ** log);
          const pure = first(dopingOf(donors, none, 0.3 * UM), model).sheetConductance;
          const mixed = first(
            dopingOf(donors, (x) => part * donors(x), 0.3 * UM),
            model,
          ).sheetConductance;
          expect(mixed).toBeLessThan(pure);
        },
      ),
      { numRuns: 60, seed: 4 },
    );
  });
});

describe('the temperature coefficient', () => {
  test('of a lightly doped film is that of the lattice mobility', () => {
    // Klaassen's lattice mobility falls as T^-2.285; impurities at 1e14 take about 1 % of it.
    const doping = dopingOf(() => 1e14, none, 10 * UM);
    const state = neutralState(doping, 300);
    const [coefficient] = temperatureCoefficients(state, neutralChoice(300), klaassen, layerSpans(state));
    expect((coefficient as number) * 300).toBeCloseTo(2.285, 1);
  });

  test('is not invented for a model of one temperature', () => {
    const doping = dopingOf(() => 1e17, none, UM);
    const state = neutralState(doping, 300);
    expect(
      temperatureCoefficients(state, neutralChoice(300), mobilityModel('masetti'), layerSpans(state)),
    ).toEqual([null]);
  });
});

test('the peak of a flat layer is at its top, not where rounding puts it', () => {
  const base = (x: number) => (x < 0.5 * UM ? 1e18 : 1e18 * Math.exp(-(((x - 0.5 * UM) / (0.05 * UM)) ** 2)));
  const [top, substrate] = readings(dopingOf(() => 1e15, base, 525 * UM, [0.5 * UM]));
  expect(top.peakDepth).toBe(0);
  expect(substrate.peakDepth).toBeLessThan(2 * UM);
  expect(substrate.peakNet).toBeCloseTo(1e15, -7);
});

test('the peak beside an abrupt end is the highest node, not the top of a parabola around a corner', () => {
  // A shallow dip that ends abruptly above a flat wafer: the cells beyond it are a hundred thousand times wider.
  const doping = dopingOf((x) => (x < 1.4 * UM ? 5.7e15 : 6e15), none, 525 * UM, [1.4 * UM]);
  const [layer] = readings(doping);
  expect(layer.peakNet / 6e15).toBeCloseTo(1, 9);
});
