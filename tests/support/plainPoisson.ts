/**
 * A second solver for Poisson's equation, written plainly and otherwise than the program's: finite differences in a stretched
 * coordinate on many nodes, damped Newton with a full step limit, extrapolated from two meshes. Boltzmann.
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

/** What a stack may have beside completely ionised doping in equilibrium. */
export interface PlainExtras {
  /** Charge of dopants that hold their carrier, cm^-3: of bound donors less, of bound acceptors more. */
  bound?: (depth: number, electrons: number, holes: number) => number;
  /** cm^-2 */
  surfaceCharge?: number;
  /** Fermi levels of electrons and holes, kT/q. */
  levels?: (depth: number) => readonly [number, number];
}

const DIFFERENCE = 1e-6;

export function plainPoisson(
  net: (depth: number) => number,
  end: number,
  scale: number,
  count: number,
  temperature: number,
  { bound = () => 0, surfaceCharge = 0, levels = () => [0, 0] }: PlainExtras = {},
): PlainSolution {
  const ni = intrinsicDensity(temperature);
  const flux = (PERMITTIVITY * thermalVoltage(temperature)) / ELEMENTARY_CHARGE;
  const x = stretched(end, scale, count);
  const doping = x.map(net);
  const fermi = x.map(levels);
  const u = doping.map((value, i) => fermi[i][value > 0 ? 0 : 1] + Math.asinh(value / (2 * ni)));
  const electrons = (v: number, i: number) => ni * Math.exp(v - fermi[i][0]);
  const holes = (v: number, i: number) => ni * Math.exp(fermi[i][1] - v);
  const density = (v: number, i: number) => {
    const [n, p] = [electrons(v, i), holes(v, i)];
    return p - n + doping[i] + bound(x[i], n, p);
  };
  for (let round = 0; ; round++) {
    if (round > 500) throw new Error('no convergence');
    const [below, diagonal, above, right] = [0, 1, 2, 3].map(() => new Array<number>(count + 1).fill(0));
    for (let i = 0; i <= count; i++) {
      const left = i > 0 ? x[i] - x[i - 1] : 0;
      const next = i < count ? x[i + 1] - x[i] : 0;
      const volume = (left + next) / 2;
      const response = (density(u[i] - DIFFERENCE, i) - density(u[i] + DIFFERENCE, i)) / (2 * DIFFERENCE);
      const [a, c] = [i > 0 ? flux / left : 0, i < count ? flux / next : 0];
      below[i] = -a;
      above[i] = -c;
      diagonal[i] = a + c + volume * response;
      right[i] =
        (i > 0 ? a * (u[i - 1] - u[i]) : 0) +
        (i < count ? c * (u[i + 1] - u[i]) : 0) +
        volume * density(u[i], i) +
        (i === 0 ? surfaceCharge : 0);
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
    if (largest < 1e-9) break;
  }
  return { depth: x, electrons: u.map(electrons), holes: u.map(holes) };
}
