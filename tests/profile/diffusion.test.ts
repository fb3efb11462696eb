/** Diffusion, burial and stripping: closed forms against direct quadrature, and the laws every kind must obey. */

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { convolved } from '../../src/core/profile/convolved';
import {
  bury,
  diffuse,
  doseOf,
  erfcShape,
  evaluator,
  gaussian,
  pearson,
  type Shape,
  strip,
  table,
  uniform,
} from '../../src/core/profile/shape';
import { convolvedDirectly } from '../support/convolution';

// The same cases on every run; ten thousand others of each property passed once.
fc.configureGlobal({ seed: 1958 });

const relative = (a: number, b: number): number => Math.abs(a / b - 1);

/** Largest relative difference of two curves where the second exceeds `floor` of its own peak. */
function worst(a: (x: number) => number, b: (x: number) => number, to: number, floor = 1e-12): number {
  const depths = Array.from({ length: 301 }, (_, i) => (to * i) / 300);
  const peak = Math.max(...depths.map(b));
  return Math.max(...depths.filter((x) => b(x) > floor * peak).map((x) => relative(a(x), b(x))));
}

/** Direct quadrature at a few depths: the adaptive rule is slow. */
function agreesWithQuadrature(
  source: Shape,
  Dt: number,
  breaks: readonly number[],
  depths: readonly number[],
  tolerance: number,
): void {
  const before = evaluator(source);
  const after = evaluator(diffuse(source, Dt));
  for (const x of depths) {
    const direct = convolvedDirectly(before, Dt, x, breaks);
    // below one atom per cm3 the direct rule, cut at twelve kernel widths, is no judge
    if (direct > 1) expect(relative(after(x), direct), `x = ${x}`).toBeLessThan(tolerance);
    else expect(after(x)).toBeLessThan(1);
  }
}

const DEPTHS = [0, 1e-6, 4e-6, 1e-5, 1.6e-5, 2.5e-5, 4e-5];

describe('closed forms of diffusion', () => {
  test.each([
    ['an implant cut at the surface', gaussian(1e20, 1e-5, 4e-6), [0, 1e-5, 1e-4]],
    ['one centred above the surface', gaussian(1e20, -4e-6, 4e-6), [0, 1e-5, 1e-4]],
    ['one buried with its cut-off edge', gaussian(1e20, 1.5e-5, 4e-6, 1.2e-5), [1.2e-5, 1.5e-5, 1e-4]],
  ])('the Gaussian: %s', (_, source, breaks) => {
    for (const Dt of [1e-13, 4e-12, 5e-11]) agreesWithQuadrature(source, Dt, breaks, DEPTHS, 1e-8);
  });

  test("the complementary error function: Smith's integral on both sides of equal Dt", () => {
    // length^2/4 = 2.5e-11
    for (const Dt of [1e-13, 2.4e-11, 2.6e-11, 1e-9])
      agreesWithQuadrature(erfcShape(1e20, 1e-5), Dt, [0, 2e-6, 1e-5, 3e-5, 9e-5], DEPTHS, 1e-8);
  });

  test('the slab, at the surface, buried, and without an end', () => {
    for (const Dt of [1e-13, 5e-11]) {
      agreesWithQuadrature(uniform(1e18, 0, 1e-5), Dt, [0, 1e-5], [0, 4e-6, 9.9e-6, 1.1e-5], 1e-8);
      agreesWithQuadrature(uniform(1e18, 1e-5, 2e-5), Dt, [1e-5, 2e-5], [9e-6, 1e-5, 1.5e-5, 2.1e-5], 1e-8);
      agreesWithQuadrature(
        uniform(1e18, 1e-5, Number.POSITIVE_INFINITY),
        Dt,
        [1e-5, 1e-3],
        [9e-6, 2e-5, 8e-5],
        1e-8,
      );
    }
  });

  test('the erfc after a drive tends to the erfc of the summed Dt when nothing but the order of D t differs', () => {
    // as D2t2 vanishes
    expect(
      worst(evaluator(erfcShape(1e20, 1e-5, 1e-20)), evaluator(erfcShape(1e20, 1e-5)), 4e-5),
    ).toBeLessThan(1e-4);
    // and to the Gaussian of its dose when D2t2 is large: 0.3 % at D1t1/D2t2 = 0.01
    const driven = evaluator(erfcShape(1e20, 1e-5, 2.5e-9));
    const dose = 1e20 * (1e-5 / Math.sqrt(Math.PI));
    expect(relative(driven(0), dose / Math.sqrt(Math.PI * 2.525e-9))).toBeLessThan(0.0035);
  });

  test('a wafer that fills everything does not change', () => {
    const wafer = uniform(1e15, 0, Number.POSITIVE_INFINITY);
    expect(diffuse(wafer, 1e-8)).toBe(wafer);
  });
});

