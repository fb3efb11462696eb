/** Klaassen's unified mobility model: lattice, ionised impurities of both signs with screening, temperature. */

import { brent } from '../numeric/brent';
import { arsenicShareAt, mixed, uniformArsenicShare } from './donorShare';
import type { MobilityInput, MobilityModel, MobilityOutput } from './model';

/** Fit of the majority mobility at 300 K (muMax, muMin in cm^2/Vs; nRef in cm^-3) and of its lattice part, t^-theta. */
interface MajoritySet {
  readonly muMax: number;
  readonly muMin: number;
  readonly nRef: number;
  readonly alpha: number;
  readonly theta: number;
}
const PHOSPHORUS: MajoritySet = { muMax: 1414, muMin: 68.5, nRef: 9.2e16, alpha: 0.711, theta: 2.285 };
/** From memory, except the first four, which a page quoting the textbook table confirms. */
const ARSENIC: MajoritySet = { muMax: 1417, muMin: 52.2, nRef: 9.68e16, alpha: 0.68, theta: 2.285 };
const BORON: MajoritySet = { muMax: 470.5, muMin: 44.9, nRef: 2.23e17, alpha: 0.719, theta: 2.247 };

/** Clustering of impurities at high concentration: Z = 1 + 1/[c + (nRef/N)^2]. */
const DONOR_CLUSTERS = { c: 0.21, nRef: 4e20 };
const ACCEPTOR_CLUSTERS = { c: 0.5, nRef: 7.2e20 };

/** Effective masses in units of the free electron's. */
const ELECTRON_MASS = 1;
const HOLE_MASS = 1.258;

const F_CONWELL_WEISSKOPF = 2.459;
const F_BROOKS_HERRING = 3.828;
const [S1, S2, S3, S4, S5, S6, S7] = [0.89233, 0.41372, 0.19778, 0.28227, 0.005978, 1.80618, 0.72169];
/**
 * r5 = -0.8552 (from memory) and -0.01552 (read in a public library) both circulate. It enters only through minority
 * carriers as scatterers, and changes no majority mobility of a layer in equilibrium.
 */
const [R1, R2, R3, R4, R5, R6] = [0.7643, 2.2999, 6.5502, 2.367, -0.8552, 0.6478];

/** Scatterers rarer than this against the others are below rounding, and their screening need not be computed. */
const NEGLIGIBLE = 1e-14;

/** Mobility limits of a majority set at a temperature; `logRef` = ln nRef. Mutable so that a mixture reuses it. */
interface Limits {
  lattice: number;
  impurity: number;
  carriers: number;
  alpha: number;
  logRef: number;
}

/** What screening needs of one carrier at a temperature. */
interface Screening {
  /** P = 1/(conwellWeisskopf N_sc^(2/3) + brooksHerring c) */
  readonly conwellWeisskopf: number;
  readonly brooksHerring: number;
  /** (m0/m t)^s4, and s5 (m/m0 /t)^(-s6 s7) */
  readonly attraction: number;
  readonly repulsion: number;
  /** G below its minimum keeps the minimum's value. */
  readonly minimumP: number;
  readonly minimumG: number;
  readonly massRatio: number;
}

