/**
 * Klaassen's model written a second time, plainly: one depth, powers as powers, the minimum of G by cutting an interval in three.
 * Solid-State Electronics 35, 953 and 961 (1992), in the order of evaluation of the papers; phosphorus and boron.
 */

const CARRIER = {
  electrons: {
    muMax: 1414,
    muMin: 68.5,
    nRef: 9.2e16,
    alpha: 0.711,
    theta: 2.285,
    mass: 1,
    otherMass: 1.258,
  },
  holes: { muMax: 470.5, muMin: 44.9, nRef: 2.23e17, alpha: 0.719, theta: 2.247, mass: 1.258, otherMass: 1 },
};

function weight(P: number, mass: number, t: number): number {
  return (
    1 -
    0.89233 / (0.41372 + P * (t / mass) ** 0.28227) ** 0.19778 +
    0.005978 / (P * (mass / t) ** 0.72169) ** 1.80618
  );
}

function smallestWeight(mass: number, t: number): { P: number; G: number } {
  let [low, high] = [-3, 3];
  for (let step = 0; step < 100; step++) {
    const [left, right] = [low + (high - low) / 3, high - (high - low) / 3];
    if (weight(10 ** left, mass, t) < weight(10 ** right, mass, t)) high = right;
    else low = left;
  }
  return { P: 10 ** low, G: weight(10 ** low, mass, t) };
}

export function plainKlaassen(
  carrier: 'electrons' | 'holes',
  phosphorus: number,
  boron: number,
  n: number,
  p: number,
  temperature: number,
): number {
  const { muMax, muMin, nRef, alpha, theta, mass, otherMass } = CARRIER[carrier];
  const t = temperature / 300;
  const donors = phosphorus * (1 + 1 / (0.21 + (4e20 / phosphorus) ** 2));
  const acceptors = boron * (1 + 1 / (0.5 + (7.2e20 / boron) ** 2));
  const [own, opposite, other] = carrier === 'electrons' ? [donors, acceptors, p] : [acceptors, donors, n];
  const c = n + p;
  const scatterers = own + opposite + other;
  const lattice = muMax * t ** -theta;
  const muN = (muMax ** 2 / (muMax - muMin)) * t ** (3 * alpha - 1.5);
  const muC = ((muMax * muMin) / (muMax - muMin)) * t ** -0.5;
  const conwellWeisskopf = 3.97e13 * scatterers ** (-2 / 3);
  const brooksHerring = (1.36e20 / c) * mass;
  const P = t ** 2 / (2.459 / conwellWeisskopf + 3.828 / brooksHerring);
  const minimum = smallestWeight(mass, t);
  const G = P < minimum.P ? minimum.G : weight(P, mass, t);
  const ratio = mass / otherMass;
  const F = (0.7643 * P ** 0.6478 + 2.2999 + 6.5502 * ratio) / (P ** 0.6478 + 2.367 - 0.8552 * ratio);
  const effective = own + G * opposite + other / F;
  const impurity = muN * (scatterers / effective) * (nRef / scatterers) ** alpha + muC * (c / effective);
  return 1 / (1 / lattice + 1 / impurity);
}
