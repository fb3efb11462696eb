import { describe, expect, test } from 'vitest';
import { solve } from '../../src/core/solve';
import { MOBILITY_NAMES } from '../../src/core/study/names';
import { study } from '../support/studies';

const layer = { step: 'gaussian', dopant: 'boron', peak_cm3: 3e17, depth_um: 0.2, sigma_um: 0.15 } as const;

describe('the spread of the mobility models', () => {
  test('has in it what each model reads when it is the study’s own', () => {
    const { layers } = solve(study({ steps: [layer] })).result;
    for (const mobility of MOBILITY_NAMES) {
      const own = solve(study({ steps: [layer], models: { mobility } })).result.layers[0]
        .sheetResistance_ohmSq;
      expect(layers[0].sheetResistanceByMobility_ohmSq[mobility] / own).toBeCloseTo(1, 9);
    }
  });

  test('reaches from the lowest to the highest of those that apply, the study’s own included', () => {
    const { layers, models } = solve(study({ steps: [layer] })).result;
    const [low, high] = layers[0].sheetResistanceSpread_ohmSq;
    const fit = MOBILITY_NAMES.filter((name) => models.unfit[name] === undefined);
    const values = fit.map((name) => layers[0].sheetResistanceByMobility_ohmSq[name]);
    expect(fit).toContain('klaassen');
    expect(low).toBe(Math.min(...values));
    expect(high).toBe(Math.max(...values));
  });

  test('leaves out models of room temperature in the heat, and says why', () => {
    const { models } = solve(study({ steps: [layer], temperature_C: 150 })).result;
    expect(models.unfit.masetti).toBe('temperature outside its range');
    expect(models.unfit.mf723).toBe('temperature outside its range');
    expect(models.unfit.klaassen).toBeUndefined();
  });

  test('gives models made from dopant densities complete ionisation, whatever the study asks for', () => {
    const by = (ionisation: 'complete' | 'levels') =>
      solve(study({ steps: [layer], models: { ionisation } })).result.layers[0]
        .sheetResistanceByMobility_ohmSq;
    expect(by('levels').arora / by('complete').arora).toBeCloseTo(1, 6);
    expect(by('levels').klaassen / by('complete').klaassen).toBeGreaterThan(1.05);
  });
});
