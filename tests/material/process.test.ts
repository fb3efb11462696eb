import { describe, expect, test } from 'vitest';
import { DIFFUSIVITIES, diffusivity } from '../../src/core/material/diffusivity';
import { DOPANTS } from '../../src/core/material/dopants';
import { processIntrinsicDensity } from '../../src/core/material/processIntrinsic';
import { debyeLength, densitiesOfStates, thermalVoltage } from '../../src/core/material/silicon';
import { activeLimit, solidSolubility } from '../../src/core/material/solubility';

const kelvin = (celsius: number) => celsius + 273.15;

describe('figures of dopants at process temperatures', () => {
  test('every dopant has a diffusivity in both sets that grows with temperature', () => {
    for (const set of Object.keys(DIFFUSIVITIES) as (keyof typeof DIFFUSIVITIES)[])
      for (const dopant of DOPANTS) {
        const [cool, hot] = [900, 1100].map((celsius) => diffusivity(set, dopant, kelvin(celsius)));
        expect(cool).toBeGreaterThan(1e-18);
        expect(hot).toBeGreaterThan(10 * cool);
        expect(hot).toBeLessThan(1e-11);
      }
  });

  test('diffusivities from a solid source lie above the intrinsic ones for boron and phosphorus', () => {
    for (const dopant of ['boron', 'phosphorus'] as const) {
      const ratio =
        diffusivity('fuller1956', dopant, kelvin(1100)) / diffusivity('fair1981', dopant, kelvin(1100));
      expect(ratio).toBeGreaterThan(1.5);
      expect(ratio).toBeLessThan(2.5);
    }
  });

  test('no more conducts than is dissolved, and never more than the caps of Trumbore 1960', () => {
    for (const dopant of DOPANTS)
      for (const celsius of [800, 950, 1100, 1250]) {
        const [dissolved, active] = [solidSolubility, activeLimit].map((of) => of(dopant, kelvin(celsius)));
        expect(active).toBeLessThanOrEqual(dissolved);
        expect(dissolved).toBeLessThanOrEqual(1.8e21);
      }
  });

  test('the intrinsic density at 1000 C is near 7e18, at 1200 C near 1.9e19', () => {
    expect(processIntrinsicDensity(kelvin(1000)) / 7.1e18).toBeCloseTo(1, 1);
    expect(processIntrinsicDensity(kelvin(1200)) / 1.9e19).toBeCloseTo(1, 0);
  });
});

describe('figures of silicon at reading temperatures', () => {
  test('kT/q is 25.85 mV at 300 K', () => {
    expect(thermalVoltage(300) * 1e3).toBeCloseTo(25.852, 3);
  });

  test('the Debye length is 41 nm at 1e16 and 4.1 nm at 1e18 cm^-3', () => {
    expect(debyeLength(1e16, 300) * 1e7).toBeCloseTo(41, 0);
    expect(debyeLength(1e18, 300) * 1e7).toBeCloseTo(4.1, 1);
  });

  test('densities of states grow with temperature', () => {
    expect(densitiesOfStates(400).conduction).toBeGreaterThan(densitiesOfStates(300).conduction);
    expect(densitiesOfStates(400).valence).toBeGreaterThan(densitiesOfStates(300).valence);
  });
});
