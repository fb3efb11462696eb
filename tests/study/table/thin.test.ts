import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { logLinearDose, thinProfile } from '../../../src/core/study/table/thin';

/** A profile of `count` points with noise, and a layer a few points wide at 0.4 of the depth. */
function noisy(count: number, noise: number): { x: Float64Array; c: Float64Array } {
  const x = Float64Array.from({ length: count }, (_, i) => (2 * i) / count);
  const layer = Math.round(0.4 * count);
  const c = x.map((at, i) => {
    const spread = 1 + noise * Math.sin(12.9898 * i * i);
    return (1e19 * Math.exp(-at * at * 6) + 1e14) * spread * (Math.abs(i - layer) < 6 ? 100 : 1);
  });
  return { x, c };
}

describe('logLinearDose', () => {
  test('is exact for exponentials and for constants', () => {
    const x = Float64Array.of(0, 0.3, 1, 2);
    expect(
      logLinearDose(
        x,
        x.map((at) => Math.exp(-3 * at)),
      ) /
        ((1 - Math.exp(-6)) / 3),
    ).toBeCloseTo(1, 14);
    expect(
      logLinearDose(
        x,
        x.map(() => 5e18),
      ),
    ).toBe(1e19);
  });

  test('loses no digits where neighbours nearly agree', () => {
    for (const step of [1e-9, 1e-6, 1e-4, 1.9e-3, 2.1e-3, 1e-2]) {
      const dose = logLinearDose(Float64Array.of(0, 1), Float64Array.of(1, Math.exp(step)));
      expect(Math.abs(dose / (Math.expm1(step) / step) - 1)).toBeLessThan(1e-12);
    }
  });
});

describe('thinProfile', () => {
  test('keeps the dose, the ends, the order and the limit on points, for any length', () => {
    fc.assert(
      fc.property(fc.integer({ min: 50, max: 5000 }), fc.integer({ min: 10, max: 400 }), (count, most) => {
        const { x, c } = noisy(count, 0.3);
        const thin = thinProfile(x, c, most);
        expect(thin.depth_um.length).toBeLessThanOrEqual(Math.max(most, Math.min(count, most)));
        expect(thin.concentration_cm3.length).toBe(thin.depth_um.length);
        expect([thin.depth_um[0], thin.depth_um.at(-1)]).toEqual([x[0], x.at(-1)]);
        for (let i = 1; i < thin.depth_um.length; i++)
          expect(thin.depth_um[i]).toBeGreaterThan(thin.depth_um[i - 1]);
        const dose = logLinearDose(thin.depth_um, thin.concentration_cm3);
        expect(Math.abs(dose / logLinearDose(x, c) - 1)).toBeLessThan(1e-12);
      }),
    );
  });

  test('keeps a layer a few points wide, its height and its own dose, out of a million noisy points', () => {
    const { x, c } = noisy(1_000_000, 0.1);
    const thin = thinProfile(x, c, 20_000);
    expect(thin.depth_um.length).toBeLessThanOrEqual(20_000);
    const inside = (xs: Float64Array, cs: Float64Array) => {
      const at = [...xs.keys()].filter((i) => xs[i] > 0.799 && xs[i] < 0.801);
      const [d, v] = [Float64Array.from(at, (i) => xs[i]), Float64Array.from(at, (i) => cs[i])];
      return { peak: v.reduce((a, b) => Math.max(a, b)), dose: logLinearDose(d, v) };
    };
    const [before, after] = [inside(x, c), inside(thin.depth_um, thin.concentration_cm3)];
    // The common factor that restores the dose is all that may change a point that is kept.
    expect(Math.abs(after.peak / before.peak - 1)).toBeLessThan(1e-4);
    // The window cuts the bins at its two edges: a bin is 1e-4 of 2e-3 um.
    expect(Math.abs(after.dose / before.dose - 1)).toBeLessThan(0.06);
  });

  test('averages noise away elsewhere instead of picking extremes', () => {
    const { x, c } = noisy(1_000_000, 0.1);
    const thin = thinProfile(x, c, 20_000);
    const truth = (at: number) => 1e19 * Math.exp(-at * at * 6) + 1e14;
    const off = [...thin.depth_um.keys()].map((i) =>
      Math.abs(thin.concentration_cm3[i] / truth(thin.depth_um[i]) - 1),
    );
    off.sort((a, b) => a - b);
    expect(off[Math.floor(off.length / 4)]).toBeLessThan(0.02); // one point carries 0.07 on average, a bin of 100 points 0.007
  });

  test('leaves a table alone that is short enough', () => {
    const { x, c } = noisy(100, 0.1);
    expect(thinProfile(x, c, 100)).toEqual({ depth_um: x, concentration_cm3: c });
  });
});
