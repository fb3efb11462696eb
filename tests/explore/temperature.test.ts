import { describe, expect, test } from 'vitest';
import { temperatureSweep } from '../../src/core/explore/temperature';
import { uniformSilicon } from '../../src/core/mobility/uniform';
import { solve } from '../../src/core/solve';
import { InputProblem, NoSolution } from '../../src/core/study/problem';
import { study } from '../support/studies';

const film = study({
  wafer: { dopant: 'boron', concentration_cm3: 3e17, thickness_um: 2 },
  temperature_C: 27,
  models: { ionisation: 'levels' },
});
const span = { from_C: -55, to_C: 125, points: 10 };

describe('sheet resistance against temperature', () => {
  test('of a uniform film is resistivity over thickness at every temperature, with what is ionised there', () => {
    const { temperature_C, layers } = temperatureSweep(film, span);
    expect(temperature_C[0]).toBe(-55);
    expect(temperature_C[9]).toBe(125);
    temperature_C.forEach((celsius, i) => {
      const { resistivity } = uniformSilicon('boron', 3e17, celsius + 273.15, 'klaassen', 'levels');
      expect((layers[0].sheetResistance_ohmSq[i] ?? 0) / (resistivity / 2e-4)).toBeCloseTo(1, 8);
    });
  });

  test('has coefficients that give the values back as well as the worst residual says', () => {
    const result = temperatureSweep(film, span);
    const [layer] = result.layers;
    const [tc1, tc2, worst] = [layer.tcr1_ppmK, layer.tcr2_ppmK2, layer.worst_percent].map(
      (v) => v ?? Number.NaN,
    );
    const residuals = result.temperature_C.map((t, i) => {
      const d = t - 27;
      const fit = layer.reference_ohmSq * (1 + tc1 * 1e-6 * d + tc2 * 1e-6 * d * d);
      return 100 * Math.abs(((layer.sheetResistance_ohmSq[i] ?? 0) - fit) / layer.reference_ohmSq);
    });
    expect(Math.max(...residuals)).toBeCloseTo(worst, 9);
    // A parabola through a smooth curve over 180 K.
    expect(worst).toBeLessThan(2);
  });

  test('over a narrow span agrees with the coefficient of the solve', () => {
    const [layer] = temperatureSweep(film, { from_C: 24, to_C: 30, points: 7 }).layers;
    const [solved] = solve(film).result.layers;
    expect((layer.tcr1_ppmK ?? 0) / (solved.tcr1_ppmK ?? 1)).toBeCloseTo(1, 3);
    expect(layer.reference_ohmSq / solved.sheetResistance_ohmSq).toBeCloseTo(1, 9);
  });

  test('follows every layer of a stack', () => {
    const stack = study({
      steps: [
        { step: 'gaussian', dopant: 'boron', peak_cm3: 1e18, depth_um: 0.2, sigma_um: 0.2 },
        { step: 'gaussian', dopant: 'arsenic', peak_cm3: 1e20, depth_um: 0, sigma_um: 0.06 },
      ],
    });
    const { layers } = temperatureSweep(stack, span);
    expect(layers.map(({ type }) => type)).toEqual(['n', 'p', 'n']);
    for (const { sheetResistance_ohmSq } of layers)
      for (const value of sheetResistance_ohmSq) expect(value).toBeGreaterThan(0);
  });

  test('is refused for a model of one temperature, with those that have it', () => {
    const masetti = study({ models: { mobility: 'masetti' } });
    expect(() => temperatureSweep(masetti, span)).toThrow(NoSolution);
    expect(() => temperatureSweep(masetti, span)).toThrow(/klaassen or arora/);
  });

  test.each([
    [{ from_C: -200 }, /from_C|-73\.15/],
    [{ to_C: 500 }, /226\.85/],
    [{ to_C: -60 }, /above from_C/],
    [{ points: 1 }, /2 to 1000/],
    [{ points: 2.5 }, /2 to 1000/],
    [{ from_C: Number.NaN }, /allowed/],
  ])('a span with %o is refused with what is allowed', (wrong, words) => {
    expect(() => temperatureSweep(film, { ...span, ...wrong })).toThrow(InputProblem);
    expect(() => temperatureSweep(film, { ...span, ...wrong })).toThrow(words);
  });
});
