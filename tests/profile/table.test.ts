import { describe, expect, test } from 'vitest';
import { bury, doseOf, evaluator, table } from '../../src/core/profile/shape';

const depth = Float64Array.of(1e-6, 2e-6, 3e-6, 4e-6, 5e-6);

describe('table', () => {
  test('goes through its points and follows an exponential exactly', () => {
    const at = evaluator(
      table(
        depth,
        depth.map((x) => 1e20 * Math.exp(-x / 4e-7)),
      ),
    );
    for (const x of [1e-6, 1.37e-6, 2e-6, 4.9e-6])
      expect(at(x) / (1e20 * Math.exp(-x / 4e-7))).toBeCloseTo(1, 10);
  });

  test('holds its first value to the surface and has nothing below its last', () => {
    const at = evaluator(table(depth, Float64Array.of(5e17, 4e17, 3e17, 2e17, 1e17)));
    expect([0, 5e-7, 1e-6].map(at)).toEqual([5e17, 5e17, 5e17].map((c) => expect.closeTo(c, -6)));
    expect(at(5e-6)).toBeCloseTo(1e17, -6);
    expect(at(5.0001e-6)).toBe(0);
  });

  test('runs linearly into a zero, a single point between zeros included', () => {
    const at = evaluator(table(depth, Float64Array.of(0, 4e17, 0, 2e17, 1e17)));
    expect(at(5e-7)).toBe(0);
    expect(at(1.5e-6)).toBeCloseTo(2e17, -6);
    expect(at(2.25e-6)).toBeCloseTo(3e17, -6);
    expect(at(3.5e-6)).toBeCloseTo(1e17, -6);
    expect(at(4.5e-6)).toBeCloseTo(Math.sqrt(2) * 1e17, -6);
  });

  test('of zeros only is nothing', () => {
    const nothing = table(depth, new Float64Array(5));
    expect(evaluator(nothing)(2e-6)).toBe(0);
    expect(doseOf(nothing, 1)).toBe(0);
  });

  test('has the dose of the flat top, the triangle and the exponential it is made of', () => {
    const shape = table(Float64Array.of(1e-6, 2e-6, 3e-6), Float64Array.of(4e17, 4e17, 0));
    expect(doseOf(shape, 1) / (4e17 * 2e-6 + 2e17 * 1e-6)).toBeCloseTo(1, 12);
    expect(doseOf(shape, 1.5e-6) / (4e17 * 1.5e-6)).toBeCloseTo(1, 12);
  });

  test('buried, starts with a jump and keeps its flat top', () => {
    const at = evaluator(bury(table(depth, Float64Array.of(5e17, 4e17, 3e17, 2e17, 1e17)), 2e-6));
    expect(at(1.99e-6)).toBe(0);
    expect(at(2e-6)).toBeCloseTo(5e17, -6);
    expect(at(4e-6)).toBeCloseTo(4e17, -6);
  });
});