describe('numerical convolution', () => {
  test('of a Gaussian, an erfc and a slab equals their closed forms to 1e-9 down to 1e-12 of the peak', () => {
    const sources: Shape[] = [
      gaussian(1e20, 1e-5, 3e-6),
      gaussian(1e20, 1.5e-5, 4e-6, 1.2e-5),
      erfcShape(1e20, 1e-5),
      uniform(1e18, 1e-5, 2e-5),
      uniform(1e18, 1e-5, Number.POSITIVE_INFINITY),
    ];
    for (const source of sources)
      for (const Dt of [1e-19, 1e-16, 1e-14, 1e-12, 1e-11, 1e-9])
        expect(
          worst(
            evaluator(convolved(source, Dt)),
            evaluator(diffuse(source, Dt)),
            4e-5 + 8 * Math.sqrt(2 * Dt),
          ),
          `${source.kind} ${Dt}`,
        ).toBeLessThan(1e-9);
  });

  test('of a Pearson profile equals direct quadrature', () => {
    const source = pearson(1e15, { mean: 1.2e-5, straggle: 4e-6, skewness: -0.74, kurtosis: 3.64 });
    const breaks = [0, 6e-6, 1.2e-5, 1.8e-5, 4e-5];
    for (const Dt of [1e-15, 1e-13, 4e-12, 5e-11])
      agreesWithQuadrature(source, Dt, breaks, [0, 1e-6, 4e-6, 1e-5, 1.6e-5, 2e-5], 1e-7);
  });

  test('of a rough table equals direct quadrature between its points', () => {
    const depth = Float64Array.from({ length: 41 }, (_, i) => 1e-7 + i * 5e-7);
    const rough = depth.map(
      (x, i) => 1e19 * Math.exp(-(((x - 7e-6) / 4e-6) ** 2)) * (1 + 0.3 * ((i * 7) % 5)) + 1e15,
    );
    const breaks = [0, ...depth];
    for (const Dt of [1e-15, 1e-13, 1e-11])
      agreesWithQuadrature(table(depth, rough), Dt, breaks, [0, 1.3e-6, 7e-6, 1.2e-5, 2e-5], 1e-7);
  });

  test('stays smooth and positive where only the far tail of the kernel reaches', () => {
    const at = evaluator(diffuse(table(Float64Array.of(0, 1e-6), Float64Array.of(1e20, 1e20)), 5e-13));
    let [x, before] = [2e-6, at(2e-6)];
    while (before > 1) {
      x += 1e-8;
      const here = at(x);
      expect(here > 0 && here < before).toBe(true);
      before = here;
    }
    // twenty decades below 1e20 is 9.3 kernel widths out
    expect(x).toBeGreaterThan(9e-6);
  });
});

const length = fc.double({ min: 2e-7, max: 2e-5, noNaN: true });
const concentration = fc.double({ min: 1e14, max: 1e21, noNaN: true });
const plain: fc.Arbitrary<Shape> = fc.oneof(
  fc
    .tuple(concentration, fc.double({ min: -1e-5, max: 3e-5, noNaN: true }), length)
    .map(([c, mean, sigma]) => gaussian(c, mean, sigma)),
  fc.tuple(concentration, length).map(([c, l]) => erfcShape(c, l)),
  fc.tuple(concentration, length, length).map(([c, from, width]) => uniform(c, from, from + width)),
  fc
    .tuple(
      concentration,
      length,
      length,
      fc.double({ min: -1.4, max: 1, noNaN: true }),
      fc.double({ min: 0.05, max: 3, noNaN: true }),
    )
    .map(([c, mean, straggle, skewness, excess]) =>
      pearson(c * straggle, { mean, straggle, skewness, kurtosis: 2.9 + 1.6 * skewness * skewness + excess }),
    ),
  fc
    .array(
      fc.tuple(fc.double({ min: 1e-8, max: 1e-6, noNaN: true }), fc.oneof(concentration, fc.constant(0))),
      { minLength: 2, maxLength: 30 },
    )
    .map((points) => {
      let x = 0;
      return table(
        Float64Array.from(points, ([step]) => {
          x += step;
          return x;
        }),
        Float64Array.from(points, ([, c]) => c),
      );
    }),
);
/** Plain, diffused, buried or stripped shapes, up to three operations deep. */
const worked: fc.Arbitrary<Shape> = fc
  .tuple(
    plain,
    fc.array(
      fc.tuple(fc.constantFrom(diffuse, bury, strip), fc.double({ min: 0.01, max: 0.3, noNaN: true })),
      { maxLength: 3 },
    ),
  )
  .map(([shape, operations]) =>
    operations.reduce(
      (now, [operation, size]) => operation(now, operation === diffuse ? (size * 1e-5) ** 2 : size * 1e-5),
      shape,
    ),
  );
