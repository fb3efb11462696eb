/**
 * Range moments of an ion in an amorphous target by the transport equation, without tables.
 *
 * With <x^n> = sum (2l+1) f_l^n P_l:  n [l f_(l-1)^(n-1) + (l+1) f_(l+1)^(n-1)] = (2l+1) {N Int d sigma [f_l^n(E) - P_l(cos phi) f_l^n(E - T)]
 * + N S_e d f_l^n/dE}, f_0^0 = 1. Each is a triangular system on a grid of ln E. J. Lindhard, M. Scharff, H. E. Schiott 1963;
 * K. B. Winterbon, P. Sigmund, J. B. Sanders 1970 (from memory, rederived). Electronic stopping of Lindhard and Scharff 1961; elements of a
 * compound add (Bragg's rule).
 */

import { ELEMENTS, type Element } from '../../material/elements';
import { atomDensities, type Target } from '../../material/targets';
import { type Collisions, lssCollisions, universalCollisions } from './scattering';

export type Theory = 'universal' | 'lss1975';

export interface RangeMoments {
  /** cm */
  readonly projectedRange: number;
  readonly straggle: number;
  readonly lateralStraggle: number;
  readonly skewness: number;
  /** 3 for a normal distribution. */
  readonly kurtosis: number;
}

/** Bohr radius, Angstrom, and e^2, eV Angstrom. */
const BOHR = 0.529177;
const E_SQUARED = 14.39964;
const [LOWEST_EV, NODES] = [10, 400];
/** Reduced energies at which collisions are worked out, per unit of ln epsilon. */
const ANGLE_GRID = 8;
const CM_PER_ANGSTROM = 1e-8;

/**
 * Lindhard-Scharff times this for boron in silicon: 1.53 brings the LSS theory to the printed tables of 1975, 1.60 suits the universal
 * potential (both deduced for this project, no published single value found; F. H. Eisen 1968 measured 1.5 to 1.7 for channelled ions). In
 * other targets the tables of 1975 use the plain value.
 */
function electronicFactor(ion: Element, atom: Element, theory: Theory): number {
  if (ion.Z !== 5) return 1;
  if (theory === 'universal') return 1.6;
  return atom.symbol === 'Si' ? 1.53 : 1;
}

/**
 * Moments at `energy_keV` (1 to 1000) for an ion of an element in a target of formula and density.
 * @throws RangeError for an element that is not known.
 */
export function rangeMoments(
  ionName: string,
  energy_keV: number,
  target: Target,
  theory: Theory,
): RangeMoments {
  const ion = elementOf(ionName);
  const densities = atomDensities(target, (symbol) => elementOf(symbol).mass);
  const isCompound = densities.size > 1;
  const partners = [...densities].map(([symbol, density]) =>
    partnerOf(ion, elementOf(symbol), density, theory, isCompound),
  );
  const energies = Float64Array.from(
    { length: NODES },
    (_, i) => LOWEST_EV * ((energy_keV * 1e3) / LOWEST_EV) ** (i / (NODES - 1)),
  );
  const solver = new MomentSolver(energies, partners);
  const f11 = solver.solve(1, () => 1 / 3);
  const f02 = solver.solve(0, (i) => 2 * f11[i]);
  const f22 = solver.solve(2, (i) => (4 / 5) * f11[i]);
  const f13 = solver.solve(1, (i) => f02[i] + 2 * f22[i]);
  const f33 = solver.solve(3, (i) => (9 / 7) * f22[i]);
  const f04 = solver.solve(0, (i) => 4 * f13[i]);
  const f24 = solver.solve(2, (i) => (8 * f13[i] + 12 * f33[i]) / 5);
  const f44 = solver.solve(4, (i) => (16 / 9) * f33[i]);
  const at = NODES - 1;
  const mean = 3 * f11[at];
  const [x2, x3, x4] = [
    f02[at] + 5 * f22[at],
    3 * f13[at] + 7 * f33[at],
    f04[at] + 5 * f24[at] + 9 * f44[at],
  ];
  const variance = x2 - mean * mean;
  const third = x3 - 3 * mean * x2 + 2 * mean ** 3;
  const fourth = x4 - 4 * mean * x3 + 6 * mean * mean * x2 - 3 * mean ** 4;
  return {
    projectedRange: mean * CM_PER_ANGSTROM,
    straggle: Math.sqrt(variance) * CM_PER_ANGSTROM,
    lateralStraggle: Math.sqrt(f02[at] - 2.5 * f22[at]) * CM_PER_ANGSTROM,
    skewness: third / variance ** 1.5,
    kurtosis: fourth / (variance * variance),
  };
}

function elementOf(symbol: string): Element {
  const found = ELEMENTS.get(symbol);
  if (!found)
    throw new RangeError(`no element ${symbol} is known; known are ${[...ELEMENTS.keys()].join(', ')}`);
  return found;
}

/** One kind of atom in the target, as the ion sees it; Angstrom and eV. */
interface Partner {
  readonly ion: Element;
  readonly massRatio: number;
  /** T/E of a head-on collision. */
  readonly transfer: number;
  /** epsilon/E, 1/eV. */
  readonly reduction: number;
  /** Atoms per Angstrom^3 times the squared screening length: cross-sections in reduced units to 1/Angstrom. */
  readonly scale: number;
  /** Electronic loss is this times sqrt(E), eV/Angstrom. */
  readonly electronic: number;
  readonly collisions: (epsilon: number) => Collisions;
}

