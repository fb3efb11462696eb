/**
 * The fits of Thurber, Mattis, Liu and Filliben, J. Electrochem. Soc. 127, 1807 (phosphorus) and 2291 (boron), 1980, at 300 K, read in
 * public transcriptions: a second road from dopants to resistivity and mobility, for checks only. Ohm cm, cm^-3, cm^2/Vs.
 */

/** The value of the elementary charge these fits were made with. */
const CHARGE = 1.602e-19;

function rational(x: number, above: readonly number[], below: readonly number[]): number {
  const polynomial = (coefficients: readonly number[]) =>
    coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);
  return polynomial(above) / polynomial([1, ...below]);
}

/** Of phosphorus-doped silicon, by dopant density. */
export function thurberPhosphorusResistivity(concentration: number): number {
  const logarithm = rational(
    Math.log10(concentration / 1e16),
    [-3.0652, 2.1853, -0.6108, 0.056189],
    [-0.67642, 0.19542, -0.0181],
  );
  return 10 ** logarithm / (CHARGE * concentration);
}

/** Electron mobility by electron density, to 1e20. */
export function thurberElectronMobility(electrons: number): number {
  return (
    10 **
    rational(
      Math.log10(electrons / 1e16),
      [3.0629, -2.2522, 0.62327, -0.060415],
      [-0.69851, 0.19716, -0.01995],
    )
  );
}

/** Of boron-doped silicon, by dopant density. */
export function thurberBoronResistivity(concentration: number): number {
  const product = 0.00215 + (0.02053 - 0.00215) / (1 + (concentration / 4.09e18) ** -0.727);
  return product / (CHARGE * concentration);
}

/** Hole mobility by resistivity. */
export function thurberHoleMobility(resistivity: number): number {
  return 51.6 * Math.exp(-resistivity / 0.004063) + 467.3 / (1 + (resistivity / 0.0794) ** -0.808);
}
