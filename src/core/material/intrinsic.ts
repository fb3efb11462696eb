/** Intrinsic carrier density of silicon. */

export const INTRINSIC_SOURCE = 'Misiakos and Tsamakis, J. Appl. Phys. 74, 3293 (1993)';
/** Temperatures of the measurements, K (from memory). */
export const INTRINSIC_RANGE: readonly [number, number] = [78, 340];

/**
 * Intrinsic carrier density in cm^-3 at `temperature` in K: ni = 5.29e19 (T/300)^2.54 exp(-6726/T).
 *
 * Source: K. Misiakos and D. Tsamakis, J. Appl. Phys. 74, 3293 (1993); coefficients read in a public library, pages from
 * memory. Measured from 78 to 340 K (from memory); up to 400 K other modern formulas agree within 5 %. It decides the last
 * few ni/N of a junction, and becomes comparable with light doping above about 450 K.
 */
export function intrinsicDensity(temperature: number): number {
  return 5.29e19 * (temperature / 300) ** 2.54 * Math.exp(-6726 / temperature);
}
