import { describe, expect, test } from 'vitest';
import {
  lssCollisions,
  scatteringAngle,
  universalCollisions,
} from '../../../src/core/process/stopping/scattering';

/** Nuclear stopping in reduced units: epsilon/(pi) times the mean of s over all collisions. */
const reducedStopping = (epsilon: number, { s, weight }: ReturnType<typeof lssCollisions>): number =>
  (epsilon / Math.PI) * s.reduce((sum, value, k) => sum + value * weight[k], 0);

describe('scattering in the universal potential', () => {
  test('at high energy turns by Rutherford’s angle, tan(theta/2) = 1/(2 eps b)', () => {
    // Close collisions hardly feel the screening.
    const [epsilon, b] = [200, 1e-3];
    expect(Math.tan(scatteringAngle(epsilon, b) / 2) * 2 * epsilon * b).toBeCloseTo(1, 1);
  });

  test('turns a head-on ion back and a distant one not at all', () => {
    expect(scatteringAngle(1, 1e-9)).toBeCloseTo(Math.PI, 6);
    expect(scatteringAngle(1, 24)).toBeLessThan(1e-2);
  });

  test('loses energy as the published fit of J. F. Ziegler, J. P. Biersack, U. Littmark 1985 says', () => {
    // The fit is 1 % from the integral over the potential up to eps = 1 and 4 % at 10 (both computed for this project before).
    const published = (e: number) =>
      Math.log(1 + 1.1383 * e) / (2 * (e + 0.01321 * e ** 0.21226 + 0.19593 * Math.sqrt(e)));
    for (const epsilon of [1e-3, 1e-2, 0.1, 1])
      expect(
        Math.abs(reducedStopping(epsilon, universalCollisions(epsilon)) / published(epsilon) - 1),
      ).toBeLessThan(0.015);
    expect(Math.abs(reducedStopping(10, universalCollisions(10)) / published(10) - 1)).toBeLessThan(0.05);
  });
});

test('the Thomas-Fermi cross-section loses by Rutherford’s law at high energy, s_n = ln(eps)/(2 eps)', () => {
  const stopping = reducedStopping(1000, lssCollisions(1000));
  // f(z) -> 1/(2 z) makes ln(1.29 eps)/(2 eps).
  expect(stopping / (Math.log(1.29 * 1000) / 2000)).toBeCloseTo(1, 1);
});
