import { describe, expect, test } from 'vitest';
import { pearsonDensity } from '../../src/core/profile/pearsonDensity';
import { doseOf, evaluator, pearson } from '../../src/core/profile/shape';
import { integrate } from '../support/quadrature';

/** Moments by the tests' own quadrature, over the support mapped to (0, pi) or cut where nothing is left. */
function moments(straggle: number, skewness: number, kurtosis: number) {
  const density = pearsonDensity(straggle, skewness, kurtosis);
  const about = (order: number): number => {
    const f = (u: number) => u ** order * Math.exp(density.logAt(u));
    // u = straggle tan(t): algebraic tails become smooth ends
    const inTangent = (t: number) => f(straggle * Math.tan(t)) * (straggle / Math.cos(t) ** 2);
    const [low, high] = [density.low, density.high].map((end) => Math.atan(end / straggle));
    return (
      integrate(inTangent, low, density.mode === 0 ? 0 : Math.atan(density.mode / straggle), 1e-9) +
      integrate(inTangent, density.mode === 0 ? 0 : Math.atan(density.mode / straggle), high, 1e-9)
    );
  };
  const [mass, first, second, third, fourth] = [0, 1, 2, 3, 4].map(about);
  return {
    mass,
    mean: first / straggle,
    straggle: Math.sqrt(second) / straggle,
    skewness: third / straggle ** 3,
    kurtosis: fourth / straggle ** 4,
  };
}

const cases: [type: string, skewness: number, kurtosis: number][] = [
  ['I', 0.46, 3.02],
  ['I', -0.35, 2.92],
  ['I', -0.74, 3.64],
  ['I', 0.57, 3.29],
  ['I', 0, 2.4],
  ['I', 0, 2.9],
  ['IV', -1.26, 6.61],
  ['IV', 0.3, 3.4],
  ['IV', -0.1, 3.2],
  ['IV', 0, 4],
  ['IV', 0, 3.001],
  ['IV', -1.9, 12.5],
  ['VI', -1.46, 7.03],
  ['VI', 1.2, 5.4],
  ['VI', -0.8, 4.1],
  ['normal', 0, 3],
  ['III', 0.8, 3 + 1.5 * 0.64],
  ['III', -0.4, 3 + 1.5 * 0.16],
];

describe('pearsonDensity', () => {
  test.each(cases)(
    'type %s with skewness %d and kurtosis %d has the four moments asked for',
    (type, skewness, kurtosis) => {
      expect(pearsonDensity(1, skewness, kurtosis).type).toBe(type);
      const got = moments(0.05, skewness, kurtosis);
      expect(got.mass).toBeCloseTo(1, 6);
      expect(got.mean).toBeCloseTo(0, 5);
      expect(got.straggle).toBeCloseTo(1, 5);
      expect(got.skewness).toBeCloseTo(skewness, 5);
      expect(got.kurtosis).toBeCloseTo(kurtosis, 5);
    },
  );

  test('has the four moments all over the plane of skewness and kurtosis', () => {
    const seen = new Set<string>();
    for (const skewness of [-1.8, -1.1, -0.6, -0.2, 0.1, 0.5, 1, 1.7])
      for (const excess of [0.1, 0.5, 0.9, 1.1, 1.5, 2.2]) {
        // from just above the border of type III, where the tails are lightest, outwards and inwards
        const kurtosis =
          3 + 1.5 * skewness * skewness * excess + (excess > 1 ? 0.15 * (excess - 1) : -0.1 * (1 - excess));
        let type: string;
        try {
          type = pearsonDensity(1, skewness, kurtosis).type;
        } catch {
          continue;
        }
        seen.add(type);
        const got = moments(3e-6, skewness, kurtosis);
        for (const [value, wanted] of [
          [got.mass, 1],
          [got.mean, 0],
          [got.straggle, 1],
          [got.skewness, skewness],
          [got.kurtosis, kurtosis],
        ])
          expect(Math.abs(value - wanted), `${type} ${skewness} ${kurtosis}`).toBeLessThan(
            1e-5 * Math.max(1, kurtosis),
          );
      }
    expect([...seen].sort()).toEqual(['I', 'IV', 'VI']);
  });

  test('passes through type V without a step', () => {
    // kappa = 1: the kurtosis at which types IV and VI meet, for skewness -1
    const border = (48 + 39 + 6 * 5 ** 1.5) / 31;
    const at = (kurtosis: number) =>
      [-2.5, -1, 0, 1, 1.5].map((u) => pearsonDensity(1, -1, kurtosis).logAt(u));
    expect(pearsonDensity(1, -1, border).type).toBe('V');
    expect(pearsonDensity(1, -1, border + 1e-4).type).toBe('IV');
    expect(pearsonDensity(1, -1, border - 1e-4).type).toBe('VI');
    at(border).forEach((log, i) => {
      expect(log).toBeCloseTo((at(border + 1e-5)[i] + at(border - 1e-5)[i]) / 2, 4);
    });
    const got = moments(1, -1, border);
    expect(got.skewness).toBeCloseTo(-1, 5);
    expect(got.kurtosis).toBeCloseTo(border, 4);
  });

  test('becomes the normal distribution as skewness and excess vanish', () => {
    const normal = (u: number) => -(u * u) / 2 - Math.log(Math.sqrt(2 * Math.PI));
    for (const [skewness, kurtosis] of [
      [0, 3],
      [1e-7, 3],
      [0, 3 + 1e-7],
      [1e-7, 3 + 1e-7],
      [1e-6, 3 - 1e-7],
    ])
      for (const u of [-4, -1, 0, 2, 4])
        expect(pearsonDensity(1, skewness, kurtosis).logAt(u)).toBeCloseTo(normal(u), 4);
  });

  test('refuses moments that no single-peaked distribution has', () => {
    expect(() => pearsonDensity(1, 2, 4.9)).toThrow(RangeError);
    expect(() => pearsonDensity(1, 0, 1.7)).toThrow(/single|one peak/);
    expect(() => pearsonDensity(1, Number.NaN, 3)).toThrow(RangeError);
  });
});

describe('pearson', () => {
  test('holds in the silicon what the quadrature finds there', () => {
    const shape = pearson(1e15, { mean: 1.5e-6, straggle: 1e-6, skewness: -0.3, kurtosis: 3.1 });
    expect(doseOf(shape, Number.POSITIVE_INFINITY) / integrate(evaluator(shape), 0, 2e-5, 1e-11)).toBeCloseTo(
      1,
      9,
    );
    expect(doseOf(shape, 1e-6) / integrate(evaluator(shape), 0, 1e-6, 1e-11)).toBeCloseTo(1, 9);
  });

  test('falls smoothly and stays positive twenty decades below its peak', () => {
    const at = evaluator(pearson(1e15, { mean: 2e-5, straggle: 5e-6, skewness: -1.26, kurtosis: 6.61 }));
    let before = at(3e-5);
    for (let x = 3.01e-5; x < 2e-4; x += 1e-7) {
      const here = at(x);
      if (before < 1) break;
      expect(here > 0 && here < before).toBe(true);
      before = here;
    }
  });
});
