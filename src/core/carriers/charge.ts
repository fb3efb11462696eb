/**
 * The charge with which silicon answers a potential, node by node: carriers by Boltzmann or Fermi-Dirac statistics and ionised
 * dopants. Potentials are in units of kT/q, measured from where n = p in undoped silicon without bias.
 *
 *   Boltzmann: n = ni exp(u - fn), p = ni exp(fp - u), fn and fp the quasi-Fermi potentials of electrons and holes
 *   Fermi-Dirac: n = Nc F_1/2(u - fn - ln(Nc/ni)), p = Nv F_1/2(fp - u - ln(Nv/ni))
 */

import { DOPANT_FACTS, type Dopant } from '../material/dopants';
import { intrinsicDensity } from '../material/intrinsic';
import { densitiesOfStates } from '../material/silicon';
import { type FermiValue, fermiHalf } from '../numeric/fermiDirac';
import type { NarrowingName } from '../study/names';
import { boundColumns } from './ionisation';
import { narrowingFactor } from './narrowing';

export interface Statistics {
  /** K */
  readonly temperature: number;
  readonly ionisation: 'complete' | 'levels';
  readonly statistics: 'boltzmann' | 'fermi-dirac';
  readonly narrowing: NarrowingName;
}

/** Active dopants on the nodes, cm^-3. */
export interface ActiveColumns {
  readonly dopants: readonly { readonly dopant: Dopant; readonly active: Float64Array }[];
  readonly donors: Float64Array;
  readonly acceptors: Float64Array;
}

/** Charge below this part of all carriers and dopants may be nothing but rounding. */
const ROUNDING = 4 * Number.EPSILON;
const MOST_ROUNDS = 200;
/** Response to the potential, as a part of the doping, below which Newton's steps are the same whatever it is. */
const LEAST_RESPONSE = 1e-8;
/** How far a step may go, kT/q, beyond where the carriers it raises reach the density of everything charged. */
const MOST_OVER = 4;
/** Carriers below this, cm^-3, are told by their Fermi level: the next floating-point numbers lose digits, then there are none. */
const FEWEST = 1e-250;

interface LevelColumn {
  readonly dopant: Dopant;
  readonly isDonor: boolean;
  readonly bound: Float64Array;
  readonly threshold: Float64Array;
}

export class ChargeModel {
  /** What `evaluate` fills: carriers, charge (p - n + ionised donors - ionised acceptors) and -d charge/du, all cm^-3. */
  readonly electrons: Float64Array;
  readonly holes: Float64Array;
  readonly charge: Float64Array;
  readonly response: Float64Array;
  /** The part of `response` that electrons and the donors they neutralise have; the rest is that of holes and acceptors. */
  readonly electronResponse: Float64Array;
  /** Intrinsic density at each node, narrowing included. */
  readonly intrinsic: Float64Array;
  /** Quasi-Fermi potentials at each node, kT/q; zero in equilibrium. */
  readonly electronLevel: Float64Array;
  readonly holeLevel: Float64Array;
  readonly #doping: ActiveColumns;
  readonly #levels: readonly LevelColumn[];
  readonly #states: { readonly conduction: number; readonly valence: number } | null;
  #hasBias = false;

  constructor(doping: ActiveColumns, { temperature, ionisation, statistics, narrowing }: Statistics) {
    const count = doping.donors.length;
    const column = () => new Float64Array(count);
    this.electrons = column();
    this.holes = column();
    this.charge = column();
    this.response = column();
    this.electronResponse = column();
    this.intrinsic = column().fill(intrinsicDensity(temperature));
    this.electronLevel = column();
    this.holeLevel = column();
    this.#doping = doping;
    if (narrowing !== 'none')
      for (let i = 0; i < count; i++)
        this.intrinsic[i] *= narrowingFactor(narrowing, doping.donors[i] + doping.acceptors[i], temperature);
    this.#states = statistics === 'fermi-dirac' ? densitiesOfStates(temperature) : null;
    this.#levels =
      ionisation === 'complete'
        ? []
        : doping.dopants.flatMap(({ dopant, active }) => {
            const columns = boundColumns(dopant, active, temperature);
            return columns ? [{ dopant, isDonor: DOPANT_FACTS[dopant].role === 'donor', ...columns }] : [];
          });
  }

  /** To be told after the quasi-Fermi potentials were changed. */
  noteBias(): void {
    this.#hasBias =
      this.electronLevel.some((level) => level !== 0) || this.holeLevel.some((level) => level !== 0);
  }

  evaluate(u: Float64Array): void {
    if (this.#states) this.#countDegenerate(u, this.#states.conduction, this.#states.valence);
    else this.#count(u);
    this.#addBound();
  }

  #count(u: Float64Array): void {
    const { electrons, holes, charge, response, electronResponse, intrinsic } = this;
    const { electronLevel, holeLevel } = this;
    const { donors, acceptors } = this.#doping;
    for (let i = 0; i < charge.length; i++) {
      const up = Math.exp(u[i] - electronLevel[i]);
      const n = intrinsic[i] * up;
      const p = this.#hasBias ? intrinsic[i] * Math.exp(holeLevel[i] - u[i]) : intrinsic[i] / up;
      electrons[i] = n;
      holes[i] = p;
      charge[i] = p - n + donors[i] - acceptors[i];
      response[i] = n + p;
      electronResponse[i] = n;
    }
  }

