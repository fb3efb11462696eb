import { describe, expect, test } from 'vitest';
import { CONSUMED, oxideThickness } from '../../src/core/material/oxidation';
import { runRecipe } from '../../src/core/process/runRecipe';
import { doseOf, evaluator } from '../../src/core/profile/shape';
import { toRecipe } from '../../src/core/study/toRecipe';
import { studyProblems } from '../../src/core/study/validate';
import { study } from '../support/studies';

const NM = 1e-7;
const kelvin = (celsius: number) => celsius + 273.15;
const grown = (
  ambient: 'dry' | 'wet',
  celsius: number,
  minutes: number,
  initial = 0,
  orientation: '100' | '111' = '100',
) => oxideThickness(ambient, orientation, kelvin(celsius), minutes * 60, initial) / NM;

describe('the growth of oxide', () => {
  test('in two parts is the growth in one', () => {
    for (const ambient of ['dry', 'wet'] as const) {
      const once = grown(ambient, 1000, 90);
      const twice = grown(ambient, 1000, 60, grown(ambient, 1000, 30) * NM);
      expect(twice / once).toBeCloseTo(1, 9);
    }
  });

  test('of no time is none', () => {
    expect(grown('wet', 1000, 0)).toBe(0);
    expect(grown('dry', 1000, 0, 30 * NM)).toBeCloseTo(30, 9);
  });

  test('is parabolic when thick: four times the time, twice the oxide', () => {
    expect(grown('wet', 1200, 4 * 6000) / grown('wet', 1200, 6000)).toBeCloseTo(2, 1);
  });

  test('is linear when thin in steam, and then 1.68 times faster on (111)', () => {
    expect(grown('wet', 750, 8) / grown('wet', 750, 4)).toBeCloseTo(2, 1);
    expect(grown('wet', 750, 4, 0, '111') / grown('wet', 750, 4)).toBeCloseTo(1.68, 1);
  });

  test('solves x^2 + A x = B (t + tau) with the constants of the table', () => {
    // Dry, (100), 1000 C: B = 772 exp(-1.23/kT) = 0.01042 um^2/h, B/A = 3.71e6 exp(-2/kT) = 0.0449 um/h, 25 nm at once.
    const kT = 8.617333e-5 * kelvin(1000);
    const [B, linear] = [772 * Math.exp(-1.23 / kT), 3.71e6 * Math.exp(-2 / kT)];
    const x = grown('dry', 1000, 60) / 1000;
    const A = B / linear;
    expect((x * x + A * x - (0.025 ** 2 + A * 0.025)) / B).toBeCloseTo(1, 5);
  });
});

describe('an oxidation in a recipe', () => {
  const implant = { step: 'implant', dopant: 'boron', dose_cm2: 1e14, energy_keV: 30 } as const;
  const oxidation = { step: 'oxidation', ambient: 'wet', temperature_C: 900, time_min: 20 } as const;
  type Steps = NonNullable<Parameters<typeof study>[0]>['steps'];
  const run = (steps: Steps) => runRecipe(toRecipe(study({ steps })));

  test('consumes silicon, and the dopant in it', () => {
    const { contributions, reports, addedSilicon, warnings } = run([implant, oxidation]);
    const { oxide_nm, consumed_nm, removedDose_cm2 } = reports[1].figures as Record<string, number>;
    expect(oxide_nm).toBeCloseTo(grown('wet', 900, 20), 9);
    expect(consumed_nm / oxide_nm).toBeCloseTo(CONSUMED, 9);
    expect(addedSilicon / NM).toBeCloseTo(-consumed_nm, 9);
    const left = doseOf(contributions[1].shape, Number.POSITIVE_INFINITY);
    const { retainedDose_cm2 } = reports[0].figures as Record<string, number>;
    expect((left + removedDose_cm2) / retainedDose_cm2).toBeCloseTo(1, 5);
    expect(warnings.map(({ code }) => code)).toContain('oxidation-redistribution');
  });

  test('screens what is implanted afterwards, until it is stripped', () => {
    const peakOf = (steps: Steps) => {
      const at = evaluator(run(steps).contributions[1].shape);
      const depths = Array.from({ length: 400 }, (_, i) => i * NM);
      return depths.reduce((best, x) => (at(x) > at(best) ? x : best), 0);
    };
    const bare = peakOf([implant]);
    const screened = peakOf([oxidation, implant]);
    const stated = peakOf([
      { ...implant, screen: { material: 'oxide', thickness_nm: grown('wet', 900, 20) } },
    ]);
    expect(screened).toBeLessThan(bare);
    expect(screened).toBe(stated);
    expect(peakOf([oxidation, { step: 'stripOxide' }, implant])).toBe(bare);
  });

  test('must be stripped before silicon is grown, etched or doped from a source', () => {
    const problemsOf = (steps: object[]) =>
      studyProblems({
        format: 'ohmstrata-study/1',
        wafer: { dopant: 'phosphorus', concentration_cm3: 1e15 },
        steps,
      });
    for (const next of [
      { step: 'epitaxy', thickness_um: 1 },
      { step: 'etch', thickness_um: 0.1 },
      { step: 'predeposition', dopant: 'boron', temperature_C: 950, time_min: 10 },
      { ...implant, screen: { material: 'nitride', thickness_nm: 20 } },
    ]) {
      expect(problemsOf([oxidation, next])[0]).toMatchObject({ key: 'steps[1]' });
      expect(problemsOf([oxidation, next])[0].message).toMatch(/stripOxide/);
      expect(problemsOf([oxidation, { step: 'stripOxide' }, next])).toEqual([]);
      expect(problemsOf([{ ...oxidation, disabled: true }, next])).toEqual([]);
    }
  });
});
