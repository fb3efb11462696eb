import { describe, expect, test } from 'vitest';
import { heatSolved } from '../../../src/core/process/diffusion/heatSolved';
import { heatUp } from '../../../src/core/process/heat';
import type { Contribution } from '../../../src/core/profile/doping';
import { doseOf, evaluator, gaussian, uniform } from '../../../src/core/profile/shape';
import { solve } from '../../../src/core/solve';
import { study } from '../../support/studies';

const UM = 1e-4;
const heat = (celsius: number, minutes: number, end = celsius) => ({
  temperature: celsius + 273.15,
  endTemperature: end + 273.15,
  time: minutes * 60,
});
const wafer: Contribution = {
  dopant: 'phosphorus',
  shape: uniform(1e15, 0, Number.POSITIVE_INFINITY),
  stepIndex: 0,
};
const boron = (peak: number): Contribution => ({
  dopant: 'boron',
  shape: gaussian(peak, 0.2 * UM, 0.06 * UM),
  stepIndex: 1,
});
const solved = (peak: number, treatment = heat(1000, 30)) =>
  heatSolved([wafer, boron(peak)], 'fair1981', treatment, 525 * UM, null, 1);
const of = (contributions: readonly Contribution[], dopant: string) =>
  contributions.filter((part) => part.dopant === dopant).map(({ shape }) => evaluator(shape));

describe('a solved anneal', () => {
  test('far below the intrinsic density is the closed form', () => {
    const [closed] = of(heatUp([boron(1e16)], 'fair1981', heat(1000, 30)), 'boron');
    const [found] = of(solved(1e16).contributions, 'boron');
    // Fair's charge states of boron sum to 0.797 exp(-3.46/kT), 5 % above the 0.76 of his intrinsic value.
    for (const um of [0.05, 0.2, 0.35])
      expect(Math.abs(found(um * UM) / closed(um * UM) - 1)).toBeLessThan(0.03);
  });

  test('above it goes deeper', () => {
    const depthOf = (at: (x: number) => number, peak: number) => {
      let x = 0.2 * UM;
      while (at(x) > peak * 1e-3) x += 1e-8;
      return x;
    };
    const [light] = of(solved(1e16).contributions, 'boron');
    const [heavy] = of(solved(1e20).contributions, 'boron');
    expect(depthOf(heavy, 1e20)).toBeGreaterThan(1.15 * depthOf(light, 1e16));
  });

  test('keeps the dose, in the solver to 1e-9 and in the profile it leaves to 1e-6', () => {
    const { contributions, doseError } = solved(1e19);
    expect(doseError).toBeLessThan(1e-9);
    const left = contributions.find(({ dopant }) => dopant === 'boron');
    const before = doseOf(boron(1e19).shape, Number.POSITIVE_INFINITY);
    if (!left) throw new Error('the boron is gone');
    // Sampling the Gaussian on the nodes is good to a thousandth.
    expect(doseOf(left.shape, Number.POSITIVE_INFINITY) / before).toBeCloseTo(1, 2);
  });

  test('leaves the wafer below as it was', () => {
    const parts = of(solved(1e18).contributions, 'phosphorus');
    const phosphorus = (x: number) => parts.reduce((sum, at) => sum + at(x), 0);
    for (const um of [5, 50, 500]) expect(phosphorus(um * UM) / 1e15).toBeCloseTo(1, 6);
  });

  test('as a ramp lies between anneals at its ends', () => {
    const at = (treatment: ReturnType<typeof heat>) =>
      of(solved(1e17, treatment).contributions, 'boron')[0](0.2 * UM);
    const [cool, ramp, hot] = [at(heat(900, 30)), at(heat(900, 30, 1050)), at(heat(1050, 30))];
    expect(ramp).toBeLessThan(cool);
    expect(ramp).toBeGreaterThan(hot);
  });

  test('from a held surface fills up to it', () => {
    const { contributions, doseError } = heatSolved(
      [wafer],
      'fair1981',
      heat(1000, 30),
      525 * UM,
      {
        dopant: 'boron',
        surface: 1e19,
        stepIndex: 1,
      },
      1,
    );
    const [found] = of(contributions, 'boron');
    expect(found(0) / 1e19).toBeCloseTo(1, 2);
    expect(doseError).toBeNull();
    expect(contributions.find(({ dopant }) => dopant === 'boron')?.stepIndex).toBe(1);
  });
});

describe('a study with solved diffusion', () => {
  const steps = [
    { step: 'implant', dopant: 'arsenic', dose_cm2: 1e15, energy_keV: 60 },
    { step: 'anneal', temperature_C: 1000, time_min: 20 },
  ] as const;
  const read = (refinement: number) =>
    solve(
      study({
        wafer: { dopant: 'boron', concentration_cm3: 1e16 },
        steps: [...steps],
        models: { diffusion: 'extrinsic' },
      }),
      { refinement },
    ).result;

  test('reads the same to 1 percent and 2 nm with half the cells and a quarter of the time error', () => {
    const [coarse, fine] = [read(1), read(2)];
    expect(
      Math.abs(fine.layers[0].sheetResistance_ohmSq / coarse.layers[0].sheetResistance_ohmSq - 1),
    ).toBeLessThan(0.01);
    expect(
      Math.abs((fine.junctions[0].metallurgical_um ?? 0) - (coarse.junctions[0].metallurgical_um ?? 0)),
    ).toBeLessThan(2e-3);
  }, 30_000);

  test('gets through dense dopants that nearly cancel, as arsenic let in over boron, in ordinary steps', () => {
    const letIn = (dopant: 'boron' | 'arsenic', temperature_C: number, time_min: number) =>
      ({ step: 'predeposition', dopant, temperature_C, time_min }) as const;
    const { steps } = solve(
      study({
        steps: [letIn('boron', 1090, 5), letIn('arsenic', 1120, 11)],
        models: { diffusion: 'extrinsic', diffusivity: 'plummer2000' },
      }),
    ).result;
    expect(steps[1].figures.timeSteps).toBeLessThan(1000);
  });

  test('tells nodes, time steps and how well the dose was kept', () => {
    const { figures } = read(1).steps[1];
    expect(figures.nodes).toBeGreaterThan(100);
    expect(figures.timeSteps).toBeGreaterThan(10);
    expect(Math.abs(figures.doseError_ppm as number)).toBeLessThan(1e-2);
  });
});