/**
 * Klaassen's unified model for both carriers, as majority or minority, at every depth.
 *
 * With t = T/300, i the carrier and j the other one (for electrons own impurities are donors; for holes acceptors):
 *   N <- Z N, Z = 1 + 1/[c + (nRef/N)^2] for donors and acceptors (clusters)
 *   N_sc = N_own + N_opposite + (carriers j),   c = n + p
 *   mu_L = mu_max t^-theta,  mu_N = mu_max^2/(mu_max - mu_min) t^(3 alpha - 1.5),  mu_c = mu_max mu_min/(mu_max - mu_min) t^-0.5
 *   P = t^2/(f_CW/P_CW + f_BH/P_BH),  P_CW = 3.97e13 N_sc^(-2/3),  P_BH = 1.36e20/c (m_i/m0)
 *   G(P) = 1 - s1/[s2 + P (m0/m_i t)^s4]^s3 + s5/[P (m_i/m0 /t)^s7]^s6, not below its minimum
 *   F(P) = (r1 P^r6 + r2 + r3 m_i/m_j)/(P^r6 + r4 + r5 m_i/m_j)
 *   N_eff = N_own + G N_opposite + (carriers j)/F
 *   mu_imp = mu_N (N_sc/N_eff) (nRef/N_sc)^alpha + mu_c c/N_eff,   1/mu = 1/mu_L + 1/mu_imp
 *
 * Source: D. B. M. Klaassen, Solid-State Electronics 35, 953 and 961 (1992): coefficients of P and B read in a public library,
 * those of As and the form of the equations from memory. Made for 77 to 500 K (from memory); the
 * concentrations are those over which it follows Masetti 1983. Scattering between the
 * carriers themselves is not validated: do not use it under high injection.
 */
export const klaassen: MobilityModel = {
  name: 'klaassen',
  title: 'Klaassen 1992 (unified)',
  source: 'D. B. M. Klaassen, Solid-State Electronics 35, 953 and 961 (1992)',
  argument: 'carriers',
  range: { concentration: [1e13, 1e21], temperature: [77, 500] },
  dependsOnTemperature: true,
  hasParts: true,
  ownDopants: ['phosphorus', 'arsenic', 'boron'],
  evaluate,
};

function evaluate(input: MobilityInput, output: MobilityOutput): void {
  const { donors, acceptors, electrons, holes, donorParts } = input;
  const { electronParts, holeParts } = output;
  const logT = Math.log(input.temperature / 300);
  const forElectrons = screeningOf(ELECTRON_MASS, HOLE_MASS, logT);
  const forHoles = screeningOf(HOLE_MASS, ELECTRON_MASS, logT);
  const uniformShare = uniformArsenicShare(donorParts);
  const varies = Number.isNaN(uniformShare);
  const electronLimits: Limits = { lattice: 0, impurity: 0, carriers: 0, alpha: 0, logRef: 0 };
  const holeLimits: Limits = { lattice: 0, impurity: 0, carriers: 0, alpha: 0, logRef: 0 };
  setLimits(electronLimits, PHOSPHORUS, ARSENIC, varies ? 0 : uniformShare, logT);
  setLimits(holeLimits, BORON, BORON, 0, logT);
  for (let i = 0; i < donors.length; i++) {
    if (varies) setLimits(electronLimits, PHOSPHORUS, ARSENIC, arsenicShareAt(donorParts, i), logT);
    const donor = clustered(donors[i], DONOR_CLUSTERS.c, DONOR_CLUSTERS.nRef);
    const acceptor = clustered(acceptors[i], ACCEPTOR_CLUSTERS.c, ACCEPTOR_CLUSTERS.nRef);
    const n = electrons[i];
    const p = holes[i];
    const electronImpurity = impurityMobility(electronLimits, forElectrons, donor, acceptor, p, n + p);
    const holeImpurity = impurityMobility(holeLimits, forHoles, acceptor, donor, n, n + p);
    output.electrons[i] = 1 / (1 / electronLimits.lattice + 1 / electronImpurity);
    output.holes[i] = 1 / (1 / holeLimits.lattice + 1 / holeImpurity);
    if (electronParts) {
      electronParts.lattice[i] = electronLimits.lattice;
      electronParts.impurity[i] = electronImpurity;
    }
    if (holeParts) {
      holeParts.lattice[i] = holeLimits.lattice;
      holeParts.impurity[i] = holeImpurity;
    }
  }
}

function clustered(concentration: number, c: number, nRef: number): number {
  const ratio = nRef / concentration;
  return concentration + concentration / (c + ratio * ratio);
}

