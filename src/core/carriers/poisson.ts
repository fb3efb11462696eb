/**
 * Poisson's equation in depth by quadratic finite elements on the cells of the mesh, the charge taken at their three nodes with
 * Simpson's weights: fourth order, and the charge it balances is the one the layers are integrated with.
 *
 * Newton's method; each cell's middle is eliminated, so that a symmetric tridiagonal system of the cell ends is left. Field
 * energy and the energy of the charge are convex in the potential, so that there is one solution and the damped steps reach it
 * from anywhere. Elements and Simpson's rule: any textbook of the finite element method; common practice, no source.
 */

import { ELEMENTARY_CHARGE } from '../material/constants';
import { PERMITTIVITY, thermalVoltage } from '../material/silicon';
import { solveTridiagonal } from '../numeric/tridiagonal';
import type { ChargeModel } from './charge';

/** What the surface imposes: a sheet of charge outside (cm^-2 of q, zero for zero field) or the potential there (kT/q). */
export type SurfaceCondition = { readonly charge: number } | { readonly potential: number };

const MOST_STEPS = 200;

/** The linear system of one mesh: what Newton's method and small changes of bias share. */
export class PoissonSystem {
  /** Right-hand side at every node in, change of the potential out. */
  readonly step: Float64Array;
  readonly #depth: Float64Array;
  readonly #flux: number;
  readonly #isFixed: boolean;
  readonly #diagonal: Float64Array;
  readonly #coupling: Float64Array;
  readonly #ends: Float64Array;

  constructor(depth: Float64Array, temperature: number, isSurfaceFixed: boolean) {
    const cells = (depth.length - 1) / 2;
    this.step = new Float64Array(depth.length);
    this.#depth = depth;
    this.#flux = (PERMITTIVITY * thermalVoltage(temperature)) / ELEMENTARY_CHARGE;
    this.#isFixed = isSurfaceFixed;
    this.#diagonal = new Float64Array(cells + 1);
    this.#coupling = new Float64Array(cells + 1);
    this.#ends = new Float64Array(cells + 1);
  }

  /** Fills `step` with what is lacking at every node, cm^-2: field into it and the charge `density` around it. */
  residual(u: Float64Array, density: Float64Array): void {
    const depth = this.#depth;
    const { step } = this;
    step.fill(0);
    for (let i = 0; i + 2 < depth.length; i += 2) {
      const width = depth[i + 2] - depth[i];
      const a = this.#flux / (3 * width);
      const before = u[i + 1] - u[i];
      const after = u[i + 2] - u[i + 1];
      step[i] += a * (7 * before - after) + (width / 6) * density[i];
      step[i + 1] = 8 * a * (after - before) + (4 * width * density[i + 1]) / 6;
      step[i + 2] = a * (before - 7 * after) + (width / 6) * density[i + 2];
    }
  }

  /** Replaces the right-hand side in `step` by the change of potential; `response` is -d charge/du, cm^-3. */
  solve(response: Float64Array): void {
    const depth = this.#depth;
    const { step } = this;
    const [diagonal, coupling, ends] = [this.#diagonal, this.#coupling, this.#ends];
    diagonal.fill(0);
    for (let cell = 0; cell + 1 < ends.length; cell++) ends[cell] = step[2 * cell];
    ends[ends.length - 1] = step[step.length - 1];
    for (let cell = 0; cell + 1 < ends.length; cell++) {
      const i = 2 * cell;
      const width = depth[i + 2] - depth[i];
      const a = this.#flux / (3 * width);
      const middle = 16 * a + (4 * width * response[i + 1]) / 6;
      const condensed = (64 * a * a) / middle;
      diagonal[cell] += 7 * a - condensed + (width / 6) * response[i];
      diagonal[cell + 1] += 7 * a - condensed + (width / 6) * response[i + 2];
      coupling[cell] = condensed - a;
      const share = (8 * a * step[i + 1]) / middle;
      ends[cell] += share;
      ends[cell + 1] += share;
    }
    if (this.#isFixed) {
      ends[0] = 0;
      diagonal[0] = 1;
      coupling[0] = 0;
    }
    solveTridiagonal(diagonal, coupling, ends, ends.length);
    for (let cell = 0; cell + 1 < ends.length; cell++) {
      const i = 2 * cell;
      const width = depth[i + 2] - depth[i];
      const a = this.#flux / (3 * width);
      const middle = 16 * a + (4 * width * response[i + 1]) / 6;
      step[i] = ends[cell];
      step[i + 1] = (step[i + 1] + 8 * a * (ends[cell] + ends[cell + 1])) / middle;
    }
    step[step.length - 1] = ends[ends.length - 1];
  }
}

/**
 * Solves for the potential `u` (kT/q), which holds the start and is overwritten; `charge` holds the carriers afterwards. The last
 * node has zero field: neutral silicon, or an insulator without charge.
 * @param shortest a step that is nowhere longer, kT/q, ends the iteration; what is left is about its square.
 * @throws Error when the iteration does not end, which would be a defect.
 */
export function solvePoisson(
  system: PoissonSystem,
  charge: ChargeModel,
  surface: SurfaceCondition,
  u: Float64Array,
  shortest: number,
): void {
  const isFixed = 'potential' in surface;
  if (isFixed) u[0] = surface.potential;
  const { step } = system;
  for (let round = 0; round < MOST_STEPS; round++) {
    charge.evaluate(u);
    system.residual(u, charge.charge);
    if (!isFixed) step[0] += surface.charge;
    charge.steady();
    system.solve(charge.response);
    let largest = 0;
    for (let i = 0; i < u.length; i++) {
      const length = Math.abs(step[i]);
      if (length > largest) largest = length;
      u[i] += charge.heldBack(step[i], u[i], i);
    }
    if (largest < shortest) {
      charge.evaluate(u);
      return;
    }
  }
  throw new Error('the equilibrium potential did not converge');
}
