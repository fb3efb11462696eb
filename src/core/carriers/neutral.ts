/** Carriers of locally neutral silicon in equilibrium. */

/**
 * Fills `electrons` and `holes` (cm^-3) so that n - p = net and n p = ni^2 at every depth.
 *
 *   majority = |net|/2 + sqrt((net/2)^2 + ni^2),  minority = ni^2/majority
 *
 * The other root of the quadratic, |net|/2 - sqrt(...), would lose every digit of the minority carriers.
 * @param net active donors - active acceptors, cm^-3, with its sign; all three columns have one length.
 * @param ni intrinsic density, cm^-3, positive.
 */
export function neutralCarriers(
  net: Float64Array,
  ni: number,
  electrons: Float64Array,
  holes: Float64Array,
): void {
  const square = ni * ni;
  for (let i = 0; i < net.length; i++) {
    const half = Math.abs(net[i]) / 2;
    const majority = half + Math.sqrt(half * half + square);
    const minority = square / majority;
    const isN = net[i] >= 0;
    electrons[i] = isN ? majority : minority;
    holes[i] = isN ? minority : majority;
  }
}
