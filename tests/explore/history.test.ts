import { describe, expect, test } from 'vitest';
import { recipeHistory } from '../../src/core/explore/history';
import { diffusivity } from '../../src/core/material/diffusivity';
import { solve } from '../../src/core/solve';
import { study } from '../support/studies';

const recipe = study({
  steps: [
    { step: 'implant', dopant: 'boron', dose_cm2: 2e13, energy_keV: 60 },
    { step: 'anneal', temperature_C: 1000, time_min: 30 },
    { step: 'etch', thickness_um: 0.1, disabled: true },
    { step: 'anneal', temperature_C: 1050, time_min: 10 },
  ],
});
const { entries } = recipeHistory(recipe);

describe('the history of a wafer', () => {
  test('has an entry for the wafer and for every enabled step, by its number in the document', () => {
    expect(entries.map(({ step }) => step)).toEqual([0, 1, 2, 4]);
    expect(entries[0].layers.map(({ type }) => type)).toEqual(['n']);
    expect(entries[1].title).toBe('boron implant, 2e13 cm^-2 at 60 keV');
  });

  test('ends with what the study itself reads', () => {
    const { layers } = solve(recipe).result;
    entries[3].layers.forEach((layer, k) => {
      expect(layer.sheetResistance_ohmSq).toBe(layers[k].sheetResistance_ohmSq);
      expect(layer.bottom_um).toBe(layers[k].bottom_um);
    });
  });

  test('has a junction that every anneal moves deeper', () => {
    const depths = entries.slice(1).map(({ layers }) => layers[0].bottom_um);
    expect(depths[1]).toBeGreaterThan(depths[0]);
    expect(depths[2]).toBeGreaterThan(depths[1]);
  });

  test('adds up the Dt of each dopant', () => {
    const [first, second] = [1000, 1050].map((celsius) => diffusivity('fair1981', 'boron', celsius + 273.15));
    expect(entries[2].diffusionLength_um.B / (Math.sqrt(first * 1800) * 1e4)).toBeCloseTo(1, 9);
    expect(entries[3].diffusionLength_um.B / (Math.sqrt(first * 1800 + second * 600) * 1e4)).toBeCloseTo(
      1,
      9,
    );
    expect(entries[1].diffusionLength_um).toEqual({});
  });
});