/** Sets `limits` for a mixture of two sets, `share` of the second one, at ln(T/300). */
function setLimits(
  limits: Limits,
  first: MajoritySet,
  second: MajoritySet,
  share: number,
  logT: number,
): void {
  const muMax = mixed(first.muMax, second.muMax, share);
  const muMin = mixed(first.muMin, second.muMin, share);
  const alpha = mixed(first.alpha, second.alpha, share);
  const scale = muMax / (muMax - muMin);
  limits.lattice = muMax * Math.exp(-mixed(first.theta, second.theta, share) * logT);
  limits.impurity = scale * muMax * Math.exp((3 * alpha - 1.5) * logT);
  limits.carriers = scale * muMin * Math.exp(-0.5 * logT);
  limits.alpha = alpha;
  limits.logRef = Math.log(mixed(first.nRef, second.nRef, share));
}

function screeningOf(mass: number, otherMass: number, logT: number): Screening {
  const perSquare = Math.exp(-2 * logT);
  const attraction = Math.exp(S4 * (logT - Math.log(mass)));
  const repulsion = S5 * Math.exp(S6 * S7 * (logT - Math.log(mass)));
  const logMinimumP = logOfMinimum(attraction, repulsion);
  const minimumP = Math.exp(logMinimumP);
  return {
    conwellWeisskopf: (perSquare * F_CONWELL_WEISSKOPF) / 3.97e13,
    brooksHerring: (perSquare * F_BROOKS_HERRING) / (1.36e20 * mass),
    attraction,
    repulsion,
    minimumP,
    minimumG: weightOfOpposite(minimumP, logMinimumP, attraction, repulsion),
    massRatio: mass / otherMass,
  };
}

/**
 * ln P at which G is smallest. There the logarithms of the two terms of dG/d(ln P) are equal; their difference rises
 * with P because s6 > s3, so that there is one minimum only.
 */
function logOfMinimum(attraction: number, repulsion: number): number {
  const balance = (logP: number) =>
    Math.log((S1 * S3 * attraction) / (S6 * repulsion)) +
    (1 + S6) * logP -
    (1 + S3) * Math.log(S2 + attraction * Math.exp(logP));
  return brent(balance, -30, 30, 1e-13);
}

/** G: an impurity of the opposite sign scatters with this weight, against 1 for one of the own sign. */
function weightOfOpposite(P: number, logP: number, attraction: number, repulsion: number): number {
  return 1 - S1 * Math.exp(-S3 * Math.log(S2 + attraction * P)) + repulsion * Math.exp(-S6 * logP);
}

/** Mobility by scattering at impurities and at the other carriers; `own` and `opposite` with clusters, all cm^-3. */
function impurityMobility(
  limits: Limits,
  screening: Screening,
  own: number,
  opposite: number,
  otherCarriers: number,
  allCarriers: number,
): number {
  const scatterers = own + opposite + otherCarriers;
  const logScatterers = Math.log(scatterers);
  let effective = own;
  const needsG = opposite > NEGLIGIBLE * own;
  const needsF = otherCarriers > NEGLIGIBLE * own;
  if (needsG || needsF) {
    const P =
      1 /
      (screening.conwellWeisskopf * Math.exp((2 / 3) * logScatterers) +
        screening.brooksHerring * allCarriers);
    const logP = Math.log(P);
    if (needsG) {
      const { minimumP, minimumG, attraction, repulsion } = screening;
      effective += opposite * (P > minimumP ? weightOfOpposite(P, logP, attraction, repulsion) : minimumG);
    }
    if (needsF) {
      const power = Math.exp(R6 * logP);
      effective +=
        (otherCarriers * (power + R4 + R5 * screening.massRatio)) /
        (R1 * power + R2 + R3 * screening.massRatio);
    }
  }
  return (
    (limits.impurity * scatterers * Math.exp(limits.alpha * (limits.logRef - logScatterers)) +
      limits.carriers * allCarriers) /
    effective
  );
}
