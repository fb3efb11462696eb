import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { diffusivity } from '../../src/core/material/diffusivity';
import { activeLimit, solidSolubility } from '../../src/core/material/solubility';
import { activation } from '../../src/core/process/activation';
import { epitaxy } from '../../src/core/process/epitaxy';
import { etch } from '../../src/core/process/etch';
import { dtOf, heatUp, heatWarnings } from '../../src/core/process/heat';
import { predeposition } from '../../src/core/process/predeposition';
import { implantRemarks } from '../../src/core/process/remarks';
import type { Contribution } from '../../src/core/profile/doping';
import { doseOf, evaluator, gaussian, pearson, uniform } from '../../src/core/profile/shape';
import type { ImplantStep } from '../../src/core/study/recipe';

const UM = 1e-4;
const ALL = Number.POSITIVE_INFINITY;
const kelvin = (celsius: number) => celsius + 273.15;
const heat = (celsius: number, minutes: number, end = celsius) => ({
  temperature: kelvin(celsius),
  endTemperature: kelvin(end),
  time: minutes * 60,
});
const boron: Contribution = { dopant: 'boron', shape: gaussian(1e18, 0.2 * UM, 0.05 * UM), stepIndex: 1 };

describe('a heat treatment', () => {
  test('at one temperature moves by D times its time', () => {
    expect(dtOf('fair1981', 'boron', heat(1000, 30))).toBe(
      diffusivity('fair1981', 'boron', kelvin(1000)) * 1800,
    );
  });

  test('as a ramp moves as many short steps do', () => {
    const [from, to, minutes, count] = [700, 1100, 40, 4000];
    const steps = Array.from({ length: count }, (_, i) =>
      dtOf('fair1981', 'arsenic', heat(from + ((to - from) * (i + 0.5)) / count, minutes / count)),
    );
    const sum = steps.reduce((a, b) => a + b, 0);
    expect(dtOf('fair1981', 'arsenic', heat(from, minutes, to)) / sum).toBeCloseTo(1, 6);
    expect(dtOf('fair1981', 'arsenic', heat(to, minutes, from)) / sum).toBeCloseTo(1, 6);
  });

  test('in two parts is the treatment in one', () => {
    const once = evaluator(heatUp([boron], 'fair1981', heat(1000, 50))[0].shape);
    const twice = evaluator(
      heatUp(heatUp([boron], 'fair1981', heat(1000, 20)), 'fair1981', heat(1000, 30))[0].shape,
    );
    for (const um of [0, 0.1, 0.2, 0.3, 0.5]) expect(twice(um * UM) / once(um * UM)).toBeCloseTo(1, 5);
  });

  test('keeps every dose behind its sealed surface', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.02, max: 0.4, noNaN: true }),
        fc.double({ min: 0.01, max: 0.1, noNaN: true }),
        fc.double({ min: 850, max: 1150, noNaN: true }),
        fc.double({ min: 1, max: 120, noNaN: true }),
        (depth, straggle, celsius, minutes) => {
          for (const shape of [
            gaussian(1e18, depth * UM, straggle * UM),
            pearson(1e14, { mean: depth * UM, straggle: straggle * UM, skewness: -0.6, kurtosis: 3.5 }),
          ]) {
            const [after] = heatUp([{ ...boron, shape }], 'fuller1956', heat(celsius, minutes));
            expect(Math.abs(doseOf(after.shape, ALL) / doseOf(shape, ALL) - 1)).toBeLessThan(1e-6);
          }
        },
      ),
      { numRuns: 40, seed: 12 },
    );
  });

  test('too short and cool to move an atom leaves all as it is', () => {
    expect(heatUp([boron], 'fair1981', heat(300, 1))[0]).toBe(boron);
  });

  test('warns where diffusivities are extrapolated, and where doping exceeds the intrinsic density', () => {
    const codes = (celsius: number, peak: number) =>
      heatWarnings(
        [{ ...boron, shape: gaussian(peak, 0.2 * UM, 0.05 * UM) }],
        'fair1981',
        heat(celsius, 60),
        1,
      ).map(({ code }) => code);
    expect(codes(1000, 1e18)).toEqual([]);
    expect(codes(1300, 1e18)).toEqual(['diffusivity-range']);
    expect(codes(1000, 1e20)).toEqual(['extrinsic-diffusion']);
    expect(heatWarnings([{ ...boron, stepIndex: 0 }], 'fair1981', heat(1300, 60), 1)).toEqual([]);
  });
});

