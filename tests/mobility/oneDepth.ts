/** One depth of silicon with any dopants and any carriers, for asking a model directly. */

import { DOPANT_FACTS, type Dopant } from '../../src/core/material/dopants';
import type { DopantColumn, MobilityInput, MobilityModel } from '../../src/core/mobility/model';

export interface Depth {
  /** cm^-3 */
  dopants: Partial<Record<Dopant, number>>;
  electrons: number;
  holes: number;
  /** K, 300 unless stated */
  temperature?: number;
}

export interface DepthMobility {
  electrons: number;
  holes: number;
  electronLattice: number;
  electronImpurity: number;
  holeLattice: number;
  holeImpurity: number;
}

export function inputOf({ dopants, electrons, holes, temperature = 300 }: Depth): MobilityInput {
  const parts = Object.entries(dopants).map(
    ([dopant, value]): DopantColumn => ({ dopant: dopant as Dopant, ionised: Float64Array.of(value) }),
  );
  const donorParts = parts.filter(({ dopant }) => DOPANT_FACTS[dopant].role === 'donor');
  const acceptorParts = parts.filter(({ dopant }) => DOPANT_FACTS[dopant].role === 'acceptor');
  const sum = (columns: readonly DopantColumn[]) =>
    Float64Array.of(columns.reduce((total, { ionised }) => total + ionised[0], 0));
  return {
    temperature,
    donors: sum(donorParts),
    acceptors: sum(acceptorParts),
    electrons: Float64Array.of(electrons),
    holes: Float64Array.of(holes),
    donorParts,
    acceptorParts,
  };
}

export function oneDepth(model: MobilityModel, depth: Depth): DepthMobility {
  const column = () => new Float64Array(1);
  const electronParts = { lattice: column(), impurity: column() };
  const holeParts = { lattice: column(), impurity: column() };
  const output = { electrons: column(), holes: column(), electronParts, holeParts };
  model.evaluate(inputOf(depth), output);
  return {
    electrons: output.electrons[0],
    holes: output.holes[0],
    electronLattice: electronParts.lattice[0],
    electronImpurity: electronParts.impurity[0],
    holeLattice: holeParts.lattice[0],
    holeImpurity: holeParts.impurity[0],
  };
}

/** Majority mobility with carriers equal to the dopants and no minority carriers. */
export function majority(
  model: MobilityModel,
  dopant: Dopant,
  concentration: number,
  temperature = 300,
): number {
  const isDonor = DOPANT_FACTS[dopant].role === 'donor';
  const at = oneDepth(model, {
    dopants: { [dopant]: concentration },
    electrons: isDonor ? concentration : 0,
    holes: isDonor ? 0 : concentration,
    temperature,
  });
  return isDonor ? at.electrons : at.holes;
}

/** |a/b - 1| */
export function deviation(a: number, b: number): number {
  return Math.abs(a / b - 1);
}
