import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { gaussHermite } from '../../src/core/numeric/gaussHermite';
import { gaussLegendre, integratePanels } from '../../src/core/numeric/gaussLegendre';
import { gaussRuleOfMasses } from '../../src/core/numeric/golubWelsch';
import { intervalOf } from '../../src/core/numeric/interval';

const sum = (values: ArrayLike<number>): number => Array.from(values).reduce((a, b) => a + b, 0);

describe('gaussLegendre', () => {
  test('has the five-point nodes and weights of Abramowitz and Stegun, Table 25.4', () => {
    const { nodes, weights } = gaussLegendre(5);
    [-0.906179845938664, -0.538469310105683, 0, 0.538469310105683, 0.906179845938664].forEach((x, i) => {
      expect(nodes[i]).toBeCloseTo(x, 13);
    });
    [0.236926885056189, 0.478628670499366, 0.568888888888889, 0.478628670499366, 0.236926885056189].forEach(
      (w, i) => {
        expect(weights[i]).toBeCloseTo(w, 13);
      },
    );
  });

  test.each([6, 10, 16, 24])('with %i points integrates x^(2n-2) exactly and x^(2n) not', (n) => {
    const rule = gaussLegendre(n);
    const moment = (power: number) =>
      sum(rule.weights.map((w, i) => w * rule.nodes[i] ** power)) * ((power + 1) / 2);
    expect(moment(2 * n - 2)).toBeCloseTo(1, 12);
    expect(moment(0)).toBeCloseTo(1, 13);
    if (n < 16) expect(Math.abs(moment(2 * n) - 1)).toBeGreaterThan(1e-6);
  });

  test('sums panels of unequal width', () => {
    expect(integratePanels(Math.exp, [0, 0.1, 1, 3], gaussLegendre(10))).toBeCloseTo(Math.exp(3) - 1, 11);
    expect(integratePanels(Math.exp, [], gaussLegendre(10))).toBe(0);
  });
});

describe('gaussHermite', () => {
  test('gives the moments of the unit normal distribution up to order 20', () => {
    const { nodes, weights } = gaussHermite(14);
    let expected = 1;
    for (let order = 0; order <= 20; order += 2) {
      expect(sum(weights.map((w, i) => w * nodes[i] ** order)) / expected).toBeCloseTo(1, 11);
      expected *= order + 1;
    }
  });
});

describe('gaussRuleOfMasses', () => {
  test('keeps all moments up to order 2n - 1 of whatever masses, with positive weights inside', () => {
    const masses = fc.array(
      fc.record({
        at: fc.double({ min: 2, max: 5, noNaN: true }),
        mass: fc.double({ min: 0, max: 1, noNaN: true }),
      }),
      { minLength: 30, maxLength: 80 },
    );
    fc.assert(
      fc.property(masses, (points) => {
        const total = sum(points.map(({ mass }) => mass));
        fc.pre(total > 0.01);
        const rule = gaussRuleOfMasses(
          points.map(({ at }) => at),
          points.map(({ mass }) => mass),
          2,
          5,
          6,
        );
        expect(rule.weights.every((w) => w >= 0)).toBe(true);
        expect(rule.nodes.every((x) => x >= 2 && x <= 5)).toBe(true);
        for (let order = 0; order <= 11; order++) {
          const wanted = sum(points.map(({ at, mass }) => mass * ((at - 3.5) / 1.5) ** order));
          const got = sum(rule.weights.map((w, i) => w * ((rule.nodes[i] - 3.5) / 1.5) ** order));
          expect(Math.abs(got - wanted)).toBeLessThan(1e-11 * total);
        }
      }),
      { numRuns: 200 },
    );
  });

  test('is empty for no mass and exact for a single one', () => {
    expect(gaussRuleOfMasses([1, 2], [0, 0], 0, 3, 5).nodes).toHaveLength(0);
    const single = gaussRuleOfMasses([1, 1, 1], [1, 2, 3], 0, 3, 5);
    expect(single.nodes).toHaveLength(1);
    expect(single.nodes[0]).toBeCloseTo(1, 14);
    expect(single.weights[0]).toBeCloseTo(6, 14);
  });
});

describe('intervalOf', () => {
  test('finds the interval whose lower edge is at or above no further than the value', () => {
    const edges = [0, 1, 3];
    expect([-1, 0, 0.5, 1, 2.9, 3, 9].map((x) => intervalOf(edges, x))).toEqual([-1, 0, 0, 1, 1, 2, 2]);
    expect(intervalOf([], 1)).toBe(-1);
  });
});
