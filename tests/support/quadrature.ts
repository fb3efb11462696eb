/** The tests' own quadrature: adaptive Gauss-Kronrod, independent of the rules in src/core/numeric. */

/** Nodes and weights of the 15-point Kronrod rule and its 7-point Gauss rule (QUADPACK, Piessens et al. 1983, from memory). */
const NODES = [
  0.9914553711208126, 0.9491079123427585, 0.8648644233597691, 0.7415311855993945, 0.5860872354676911,
  0.4058451513773972, 0.20778495500789848, 0,
];
const KRONROD = [
  0.022935322010529224, 0.06309209262997856, 0.10479001032225019, 0.14065325971552592, 0.1690047266392679,
  0.19035057806478542, 0.20443294007529889, 0.20948214108472782,
];
const GAUSS = [0.1294849661688697, 0.27970539148927664, 0.3818300505051189, 0.4179591836734694];

function once(f: (x: number) => number, a: number, b: number): { value: number; error: number } {
  const [half, centre] = [(b - a) / 2, (a + b) / 2];
  let kronrod = KRONROD[7] * f(centre);
  let gauss = GAUSS[3] * f(centre);
  for (let i = 0; i < 7; i++) {
    const pair = f(centre - half * NODES[i]) + f(centre + half * NODES[i]);
    kronrod += KRONROD[i] * pair;
    if (i % 2 === 1) gauss += GAUSS[(i - 1) / 2] * pair;
  }
  return { value: kronrod * half, error: Math.abs((kronrod - gauss) * half) };
}

/** Integral of f over [a, b] to `relative` of itself, by bisecting where Kronrod and Gauss differ most. */
export function integrate(f: (x: number) => number, a: number, b: number, relative = 1e-10): number {
  const parts = Array.from({ length: 16 }, (_, i) => {
    const [low, high] = [a + ((b - a) * i) / 16, a + ((b - a) * (i + 1)) / 16];
    return { low, high, ...once(f, low, high) };
  });
  for (let pass = 0; pass < 4000; pass++) {
    let [total, error, worst] = [0, 0, 0];
    parts.forEach((part, i) => {
      total += part.value;
      error += part.error;
      if (part.error > parts[worst].error) worst = i;
    });
    if (error <= relative * Math.abs(total)) return total;
    const { low, high } = parts[worst];
    const middle = (low + high) / 2;
    parts.splice(
      worst,
      1,
      { low, high: middle, ...once(f, low, middle) },
      { low: middle, high, ...once(f, middle, high) },
    );
  }
  throw new Error(`no convergence on [${a}, ${b}]`);
}