const dose = (shape: Shape): number => doseOf(shape, Number.POSITIVE_INFINITY);

describe('any shape', () => {
  test('keeps its dose in a heat treatment and under an epitaxial layer', () => {
    fc.assert(
      fc.property(worked, fc.double({ min: 1e-8, max: 1e-5, noNaN: true }), (shape, size) => {
        const before = dose(shape);
        fc.pre(before > 1e6);
        expect(relative(dose(bury(shape, size)), before)).toBeLessThan(1e-6);
        expect(relative(dose(diffuse(shape, size * size)), before)).toBeLessThan(1e-6);
      }),
      { numRuns: 150 },
    );
  });

  test('diffuses by Dt twice as by 2 Dt once', () => {
    fc.assert(
      fc.property(
        worked,
        fc.double({ min: 1e-8, max: 5e-6, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (shape, size, part) => {
          const Dt = size * size;
          // a second convolution of the first one's result: diffuse itself would only add the two
          const twice = evaluator(convolved(diffuse(shape, Dt), Dt));
          const once = evaluator(diffuse(shape, 2 * Dt));
          const peak = Math.max(...shape.marks.map(evaluator(diffuse(shape, 2 * Dt))));
          const x = part * 4e-5;
          fc.pre(once(x) > 1e-12 * peak && once(x) > 1);
          expect(relative(twice(x), once(x))).toBeLessThan(1e-6);
        },
      ),
      { numRuns: 150 },
    );
  });

  test('is the same after a burial and an equal stripping', () => {
    fc.assert(
      fc.property(
        worked,
        fc.double({ min: 1e-7, max: 1e-4, noNaN: true }),
        fc.double({ min: 0, max: 4e-5, noNaN: true }),
        (shape, size, x) => {
          const before = evaluator(shape)(x);
          const after = evaluator(strip(bury(shape, size), size))(x);
          fc.pre(before > 1 && shape.jumps.every((jump) => Math.abs(jump - x) > 1e-12));
          expect(relative(after, before)).toBeLessThan(1e-6);
        },
      ),
      { numRuns: 300 },
    );
  });

  test('gives a concentration that is finite and not negative at every depth, and loses exactly what is stripped', () => {
    fc.assert(
      fc.property(
        worked,
        fc.double({ min: 0, max: 525e-4, noNaN: true }),
        fc.double({ min: 1e-8, max: 2e-5, noNaN: true }),
        (shape, x, cut) => {
          const at = evaluator(shape);
          for (const depth of [0, x, x / 1e3, cut, ...shape.marks, ...shape.jumps]) {
            expect(at(depth)).toBeGreaterThanOrEqual(0);
            expect(at(depth)).toBeLessThan(1e25);
          }
          const total = dose(shape);
          expect(Math.abs(dose(strip(shape, cut)) + doseOf(shape, cut) - total)).toBeLessThanOrEqual(
            1e-8 * total + 1e-6,
          );
        },
      ),
      { numRuns: 300 },
    );
  });

  test('survives being copied as plain data', () => {
    fc.assert(
      fc.property(worked, fc.double({ min: 0, max: 4e-5, noNaN: true }), (shape, x) => {
        expect(evaluator(structuredClone(shape))(x)).toBe(evaluator(shape)(x));
      }),
      { numRuns: 50 },
    );
  });

  test('carries marks and jumps inside the silicon, ascending', () => {
    fc.assert(
      fc.property(worked, ({ marks, jumps }) => {
        for (const depths of [marks, jumps])
          depths.forEach((x, i) => {
            expect(x >= 0 && Number.isFinite(x) && (i === 0 || x > depths[i - 1])).toBe(true);
          });
      }),
    );
  });

  test('has jumps exactly where the concentration on either side differs', () => {
    for (const [shape, jumps] of [
      [bury(gaussian(1e18, 1e-6, 2e-6), 3e-6), [3e-6]],
      [uniform(1e16, 1e-6, 2e-6), [1e-6, 2e-6]],
      [bury(uniform(1e15, 0, Number.POSITIVE_INFINITY), 1e-5), [1e-5]],
      [bury(diffuse(gaussian(1e18, 1e-6, 2e-6), 1e-12), 3e-6), [3e-6]],
      [table(Float64Array.of(0, 1e-6), Float64Array.of(1e17, 1e16)), [1e-6]],
      [diffuse(uniform(1e16, 1e-6, 2e-6), 1e-12), []],
    ] as [Shape, number[]][]) {
      expect(shape.jumps).toHaveLength(jumps.length);
      jumps.forEach((x, i) => {
        expect(shape.jumps[i]).toBeCloseTo(x, 12);
        const at = evaluator(shape);
        expect(Math.abs(at(x - 1e-11) - at(x + 1e-11))).toBeGreaterThan(1e10);
      });
    }
  });
});
