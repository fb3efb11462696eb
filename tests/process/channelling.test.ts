import { describe, expect, test } from 'vitest';
import { BORON_TAIL, withTail } from '../../src/core/process/channelling';
import { doseOf, evaluator, gaussian, pearson, type Shape } from '../../src/core/profile/shape';
import { solve } from '../../src/core/solve';
import { studyProblems } from '../../src/core/study/validate';
import { study } from '../support/studies';

const UM = 1e-4;
const ALL = Number.POSITIVE_INFINITY;
const boron60 = pearson(1e14, { mean: 0.2 * UM, straggle: 0.058 * UM, skewness: -0.82, kurtosis: 3.9 });

describe('a tail', () => {
  test('keeps the dose', () => {
    for (const shape of [
      boron60,
      gaussian(1e19, 0.05 * UM, 0.03 * UM),
      gaussian(1e18, -0.01 * UM, 0.02 * UM),
    ])
      expect(doseOf(withTail(shape), ALL) / doseOf(shape, ALL)).toBeCloseTo(1, 8);
  });

  test('falls by e in each decay length', () => {
    const at = evaluator(withTail(boron60));
    for (const um of [0.4, 0.5, 0.7, 1, 1.5])
      expect(at(um * UM) / at(um * UM + BORON_TAIL)).toBeCloseTo(Math.E, 6);
  });

  test('would start at half of the peak', () => {
    const [tailed, bare] = [evaluator(withTail(boron60)), evaluator(boron60)];
    const scale = tailed(0.2 * UM) / bare(0.2 * UM);
    let half = 0.2 * UM;
    const peak = Math.max(...Array.from({ length: 4000 }, (_, i) => bare(i * 1e-8)));
    while (bare(half) > peak / 2) half += 1e-9;
    const expected = (scale * peak * Math.exp(-(0.6 * UM - half) / BORON_TAIL)) / 2;
    expect(tailed(0.6 * UM) / expected).toBeCloseTo(1, 3);
  });

  test('leaves the body as it was, but for the dose that it takes', () => {
    const [tailed, bare] = [evaluator(withTail(boron60)), evaluator(boron60)];
    const scale = tailed(0.2 * UM) / bare(0.2 * UM);
    const dose = doseOf(boron60, ALL);
    const below = (shape: Shape) => doseOf(shape, ALL) - doseOf(shape, 0.22 * UM);
    const added = below(withTail(boron60)) / scale - below(boron60);
    expect(scale).toBeCloseTo(dose / (dose + added), 4);
    expect(added).toBeGreaterThan(0);
    for (const um of [0.05, 0.1, 0.15, 0.22])
      expect(tailed(um * UM) / bare(um * UM) / scale).toBeCloseTo(1, 4);
  });

  test('is nowhere below a profile that falls more slowly', () => {
    const wide = gaussian(1e18, 0.5 * UM, 0.3 * UM);
    const [tailed, bare] = [evaluator(withTail(wide)), evaluator(wide)];
    for (const um of [0.2, 0.6, 0.9, 1.2]) expect(tailed(um * UM) / bare(um * UM)).toBeCloseTo(1, 3);
  });
});

describe('an implant with a tail', () => {
  const implant = { step: 'implant', dopant: 'boron', dose_cm2: 1e13, energy_keV: 60 } as const;
  const tailed = { ...implant, tail: 'exponential' } as const;

  test('has a deeper junction and says what the tail is', () => {
    const [without, within] = [implant, tailed].map((step) => solve(study({ steps: [step] })).result);
    expect(within.junctions[0].metallurgical_um).toBeGreaterThan(
      Number(without.junctions[0].metallurgical_um) + 0.05,
    );
    expect(within.warnings.map(({ code }) => code)).toContain('channelling-tail');
    expect(within.warnings.map(({ code }) => code)).not.toContain('amorphous-ranges');
  });

  test('has the dose of one without, diffused or not', () => {
    const anneal = { step: 'anneal', temperature_C: 1000, time_min: 30 } as const;
    for (const after of [[], [anneal]]) {
      const [without, within] = [implant, tailed].map(
        (step) => solve(study({ steps: [step, ...after], models: { carriers: 'neutral' } })).result.layers[0],
      );
      expect(within.carrierDose_cm2 / without.carrierDose_cm2).toBeCloseTo(1, 2);
    }
  });

  test('is for boron alone', () => {
    const phosphorus = study({ steps: [{ ...tailed, dopant: 'phosphorus' }] });
    expect(studyProblems(phosphorus)).toMatchObject([{ key: 'steps[0].tail' }]);
    expect(studyProblems(study({ steps: [{ ...tailed, dopant: 'BF2' }] }))).toEqual([]);
  });
});
