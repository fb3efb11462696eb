/**
 * A second solver for Poisson's equation, written plainly and otherwise than the program's: finite differences in a stretched
 * coordinate on many nodes, damped Newton with a full step limit, extrapolated from two meshes. Complete ionisation, Boltzmann.
 */

import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { intrinsicDensity } from '../../src/core/material/intrinsic';
import { PERMITTIVITY, thermalVoltage } from '../../src/core/material/silicon';

export interface PlainSolution {
  depth: number[];
  electrons: number[];
  holes: number[];
}

/** Nodes x = scale sinh(s) from 0 to `end`, so that they crowd at the surface where the layers are. */
function stretched(end: number, scale: number, count: number): number[] {
  const last = Math.asinh(end / scale);
  return Array.from({ length: count + 1 }, (_, i) => scale * Math.sinh((last * i) / count));
}

export function plainPoisson(
  net: (depth: number) => number,
  end: number,
  scale: number,
  count: number,
  temperature: number,
): PlainSolution {
  const ni = intrinsicDensity(temperature);
  const flux = (PERMITTIVITY * thermalVoltage(temperature)) / ELEMENTARY_CHARGE;
  const x = stretched(end, scale, count);
  const doping = x.map(net);
  const u = doping.map((value) => Math.asinh(value / (2 * ni)));
  for (let round = 0; ; round++) {
    if (round > 500) throw new Error('no convergence');
    const [below, diagonal, above, right] = [0, 1, 2, 3].map(() => new Array<number>(count + 1).fill(0));
    for (let i = 0; i <= count; i++) {
      const left = i > 0 ? x[i] - x[i - 1] : 0;
      const next = i < count ? x[i + 1] - x[i] : 0;
      const volume = (left + next) / 2;
      const [n, p] = [ni * Math.exp(u[i]), ni * Math.exp(-u[i])];
      const [a, c] = [i > 0 ? flux / left : 0, i < count ? flux / next : 0];
      below[i] = -a;
      above[i] = -c;
      diagonal[i] = a + c + volume * (n + p);
      right[i] =
        (i > 0 ? a * (u[i - 1] - u[i]) : 0) +
        (i < count ? c * (u[i + 1] - u[i]) : 0) +
        volume * (p - n + doping[i]);
    }
    for (let i = 1; i <= count; i++) {
      const factor = below[i] / diagonal[i - 1];
      diagonal[i] -= factor * above[i - 1];
      right[i] -= factor * right[i - 1];
    }
    let largest = 0;
    for (let i = count; i >= 0; i--) {
      right[i] = (right[i] - (i < count ? above[i] * right[i + 1] : 0)) / diagonal[i];
      largest = Math.max(largest, Math.abs(right[i]));
    }
    const limit = Math.min(1, 2 / largest);
    for (let i = 0; i <= count; i++) u[i] += limit * right[i];
    if (largest < 1e-10) break;
  }
  return { depth: x, electrons: u.map((v) => ni * Math.exp(v)), holes: u.map((v) => ni * Math.exp(-v)) };
}
