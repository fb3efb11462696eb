import { describe, expect, test } from 'vitest';
import { type BiasSpan, biasSweep } from '../../src/core/explore/bias';
import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { intrinsicDensity } from '../../src/core/material/intrinsic';
import { debyeLength, PERMITTIVITY, thermalVoltage } from '../../src/core/material/silicon';
import { solve } from '../../src/core/solve';
import { InputProblem, NoSolution } from '../../src/core/study/problem';
import { study } from '../support/studies';

const [ACCEPTORS, DONORS, THICKNESS_UM] = [2e16, 5e15, 1.2];
/** A uniform p layer on an n wafer: everything about it has a closed form in the depletion approximation. */
const box = study({
  wafer: { dopant: 'phosphorus', concentration_cm3: DONORS },
  steps: [{ step: 'uniform', dopant: 'boron', concentration_cm3: ACCEPTORS + DONORS, to_um: THICKNESS_UM }],
  models: { ionisation: 'complete' },
});
const span: BiasSpan = { layer: 1, junctions: 'both', from_V: 0, to_V: 10, points: 11 };

const volt = thermalVoltage(298.15);
const builtIn = volt * Math.log((ACCEPTORS * DONORS) / intrinsicDensity(298.15) ** 2);
/** Depth of the depletion in the p layer, cm; 2 kT/q off the voltage as for the majority tails (S. M. Sze, from memory). */
const depleted = (reverse: number): number =>
  Math.sqrt(
    (2 * PERMITTIVITY * (builtIn + reverse - 2 * volt) * DONORS) /
      (ELEMENTARY_CHARGE * ACCEPTORS * (ACCEPTORS + DONORS)),
  );

describe('a layer under reverse bias', () => {
  const result = biasSweep(box, span);

  test('gets thinner as the depletion approximation says', () => {
    const [first] = result.sheetResistance_ohmSq;
    const left = (reverse: number) => THICKNESS_UM * 1e-4 - depleted(reverse);
    result.reverse_V.forEach((reverse, i) => {
      const ratio = (result.sheetResistance_ohmSq[i] ?? 0) / (first ?? 1);
      // The tails of the majority are rounded off over a Debye length of 30 nm.
      expect(ratio / (left(0) / left(reverse))).toBeCloseTo(1, 2);
    });
  });

  test('has the capacitance of the depletion approximation', () => {
    const [junction] = result.junctions;
    expect(junction.position).toBe('lower');
    result.reverse_V.forEach((reverse, i) => {
      const width = depleted(reverse) * (1 + ACCEPTORS / DONORS);
      expect((junction.capacitance_nFcm2[i] ?? 0) / ((1e9 * PERMITTIVITY) / width)).toBeCloseTo(1, 3);
    });
  });

  test('at no bias is what the solve says', () => {
    const { layers, junctions } = solve(box).result;
    expect((result.sheetResistance_ohmSq[0] ?? 0) / layers[0].sheetResistance_ohmSq).toBeCloseTo(1, 9);
    expect(result.junctions[0].depletion_um[0]?.[0]).toBeCloseTo(junctions[0].depletion_um?.[0] ?? 0, 9);
  });

  test('has the voltage coefficient of its own curve', () => {
    const fine = biasSweep(box, { ...span, to_V: 0.02, points: 2 });
    const [zero, after] = fine.sheetResistance_ohmSq.map((value) => value ?? 0);
    expect(result.voltageCoefficient_percentV).toBeCloseTo((100 * (after / zero - 1)) / 0.02, 1);
  });

  test('is pinched off when the depletion reaches through it', () => {
    const thin = study({
      ...box,
      steps: [{ step: 'uniform', dopant: 'boron', concentration_cm3: ACCEPTORS + DONORS, to_um: 0.4 }],
    });
    const { pinchOff_V, sheetResistance_ohmSq } = biasSweep(thin, { ...span, to_V: 20 });
    // Half the majority is left at the surface when the edge of the depletion is one to two Debye lengths from it.
    const length = debyeLength(ACCEPTORS, 298.15);
    const left = (0.4e-4 - depleted((pinchOff_V ?? 0) + 2 * volt)) / length;
    expect(left).toBeGreaterThan(0.5);
    expect(left).toBeLessThan(2);
    expect(sheetResistance_ohmSq.at(-1)).toBeNull();
  });

  test('adds to the bias that the study states', () => {
    const stated = biasSweep({ ...box, reverseBias_V: [3] }, { ...span, to_V: 1, points: 2 });
    expect((stated.sheetResistance_ohmSq[0] ?? 0) / (result.sheetResistance_ohmSq[3] ?? 1)).toBeCloseTo(1, 6);
  });

  test('is refused without a layer or a junction', () => {
    expect(() => biasSweep(box, { ...span, layer: 7 })).toThrow(NoSolution);
    expect(() => biasSweep(box, { ...span, layer: 7 })).toThrow(/2 layers/);
    expect(() => biasSweep(box, { ...span, junctions: 'upper' })).toThrow(/no upper junction/);
  });

  test.each([
    [{ from_V: -1 }, /reverse voltages/],
    [{ to_V: 0 }, /above from_V/],
    [{ points: 1 }, /2 to 1000/],
  ])('a span with %o is refused with what is allowed', (wrong, words) => {
    expect(() => biasSweep(box, { ...span, ...wrong })).toThrow(InputProblem);
    expect(() => biasSweep(box, { ...span, ...wrong })).toThrow(words);
  });
});

describe('a layer that is depleted from the start', () => {
  const thin = study({
    wafer: { dopant: 'phosphorus', concentration_cm3: 1e16 },
    steps: [{ step: 'uniform', dopant: 'boron', concentration_cm3: 1.5e16, from_um: 1, to_um: 1.1 }],
  });

  test('is said to be, and none of its numbers is infinite', () => {
    const { result } = solve(thin);
    expect(result.warnings.map(({ code }) => code)).toContain('layer-depleted');
    expect(result.layers.map(({ type }) => type)).toEqual(['n']);
    expect(result.junctions.map(({ electrical_um }) => electrical_um)).toEqual([null, null]);
    expect(Number.isFinite(result.layers[0].sheetResistance_ohmSq)).toBe(true);
  });
});
