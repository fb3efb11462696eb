import { describe, expect, test } from 'vitest';
import { resample } from '../../src/core/profile/resample';
import { dopingOf } from '../support/doping';

const UM = 1e-4;
const boron = (x: number) => 1e18 * Math.exp(-(((x - 0.1 * UM) / (0.2 * UM)) ** 2));
const doping = dopingOf(() => 1e15, boron, 5 * UM, [0.1 * UM, 0.3 * UM]);

describe('doping between its nodes', () => {
  test('is what it was at the nodes, junctions included', () => {
    const again = resample(doping, doping.depth);
    doping.dopants.forEach(({ active }, k) => {
      active.forEach((value, i) => {
        if (value > 1e10) expect(again.dopants[k].active[i] / value).toBeCloseTo(1, 12);
      });
    });
    for (const i of doping.junctions) expect(again.net[i]).toBe(0);
    expect(again.junctions).toEqual(doping.junctions);
  });

  test('follows the analytic profile to 1e-4 where it makes up the doping', () => {
    const depth = Float64Array.from({ length: 4001 }, (_, i) => (i * 0.6 * UM) / 4000);
    const { dopants } = resample(doping, depth);
    depth.forEach((x, i) => {
      if (boron(x) > 1e16) expect(Math.abs(dopants[1].active[i] / boron(x) - 1)).toBeLessThan(1e-4);
    });
  });

  test('has its junction only where the depths hold it', () => {
    const ends = Float64Array.of(0, UM, 2 * UM);
    expect(resample(doping, ends).junctions).toEqual([]);
  });
});
