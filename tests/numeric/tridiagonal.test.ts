import fc from 'fast-check';
import { expect, test } from 'vitest';
import { solveTridiagonal } from '../../src/core/numeric/tridiagonal';

test('the solution fulfils the system it was asked for', () => {
  const positive = fc.double({ min: 0.01, max: 100, noNaN: true });
  fc.assert(
    fc.property(fc.array(fc.tuple(positive, positive, positive), { minLength: 2, maxLength: 40 }), (rows) => {
      const count = rows.length;
      const coupling = Float64Array.from(rows, ([c]) => c);
      const diagonal = Float64Array.from(
        rows,
        ([c, extra], i) => extra + (i < count - 1 ? c : 0) + (i > 0 ? coupling[i - 1] : 0),
      );
      const right = Float64Array.from(rows, ([, , value]) => value);
      const solution = Float64Array.from(right);
      solveTridiagonal(Float64Array.from(diagonal), coupling, solution, count);
      for (let i = 0; i < count; i++) {
        const left =
          diagonal[i] * solution[i] -
          (i > 0 ? coupling[i - 1] * solution[i - 1] : 0) -
          (i < count - 1 ? coupling[i] * solution[i + 1] : 0);
        expect(Math.abs(left - right[i])).toBeLessThan(1e-8 * (1 + Math.abs(right[i])));
      }
    }),
    { numRuns: 100, seed: 3 },
  );
});