describe('a predeposition', () => {
  const step = {
    kind: 'predeposition',
    index: 1,
    dopant: 'phosphorus',
    temperature: kelvin(950),
    time: 1800,
  } as const;
  const Dt = dtOf('fair1981', 'phosphorus', heat(950, 30));

  test('holds the surface at the solid solubility, or at what is stated', () => {
    expect(predeposition(step, Dt).surface).toBe(solidSolubility('phosphorus', kelvin(950)));
    expect(predeposition({ ...step, surface: 3e19 }, Dt).surface).toBe(3e19);
  });

  test('brings in 2 N sqrt(Dt/pi)', () => {
    const { shape, surface } = predeposition(step, Dt);
    if (!shape) throw new Error('nothing went in');
    expect(doseOf(shape, ALL) / (2 * surface * Math.sqrt(Dt / Math.PI))).toBeCloseTo(1, 6);
    expect(evaluator(shape)(0)).toBe(surface);
  });

  test('of no time brings nothing', () => {
    expect(predeposition(step, 0).shape).toBeNull();
  });
});

describe('epitaxy and etching', () => {
  test('epitaxy buries everything and adds an even layer', () => {
    const grown = epitaxy([boron], {
      kind: 'epitaxy',
      index: 2,
      thickness: 0.3 * UM,
      dopant: 'phosphorus',
      concentration: 1e16,
    });
    expect(grown.map(({ dopant, stepIndex }) => [dopant, stepIndex])).toEqual([
      ['boron', 1],
      ['phosphorus', 2],
    ]);
    const [buried, layer] = grown.map(({ shape }) => evaluator(shape));
    expect(buried(0.5 * UM) / evaluator(boron.shape)(0.2 * UM)).toBeCloseTo(1, 12);
    expect([layer(0.1 * UM), layer(0.4 * UM)]).toEqual([1e16, 0]);
    expect(doseOf(grown[0].shape, ALL) / doseOf(boron.shape, ALL)).toBeCloseTo(1, 6);
  });

  test('epitaxy without dopant adds none', () => {
    expect(epitaxy([boron], { kind: 'epitaxy', index: 2, thickness: UM, concentration: 0 })).toHaveLength(1);
  });

  test('etching takes the top with the dopant in it, and tells how much that was', () => {
    const { contributions, removedDose } = etch([boron], { thickness: 0.2 * UM });
    const left = evaluator(contributions[0].shape);
    expect(left(0.05 * UM) / evaluator(boron.shape)(0.25 * UM)).toBeCloseTo(1, 12);
    const whole = doseOf(boron.shape, ALL);
    expect(removedDose / whole).toBeCloseTo(0.5, 4);
    expect((doseOf(contributions[0].shape, ALL) + removedDose) / whole).toBeCloseTo(1, 6);
  });

  test('what is grown and etched again is where it was', () => {
    const grown = epitaxy([boron], { kind: 'epitaxy', index: 2, thickness: 0.7 * UM, concentration: 0 });
    const { contributions } = etch(grown, { thickness: 0.7 * UM });
    for (const um of [0, 0.15, 0.2, 0.4])
      expect(evaluator(contributions[0].shape)(um * UM) / evaluator(boron.shape)(um * UM)).toBeCloseTo(1, 9);
  });

  test('the wafer’s own doping does not count as removed', () => {
    const wafer: Contribution = { dopant: 'boron', shape: uniform(1e15, 0, ALL), stepIndex: 0 };
    expect(etch([wafer], { thickness: UM }).removedDose).toBe(0);
  });
});

describe('activation', () => {
  test('in full limits nothing', () => {
    expect(activation('full', ['boron'], kelvin(1000))).toEqual({ fraction: {}, limit: {}, warnings: [] });
  });

  test('by fractions takes them as they are', () => {
    expect(activation({ boron: 0.4 }, ['boron', 'arsenic'], undefined).fraction).toEqual({ boron: 0.4 });
  });

  test('by solubility caps every dopant at the active limit of the last heat treatment', () => {
    const { limit } = activation('solubility', ['boron', 'arsenic'], kelvin(950));
    expect(limit).toEqual({
      boron: activeLimit('boron', kelvin(950)),
      arsenic: activeLimit('arsenic', kelvin(950)),
    });
  });

  test('by solubility without heat leaves all active and says so', () => {
    const { limit, warnings } = activation('solubility', ['boron'], undefined);
    expect(limit).toEqual({});
    expect(warnings.map(({ code }) => code)).toEqual(['activation-no-heat']);
  });
});

describe('remarks on implants', () => {
  const implanted = (species: ImplantStep['species']): ImplantStep => ({
    kind: 'implant',
    index: 1,
    species,
    dose: 1e13,
    energy_keV: 50,
    shape: 'pearson',
    hasTail: false,
    ranges: 'universal',
  });

  test('channelling is named for boron and phosphorus, and the tail that stands in for it', () => {
    const codes = (species: ImplantStep['species'], hasTail = false) =>
      implantRemarks([{ ...implanted(species), hasTail }]).map(({ code }) => code);
    for (const species of ['boron', 'BF2', 'phosphorus'] as const)
      expect(codes(species)).toEqual(['amorphous-ranges']);
    expect(codes('arsenic')).toEqual([]);
    expect(codes('boron', true)).toEqual(['channelling-tail']);
  });
});
