import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { monotoneCubic } from '../../src/core/numeric/monotone';

/** Nodes with steps of 0.01 to 10 and values within +-100. */
const nodes = fc
  .array(
    fc.tuple(fc.double({ min: 0.01, max: 10, noNaN: true }), fc.double({ min: -100, max: 100, noNaN: true })),
    {
      minLength: 2,
      maxLength: 30,
    },
  )
  .map((pairs) => {
    let x = 0;
    return {
      x: Float64Array.from(pairs, ([step]) => {
        x += step;
        return x;
      }),
      y: Float64Array.from(pairs, ([, y]) => y),
    };
  });

function largestError(f: (x: number) => number, count: number): number {
  const x = Float64Array.from({ length: count + 1 }, (_, i) => i / count);
  const curve = monotoneCubic(x, x.map(f));
  let worst = 0;
  for (let i = 0; i <= 7919; i++) worst = Math.max(worst, Math.abs(curve(i / 7919) - f(i / 7919)));
  return worst;
}

describe('monotoneCubic', () => {
  test('never leaves the range of the two neighbours, and is monotone between them', () => {
    fc.assert(
      fc.property(nodes, ({ x, y }) => {
        const curve = monotoneCubic(x, y);
        for (let i = 0; i + 1 < x.length; i++) {
          const slack = 1e-12 * (Math.abs(y[i]) + Math.abs(y[i + 1]) + 1);
          const sign = Math.sign(y[i + 1] - y[i]);
          let before = y[i];
          for (let k = 1; k <= 20; k++) {
            const value = curve(x[i] + ((x[i + 1] - x[i]) * k) / 20);
            expect(sign * (value - before)).toBeGreaterThanOrEqual(-slack);
            expect(value).toBeGreaterThanOrEqual(Math.min(y[i], y[i + 1]) - slack);
            expect(value).toBeLessThanOrEqual(Math.max(y[i], y[i + 1]) + slack);
            before = value;
          }
        }
      }),
    );
  });

  test('goes through every node exactly, whatever the order of the calls', () => {
    fc.assert(
      fc.property(nodes, fc.array(fc.nat(), { maxLength: 40 }), ({ x, y }, order) => {
        const curve = monotoneCubic(x, y);
        for (const pick of order) expect(curve(x[pick % x.length]) === y[pick % x.length]).toBe(true);
      }),
    );
  });

  test('reproduces straight lines to rounding', () => {
    const x = Float64Array.of(0, 0.1, 0.7, 1.5, 1.6, 4);
    const curve = monotoneCubic(
      x,
      x.map((at) => 3 - 2 * at),
    );
    for (let at = 0; at <= 4; at += 0.037) expect(Math.abs(curve(at) - (3 - 2 * at))).toBeLessThan(1e-14);
  });

  test('converges with the third order where the data are smooth and monotone', () => {
    const order = Math.log2(largestError(Math.exp, 40) / largestError(Math.exp, 80));
    expect(order).toBeGreaterThan(2.9);
    expect(order).toBeLessThan(3.3);
  });

  test('keeps its first derivative continuous across a node', () => {
    const x = Float64Array.of(0, 1, 1.5, 3, 4);
    const curve = monotoneCubic(x, Float64Array.of(0, 1, 4, 5, 9));
    const h = 1e-6;
    for (const at of [1, 1.5, 3]) {
      const left = (curve(at) - curve(at - h)) / h;
      const right = (curve(at + h) - curve(at)) / h;
      expect(Math.abs(left - right)).toBeLessThan(1e-4); // one-sided differences: curvature (below 20) times h
    }
  });

  test('holds the end values outside, answers NaN for NaN, and joins two points by a line', () => {
    const curve = monotoneCubic(Float64Array.of(1, 2), Float64Array.of(5, 7));
    expect([curve(0), curve(1.5), curve(9)]).toEqual([5, 6, 7]);
    expect(curve(Number.NaN)).toBeNaN();
  });

  test('refuses nodes that do not ascend, differ in number or are too few', () => {
    expect(() => monotoneCubic(Float64Array.of(0, 0), Float64Array.of(1, 2))).toThrow(
      '0 after 0; x must ascend',
    );
    expect(() => monotoneCubic(Float64Array.of(0, Number.NaN), Float64Array.of(1, 2))).toThrow('must ascend');
    expect(() => monotoneCubic(Float64Array.of(0, 1), Float64Array.of(1))).toThrow('2 depths and 1 values');
    expect(() => monotoneCubic(Float64Array.of(0), Float64Array.of(1))).toThrow('two or more');
  });
});
