import { describe, expect, test } from 'vitest';
import { runRecipe } from '../../src/core/process/runRecipe';
import { doseOf, evaluator } from '../../src/core/profile/shape';
import { toRecipe } from '../../src/core/study/toRecipe';
import { study } from '../support/studies';

const ALL = Number.POSITIVE_INFINITY;
type Steps = NonNullable<Parameters<typeof study>[0]>['steps'];
const run = (steps: Steps, models = {}) => runRecipe(toRecipe(study({ steps, models })));

const implant = { step: 'implant', dopant: 'boron', dose_cm2: 1e14, energy_keV: 60 } as const;
const anneal = { step: 'anneal', temperature_C: 1000, time_min: 30 } as const;

describe('a recipe', () => {
  test('without steps is the wafer', () => {
    const { contributions, reports } = run([]);
    expect(contributions).toHaveLength(1);
    expect(contributions[0]).toMatchObject({ dopant: 'phosphorus', stepIndex: 0 });
    expect(evaluator(contributions[0].shape)(0.01)).toBe(1.3e15);
    expect(reports).toEqual([]);
  });

  test('runs its steps in order: an anneal moves what is there before it, not what comes after', () => {
    const surface = (steps: Steps) => evaluator(run(steps).contributions[1].shape)(0);
    expect(surface([implant, anneal])).toBeGreaterThan(2 * surface([anneal, implant]));
  });

  test('leaves out what is disabled and keeps the numbers of the document', () => {
    const { reports, contributions } = run([{ ...implant, disabled: true }, implant, anneal]);
    expect(reports.map(({ index, kind }) => [index, kind])).toEqual([
      [2, 'implant'],
      [3, 'anneal'],
    ]);
    expect(contributions.map(({ stepIndex }) => stepIndex)).toEqual([0, 2]);
  });

  test('reports what each step did, with units in the names', () => {
    const { reports } = run([
      implant,
      anneal,
      { step: 'predeposition', dopant: 'phosphorus', temperature_C: 900, time_min: 10 },
      { step: 'epitaxy', thickness_um: 1 },
      { step: 'etch', thickness_um: 0.5 },
      { step: 'gaussian', dopant: 'arsenic', peak_cm3: 1e18, depth_um: 0.5, sigma_um: 0.1 },
    ]);
    expect(reports.map(({ title }) => title)).toEqual([
      'boron implant, 1e14 cm^-2 at 60 keV',
      'anneal, 30 min at 1000 °C',
      'phosphorus predeposition, 10 min at 900 °C',
      'epitaxy of 1 um',
      'etch of 0.5 um',
      'arsenic, Gaussian profile',
    ]);
    expect(Object.keys(reports[0].figures)).toContain('projectedRange_um');
    expect(Object.keys(reports[1].figures)).toEqual(['Dt_P_cm2', 'Dt_B_cm2']);
    // Half a micrometre of the undoped epitaxy went.
    expect(reports[4].figures.removedDose_cm2).toBe(0);
    // sqrt(2 pi) sigma N, a few millionths of it beyond the surface.
    expect((reports[5].figures.dose_cm2 as number) / (Math.sqrt(2 * Math.PI) * 1e13)).toBeCloseTo(1, 5);
  });

  test('tells how much silicon came and went', () => {
    const { addedSilicon } = run([
      { step: 'epitaxy', thickness_um: 2 },
      { step: 'etch', thickness_um: 0.5 },
    ]);
    expect(addedSilicon * 1e4).toBeCloseTo(1.5, 12);
  });

  test('activates by the last heat treatment, not the hottest of all', () => {
    const hot = run([implant, { ...anneal, temperature_C: 1100 }, anneal], { activation: 'solubility' });
    const cool = run([implant, anneal], { activation: 'solubility' });
    expect(hot.activeLimits).toEqual(cool.activeLimits);
  });

  test('keeps the dose of what was implanted through anneals and epitaxy', () => {
    const { contributions, reports } = run([implant, anneal, { step: 'epitaxy', thickness_um: 3 }, anneal]);
    const dose = reports[0].figures.retainedDose_cm2 as number;
    expect(Math.abs(doseOf(contributions[1].shape, ALL) / dose - 1)).toBeLessThan(1e-6);
  });
});