  #countDegenerate(u: Float64Array, conduction: number, valence: number): void {
    const { electrons, holes, charge, response, electronResponse, intrinsic } = this;
    const { electronLevel, holeLevel } = this;
    const { donors, acceptors } = this.#doping;
    const out: FermiValue = { value: 0, slope: 0 };
    for (let i = 0; i < charge.length; i++) {
      fermiHalf(u[i] - electronLevel[i] - Math.log(conduction / intrinsic[i]), out);
      const n = conduction * out.value;
      const slope = conduction * out.slope;
      fermiHalf(holeLevel[i] - u[i] - Math.log(valence / intrinsic[i]), out);
      const p = valence * out.value;
      electrons[i] = n;
      holes[i] = p;
      charge[i] = p - n + donors[i] - acceptors[i];
      response[i] = slope + valence * out.slope;
      electronResponse[i] = slope;
    }
  }

  /** Takes back the charge of those dopants that hold their carrier. */
  #addBound(): void {
    const { charge, response, electronResponse } = this;
    for (const { isDonor, bound, threshold } of this.#levels) {
      const carriers = isDonor ? this.electrons : this.holes;
      const sign = isDonor ? -1 : 1;
      for (let i = 0; i < charge.length; i++) {
        const all = carriers[i] + threshold[i];
        const held = (bound[i] * carriers[i]) / all;
        charge[i] += sign * held;
        const change = (held * threshold[i]) / all;
        response[i] += change;
        if (isDonor) electronResponse[i] += change;
      }
    }
  }

  /**
   * A Newton step of node i from the last evaluated potential u, held back where it would make carriers grow out of all
   * proportion: free until those it raises reach the density of everything charged there, logarithmic beyond. Short steps are left
   * alone to second order, so that convergence stays quadratic.
   */
  heldBack(step: number, u: number, i: number): number {
    const length = Math.abs(step);
    const raised = step > 0 ? this.electrons[i] : this.holes[i];
    const all = this.electrons[i] + this.holes[i] + this.#doping.donors[i] + this.#doping.acceptors[i];
    if (length < Math.LN2 && 2 * raised <= all) return step;
    const free =
      raised > FEWEST
        ? Math.log(all / raised)
        : Math.log(all / this.intrinsic[i]) - (step > 0 ? u - this.electronLevel[i] : this.holeLevel[i] - u);
    return length <= free ? step : Math.sign(step) * (free + Math.min(MOST_OVER, Math.log1p(length - free)));
  }

  /**
   * Raises `response` where there are hardly any carriers, until the next evaluation: with every layer emptied by a bias the linear
   * system would be singular to rounding and not even the sign of its steps be known.
   */
  steady(): void {
    const { response } = this;
    const { donors, acceptors } = this.#doping;
    for (let i = 0; i < response.length; i++)
      response[i] = Math.max(response[i], LEAST_RESPONSE * (donors[i] + acceptors[i]));
  }

  /**
   * Draws a start `u` to where neither carriers exceed the densest doping of the stack tenfold: beyond, Newton's steps would come back
   * by no more than kT/q each.
   */
  bound(u: Float64Array): void {
    const { donors, acceptors } = this.#doping;
    let densest = 0;
    for (let i = 0; i < u.length; i++) densest = Math.max(densest, donors[i] + acceptors[i]);
    for (let i = 0; i < u.length; i++) {
      const reach = Math.log((10 * densest) / this.intrinsic[i] + 10);
      u[i] = Math.max(Math.min(u[i], this.electronLevel[i] + reach), this.holeLevel[i] - reach);
    }
  }

  /** ln(n/p) of node i at the last evaluated potential u; by their Fermi levels where either is too few to be counted. */
  logRatio(u: number, i: number): number {
    const [n, p] = [this.electrons[i], this.holes[i]];
    return n > FEWEST && p > FEWEST ? Math.log(n / p) : 2 * u - this.electronLevel[i] - this.holeLevel[i];
  }

  /** Ionised concentration of every dopant at the last evaluated potential, in the order of the doping. */
  ionised(): Float64Array[] {
    return this.#doping.dopants.map(({ dopant, active }) => {
      const level = this.#levels.find((each) => each.dopant === dopant);
      if (!level) return active;
      const carriers = level.isDonor ? this.electrons : this.holes;
      return active.map(
        (all, i) => all - (level.bound[i] * carriers[i]) / (carriers[i] + level.threshold[i]),
      );
    });
  }

  /**
   * Fills `u` with the potential at which every node is neutral by itself, and evaluates there. Ends when no step is longer than
   * `tolerance` (kT/q); a node is neutral, too, when its charge is lost in the rounding of what it consists of, as where donors
   * and acceptors almost cancel and a bias has taken the carriers away.
   * @throws Error when the iteration does not end, which would be a defect.
   */
  neutralPotential(u: Float64Array, tolerance: number): void {
    const { donors, acceptors } = this.#doping;
    for (let i = 0; i < u.length; i++) {
      const net = donors[i] - acceptors[i];
      u[i] =
        (net >= 0 ? this.electronLevel[i] : this.holeLevel[i]) + Math.asinh(net / (2 * this.intrinsic[i]));
    }
    for (let round = 0; round < MOST_ROUNDS; round++) {
      this.evaluate(u);
      let largest = 0;
      for (let i = 0; i < u.length; i++) {
        const all = this.electrons[i] + this.holes[i] + donors[i] + acceptors[i];
        if (Math.abs(this.charge[i]) <= ROUNDING * all) continue;
        const step = this.heldBack(this.charge[i] / this.response[i], u[i], i);
        u[i] += step;
        largest = Math.max(largest, Math.abs(step));
      }
      if (largest < tolerance) {
        this.evaluate(u);
        return;
      }
    }
    throw new Error('the neutral potential did not converge');
  }
}
