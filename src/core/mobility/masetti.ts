/** Majority mobility against carrier concentration at 300 K, to the highest doping: Masetti, Severi and Solmi 1983. */

import { arsenicShareAt, mixed, uniformArsenicShare } from './donorShare';
import { setImpliedParts } from './impliedParts';
import type { MobilityInput, MobilityModel, MobilityOutput } from './model';
import { ROOM_300_K } from './roomTemperature';

interface DonorSet {
  mu0: number;
  muMax: number;
  mu1: number;
  cr: number;
  cs: number;
  alpha: number;
  beta: number;
}
const PHOSPHORUS: Readonly<DonorSet> = {
  mu0: 68.5,
  muMax: 1414,
  mu1: 56.1,
  cr: 9.2e16,
  cs: 3.41e20,
  alpha: 0.711,
  beta: 1.98,
};
/** mu1, cs and beta from memory. */
const ARSENIC: Readonly<DonorSet> = {
  mu0: 52.2,
  muMax: 1417,
  mu1: 43.4,
  cr: 9.68e16,
  cs: 3.43e20,
  alpha: 0.68,
  beta: 2,
};
/** mu1, cs, beta and pc from memory. */
const BORON = {
  mu0: 44.9,
  muMax: 470.5,
  mu1: 29,
  cr: 2.23e17,
  cs: 6.1e20,
  alpha: 0.719,
  beta: 2,
  pc: 9.23e16,
};
const LOG_BORON_CR = Math.log(BORON.cr);
const LOG_BORON_CS = Math.log(BORON.cs);

/**
 * Mobility at 300 K, N the total of ionised impurities (the published argument is the carrier density, equal to it in
 * silicon with one kind of dopant):
 *   P, As:  mu = mu_0 + (mu_max - mu_0)/[1 + (N/C_r)^alpha] - mu_1/[1 + (C_s/N)^beta]
 *   B:      mu = mu_0 exp(-p_c/N) + mu_max/[1 + (N/C_r)^alpha] - mu_1/[1 + (C_s/N)^beta]
 *
 * Source: G. Masetti, M. Severi and S. Solmi, IEEE Trans. Electron Devices ED-30, 764 (1983): the phosphorus row and the first four
 * numbers of the others read in secondary sources, the rest from memory. Measured over about eight decades, to 5e21 cm^-3 (from memory).
 * Scaling mu_max alone with temperature holds only below 1e16 cm^-3, so no temperature dependence is given.
 */
export const masetti: MobilityModel = {
  name: 'masetti',
  title: 'Masetti 1983',
  source: 'G. Masetti, M. Severi, S. Solmi, IEEE Trans. Electron Devices ED-30, 764 (1983)',
  /** Taken at the total of ionised impurities. */
  argument: 'carriers',
  range: { concentration: [1e13, 5e21], temperature: ROOM_300_K },
  dependsOnTemperature: false,
  hasParts: true,
  ownDopants: ['phosphorus', 'arsenic', 'boron'],
  evaluate,
};

function evaluate(input: MobilityInput, output: MobilityOutput): void {
  const { donors, acceptors, donorParts } = input;
  const uniformShare = uniformArsenicShare(donorParts);
  const varies = Number.isNaN(uniformShare);
  const set: DonorSet = { ...PHOSPHORUS };
  mix(set, varies ? 0 : uniformShare);
  let logCr = Math.log(set.cr);
  let logCs = Math.log(set.cs);
  for (let i = 0; i < donors.length; i++) {
    if (varies) {
      mix(set, arsenicShareAt(donorParts, i));
      logCr = Math.log(set.cr);
      logCs = Math.log(set.cs);
    }
    const total = donors[i] + acceptors[i];
    const logN = Math.log(total);
    const electron =
      set.mu0 +
      (set.muMax - set.mu0) / (1 + Math.exp(set.alpha * (logN - logCr))) -
      set.mu1 / (1 + Math.exp(set.beta * (logCs - logN)));
    const hole =
      BORON.mu0 * Math.exp(-BORON.pc / total) +
      BORON.muMax / (1 + Math.exp(BORON.alpha * (logN - LOG_BORON_CR))) -
      BORON.mu1 / (1 + Math.exp(BORON.beta * (LOG_BORON_CS - logN)));
    output.electrons[i] = electron;
    output.holes[i] = hole;
    setImpliedParts(output.electronParts, i, electron, set.muMax);
    setImpliedParts(output.holeParts, i, hole, BORON.muMax);
  }
}

function mix(set: DonorSet, share: number): void {
  set.mu0 = mixed(PHOSPHORUS.mu0, ARSENIC.mu0, share);
  set.muMax = mixed(PHOSPHORUS.muMax, ARSENIC.muMax, share);
  set.mu1 = mixed(PHOSPHORUS.mu1, ARSENIC.mu1, share);
  set.cr = mixed(PHOSPHORUS.cr, ARSENIC.cr, share);
  set.cs = mixed(PHOSPHORUS.cs, ARSENIC.cs, share);
  set.alpha = mixed(PHOSPHORUS.alpha, ARSENIC.alpha, share);
  set.beta = mixed(PHOSPHORUS.beta, ARSENIC.beta, share);
}
