/** The Fermi-Dirac integral of order one half, which counts the carriers of a parabolic band. */

/** The table spans these; below it the first terms of the series hold, above it Sommerfeld's expansion. */
const LOWEST = -12;
const HIGHEST = 60;
const STEP = 0.125;

export interface FermiValue {
  /** F(eta), normalised so that F -> exp(eta) for eta -> -infinity. */
  value: number;
  /** dF/d eta. */
  slope: number;
}

/** ln F and its slope at every step of the table. */
interface Table {
  readonly log: Float64Array;
  readonly logSlope: Float64Array;
}

let table: Table | undefined;

/**
 * F_1/2(eta) = (2/sqrt(pi)) Int_0^inf sqrt(x)/(1 + exp(x - eta)) dx and its slope, written into `out`.
 *
 * From a table of quadratures, cubic Hermite in ln F: within 1e-7 of the integral for -12 <= eta <= 60. Below: exp(eta) (1 -
 * exp(eta)/2^1.5), within 1e-11. Above: (4/(3 sqrt(pi))) eta^1.5 (1 + pi^2/(8 eta^2)) (A. Sommerfeld 1928, from memory), within
 * 1e-6.
 */
export function fermiHalf(eta: number, out: FermiValue): void {
  if (eta < LOWEST) {
    const boltzmann = Math.exp(eta);
    out.value = boltzmann * (1 - boltzmann * Math.SQRT1_2 * 0.5);
    out.slope = boltzmann * (1 - boltzmann * Math.SQRT1_2);
    return;
  }
  if (eta >= HIGHEST) {
    const front = 4 / (3 * Math.sqrt(Math.PI));
    const correction = Math.PI ** 2 / 8;
    out.value = front * (eta ** 1.5 + correction / Math.sqrt(eta));
    out.slope = front * (1.5 * Math.sqrt(eta) - (0.5 * correction) / eta ** 1.5);
    return;
  }
  table ??= buildTable();
  const { log, logSlope } = table;
  const position = (eta - LOWEST) / STEP;
  const i = Math.floor(position);
  const t = position - i;
  const rise = log[i + 1] - log[i];
  const [from, to] = [logSlope[i] * STEP, logSlope[i + 1] * STEP];
  const square = 3 * rise - 2 * from - to;
  const cube = from + to - 2 * rise;
  const value = Math.exp(log[i] + t * (from + t * (square + t * cube)));
  out.value = value;
  out.slope = (value * (from + t * (2 * square + 3 * t * cube))) / STEP;
}

function buildTable(): Table {
  const count = Math.round((HIGHEST - LOWEST) / STEP) + 2;
  const log = new Float64Array(count);
  const logSlope = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    const { value, slope } = quadrature(LOWEST + i * STEP);
    log[i] = Math.log(value);
    logSlope[i] = slope / value;
  }
  return { log, logSlope };
}

/** With x = t^2 the integrand is even and smooth, so that the trapezoid rule converges faster than any power of its step. */
function quadrature(eta: number): FermiValue {
  const step = 0.05;
  const end = Math.sqrt(Math.max(0, eta) + 45);
  let value = 0;
  let slope = 0;
  for (let t = step; t <= end; t += step) {
    const occupied = 1 / (1 + Math.exp(t * t - eta));
    value += t * t * occupied;
    slope += t * t * occupied * (1 - occupied);
  }
  const front = (4 / Math.sqrt(Math.PI)) * step;
  return { value: front * value, slope: front * slope };
}
