import { describe, expect, test } from 'vitest';
import { recipeHistory } from '../../src/core/explore/history';
import { runRecipe } from '../../src/core/process/runRecipe';
import { damageOf, interstitialTransport, transientDt } from '../../src/core/process/transient';
import { evaluator, gaussian, pearson } from '../../src/core/profile/shape';
import { solve } from '../../src/core/solve';
import { toRecipe } from '../../src/core/study/toRecipe';
import { studyProblems } from '../../src/core/study/validate';
import { study } from '../support/studies';

const UM = 1e-4;
const kelvin = (celsius: number) => celsius + 273.15;
const implanted = { step: 'implant', dopant: 'boron', dose_cm2: 2e13, energy_keV: 60 } as const;
const anneal = { step: 'anneal', temperature_C: 800, time_min: 30 } as const;
const accepted = { ...anneal, transient: 'plusOne' } as const;

type Steps = NonNullable<Parameters<typeof study>[0]>['steps'];
const solved = (steps: Steps, models = {}) => solve(study({ steps, models })).result;
const junction = (steps: Steps, models = {}) => solved(steps, models).layers[0].bottom_um;
const codes = (steps: Steps) => solved(steps).warnings.map(({ code }) => code);

describe('the "+1" estimate', () => {
  test('moves boron by 71 nm at 800 C and 22 nm at 1000 C for 1e14 ions at 0.1 um', () => {
    const length_nm = (celsius: number) =>
      Math.sqrt(transientDt('fair1981', 'boron', 1e14 * 0.1 * UM, kelvin(celsius))) * 1e7;
    expect(length_nm(800)).toBeCloseTo(71, 0);
    expect(length_nm(1000)).toBeCloseTo(22, 0);
  });

  test('rests on an interstitial transport that a second published one meets within 30 %', () => {
    for (const celsius of [700, 800, 900, 1000, 1050]) {
      // H. Bracht et al., Phys. Rev. B 52, 16542 (1995); from memory.
      const bracht = 5e22 * 2980 * Math.exp(-4.95 / (8.617333e-5 * kelvin(celsius)));
      expect(Math.abs(bracht / interstitialTransport(kelvin(celsius)) - 1)).toBeLessThan(0.3);
    }
  });

  test('counts the ions by their depth: dose times mean', () => {
    expect(damageOf(gaussian(1e18, 0.5 * UM, 0.05 * UM))).toBeCloseTo(
      1e18 * Math.sqrt(2 * Math.PI) * 0.05 * UM * 0.5 * UM,
      -3,
    );
    const moments = { mean: 0.4 * UM, straggle: 0.06 * UM, skewness: -0.8, kurtosis: 4 };
    expect(damageOf(pearson(1e14, moments)) / (1e14 * moments.mean)).toBeCloseTo(1, 4);
  });
});

describe('an anneal after an implant', () => {
  test('offers the estimate when it is cool, and moves nothing by it until it is accepted', () => {
    const cool = solved([implanted, anneal]).warnings.find(({ code }) => code === 'transient-diffusion');
    expect(cool).toMatchObject({ step: 2, message: expect.stringMatching(/estimate is √Dt B \d+ nm/) });
    expect(codes([implanted, { ...anneal, temperature_C: 1000 }])).not.toContain('transient-diffusion');
    expect(solved([implanted, anneal]).steps[1].figures).not.toHaveProperty('transientDt_B_cm2');
  });

  test('that accepts it deepens the junction by both models of diffusion, and says that it is an estimate', () => {
    for (const diffusion of ['constant', 'extrinsic']) {
      const [without, within] = [anneal, accepted].map((step) => junction([implanted, step], { diffusion }));
      expect(within).toBeGreaterThan(without + 0.02);
    }
    expect(codes([implanted, accepted])).toContain('transient-estimate');
    expect(codes([implanted, accepted])).not.toContain('transient-diffusion');
  });

  test('widens a deep Gaussian by it as by any Dt: sigma^2 grows by twice their sum', () => {
    const deep = { ...implanted, energy_keV: 300, shape: 'gaussian' as const };
    const { contributions, reports } = runRecipe(toRecipe(study({ steps: [deep, accepted] })));
    const { projectedRange_um, straggle_um } = reports[0].figures;
    const [mean, sigma] = [Number(projectedRange_um) * UM, Number(straggle_um) * UM];
    const { transientDt_B_cm2, Dt_B_cm2 } = reports[1].figures;
    const wide = Math.sqrt(sigma ** 2 + 2 * (Number(transientDt_B_cm2) + Number(Dt_B_cm2)));
    const expected = evaluator(gaussian(2e13 / (Math.sqrt(2 * Math.PI) * wide), mean, wide));
    const found = evaluator(contributions[1].shape);
    for (const from of [-3, -1, 0, 1, 3])
      expect(found(mean + from * wide) / expected(mean + from * wide)).toBeCloseTo(1, 3);
    expect(Number(transientDt_B_cm2)).toBeGreaterThan(10 * Number(Dt_B_cm2));
  });

  test('spends the damage: a second finds none', () => {
    expect(codes([implanted, anneal, accepted])).toContain('transient-nothing');
    expect(junction([implanted, accepted, accepted])).toBeCloseTo(junction([implanted, accepted, anneal]), 9);
  });

  test('leaves arsenic and antimony where they are, and moves boron by their damage', () => {
    const arsenic = { ...implanted, dopant: 'arsenic', dose_cm2: 1e14 } as const;
    expect(codes([arsenic, accepted])).toContain('transient-nothing');
    const base = {
      step: 'gaussian',
      dopant: 'boron',
      peak_cm3: 1e17,
      depth_um: 0.3,
      sigma_um: 0.05,
    } as const;
    expect(solved([base, arsenic, accepted]).steps[2].figures).toHaveProperty('transientDt_B_cm2');
  });

  test('after an etch finds only the damage that is left', () => {
    const figure = (steps: Steps) => solved(steps).steps.at(-1)?.figures.transientDt_B_cm2;
    expect(figure([implanted, { step: 'etch', thickness_um: 0.15 }, accepted])).toBeLessThan(
      figure([implanted, accepted]) as number,
    );
  });

  test('adds it to the heat so far', () => {
    const length = (step: typeof anneal) =>
      recipeHistory(study({ steps: [implanted, step] })).entries[2].diffusionLength_um.B;
    const { figures } = solved([implanted, accepted]).steps[1];
    expect(length(accepted) ** 2 - length(anneal) ** 2).toBeCloseTo(
      (figures.transientDt_B_cm2 as number) * 1e8,
      12,
    );
  });

  test('cannot accept it for a ramp', () => {
    const ramp = study({ steps: [implanted, { ...accepted, endTemperature_C: 1000 }] });
    expect(studyProblems(ramp)).toMatchObject([{ key: 'steps[1].transient' }]);
  });
});