function partnerOf(
  ion: Element,
  atom: Element,
  density: number,
  theory: Theory,
  isCompound: boolean,
): Partner {
  const [M1, M2] = [ion.ionMass, atom.mass];
  const [Z1, Z2] = [ion.Z, atom.Z];
  const length =
    theory === 'universal'
      ? (0.8854 * BOHR) / (Z1 ** 0.23 + Z2 ** 0.23)
      : (0.8853 * BOHR) / Math.sqrt(Z1 ** (2 / 3) + Z2 ** (2 / 3));
  const perCubic = density * 1e-24;
  const lindhard = (1.212 * Z1 ** (7 / 6) * Z2) / ((Z1 ** (2 / 3) + Z2 ** (2 / 3)) ** 1.5 * Math.sqrt(M1));
  const factor = electronicFactor(ion, atom, theory);
  return {
    ion,
    massRatio: M1 / M2,
    transfer: (4 * M1 * M2) / (M1 + M2) ** 2,
    reduction: (length * M2) / ((M1 + M2) * Z1 * Z2 * E_SQUARED),
    scale: perCubic * length * length,
    electronic: perCubic * lindhard * (isCompound && theory === 'lss1975' ? 1 : factor),
    collisions: theory === 'universal' ? tabulated : lssCollisions,
  };
}

/** Collisions on a grid of ln epsilon, worked out once: they are the same for every ion and target. */
const KNOWN = new Map<number, Collisions>();

function universalAt(row: number): Collisions {
  const known = KNOWN.get(row) ?? universalCollisions(Math.exp(row / ANGLE_GRID));
  KNOWN.set(row, known);
  return known;
}

/** Between the rows of the grid ln s runs straight. */
function tabulated(epsilon: number): Collisions {
  const position = Math.log(epsilon) * ANGLE_GRID;
  const row = Math.floor(position);
  const part = position - row;
  const [low, high] = [universalAt(row), universalAt(row + 1)];
  return {
    s: low.s.map((value, k) => value ** (1 - part) * high.s[k] ** part),
    weight: low.weight,
  };
}

/** P_l of the cosine of the laboratory angle for l = 0 to 4. */
function legendre(l: number, c: number): number {
  switch (l) {
    case 0:
      return 1;
    case 1:
      return c;
    case 2:
      return (3 * c * c - 1) / 2;
    case 3:
      return (c * (5 * c * c - 3)) / 2;
    default:
      return ((35 * c * c - 30) * c * c + 3) / 8;
  }
}

/** The triangular systems of one ion and target: only right-hand sides and l differ. */
class MomentSolver {
  readonly #energies: Float64Array;
  readonly #partners: readonly Partner[];
  readonly #collisions: Collisions[][];
  readonly #spacing: number;

  constructor(energies: Float64Array, partners: readonly Partner[]) {
    this.#energies = energies;
    this.#partners = partners;
    this.#spacing = Math.log(energies[1] / energies[0]);
    this.#collisions = partners.map(({ collisions, reduction }) =>
      Array.from(energies, (energy) => collisions(energy * reduction)),
    );
  }

  /** Solves {N Int d sigma [f - P_l f(E - T)] + N S_e df/dE} = right(i); f is zero below the grid. */
  solve(l: number, right: (i: number) => number): Float64Array {
    const energies = this.#energies;
    const f = new Float64Array(energies.length);
    for (let i = 0; i < f.length; i++) {
      let own = 0;
      let known = 0;
      this.#partners.forEach((partner, k) => {
        const { s, weight } = this.#collisions[k][i];
        for (let q = 0; q < s.length; q++) {
          const cosine = labCosine(partner.massRatio, s[q]);
          const share = partner.scale * weight[q];
          const turned = share * legendre(l, cosine);
          const at = i + Math.log1p(-partner.transfer * s[q]) / this.#spacing;
          own += share;
          if (at > i - 1) {
            // Between this node and the last: the parabola through this one and the two before.
            const t = at - i;
            const [w0, w1, w2] = [((1 + t) * (2 + t)) / 2, -t * (2 + t), (t * (1 + t)) / 2];
            if (i === 0) own -= turned * Math.max(0, 1 + t);
            else {
              own -= turned * w0;
              known += turned * (w1 * f[i - 1] + w2 * (i > 1 ? f[i - 2] : 0));
            }
          } else if (at >= 0) known += turned * between(f, at, i);
        }
        const loss = (partner.electronic * Math.sqrt(energies[i])) / (energies[i] * this.#spacing);
        own += 1.5 * loss;
        known += loss * (2 * (i > 0 ? f[i - 1] : 0) - 0.5 * (i > 1 ? f[i - 2] : 0));
      });
      f[i] = (right(i) + known) / own;
    }
    return f;
  }
}

/** cos phi = (cos theta + M1/M2)/sqrt(1 + 2 (M1/M2) cos theta + (M1/M2)^2), cos theta = 1 - 2 s. */
function labCosine(massRatio: number, s: number): number {
  const cosine = 1 - 2 * s;
  return (
    (cosine + massRatio) / Math.sqrt(Math.max(1e-30, 1 + 2 * massRatio * cosine + massRatio * massRatio))
  );
}

/** Quadratic interpolation between the nodes that are known, those before `current`. */
function between(f: Float64Array, at: number, current: number): number {
  if (current < 3) return at >= 0 ? f[Math.min(current - 1, Math.round(at))] : 0;
  const i = Math.max(1, Math.min(current - 2, Math.round(at)));
  const t = at - i;
  return f[i] + (t * (f[i + 1] - f[i - 1])) / 2 + (t * t * (f[i + 1] - 2 * f[i] + f[i - 1])) / 2;
}
