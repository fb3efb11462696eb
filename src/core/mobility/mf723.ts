/** The mobility that the resistivity standard MF723 implies when every dopant atom gives one carrier. */

import { ELEMENTARY_CHARGE } from '../material/constants';
import { arsenicProduct, boronProduct, MF723_SOURCE, phosphorusProduct } from '../material/mf723';
import { arsenicShareAt, mixed, uniformArsenicShare } from './donorShare';
import type { MobilityInput, MobilityModel, MobilityOutput } from './model';
import { ROOM_23_C } from './roomTemperature';

/**
 * mu = 1/(q rho(N) N) at 23 C with N = N_D + N_A: electrons by the relation of phosphorus (of arsenic, from 1e19 to
 * 6e20 cm^-3), holes by that of boron. The mobilities of mixed donors are weighed by concentration.
 *
 * This is no mobility proper: near 1e18 cm^-3 up to a quarter of the dopant atoms are not ionised, which is in the
 * standard's resistivity and so in this number. With complete ionisation it reproduces the standard's resistivity exactly.
 */
export const mf723: MobilityModel = {
  name: 'mf723',
  title: 'SEMI MF723 (from resistivity)',
  source: MF723_SOURCE,
  argument: 'dopants',
  range: { concentration: [1e14, 1e20], temperature: ROOM_23_C },
  dependsOnTemperature: false,
  hasParts: false,
  ownDopants: ['phosphorus', 'arsenic', 'boron'],
  evaluate,
};

function evaluate(input: MobilityInput, output: MobilityOutput): void {
  const { donors, acceptors, donorParts } = input;
  const uniformShare = uniformArsenicShare(donorParts);
  for (let i = 0; i < donors.length; i++) {
    const total = donors[i] + acceptors[i];
    const share = Number.isNaN(uniformShare) ? arsenicShareAt(donorParts, i) : uniformShare;
    const perPhosphorus = share < 1 ? 1 / phosphorusProduct(total) : 0;
    const perArsenic = share > 0 ? 1 / arsenicProduct(total) : 0;
    output.electrons[i] = mixed(perPhosphorus, perArsenic, share) / ELEMENTARY_CHARGE;
    output.holes[i] = 1 / (ELEMENTARY_CHARGE * boronProduct(total));
  }
  for (const parts of [output.electronParts, output.holeParts]) {
    parts?.lattice.fill(Number.NaN);
    parts?.impurity.fill(Number.NaN);
  }
}
