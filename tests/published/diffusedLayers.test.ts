import { describe, expect, test } from 'vitest';
import { solve } from '../../src/core/solve';
import { study } from '../support/studies';
import { publishedTable } from './table';

interface Layer {
  type: 'n' | 'p';
  shape: 'gauss' | 'erfc';
  background_cm3: number;
  surface_cm3: number;
  method: 'M' | 'F';
  conductivity_Scm: number;
}

/** A diffused layer of boron or phosphorus in the other type, with a characteristic length 2 sqrt(Dt) of 1 um. */
function diffusedLayer(
  layer: Omit<Layer, 'method' | 'conductivity_Scm'>,
  mobility: 'masetti' | 'mf723' | 'klaassen' | 'caughey-thomas',
) {
  const [dopant, wafer] =
    layer.type === 'p' ? (['boron', 'phosphorus'] as const) : (['phosphorus', 'boron'] as const);
  const { result } = solve(
    study({
      temperature_C: 23,
      wafer: { dopant: wafer, concentration_cm3: layer.background_cm3 },
      steps: [
        layer.shape === 'erfc'
          ? { step: 'erfc', dopant, surface_cm3: layer.surface_cm3, length_um: 1 }
          : { step: 'gaussian', dopant, peak_cm3: layer.surface_cm3, depth_um: 0, sigma_um: Math.SQRT1_2 },
      ],
      models: { mobility, carriers: 'neutral', ionisation: 'complete' },
    }),
  );
  return result.layers[0];
}

/** Average conductivity to the junction, S/cm: 1/(Rs xj). */
function average(layer: { sheetResistance_ohmSq: number; bottom_um: number }): number {
  return 1 / (layer.sheetResistance_ohmSq * layer.bottom_um * 1e-4);
}

describe('average conductivity of diffused layers against an independent quadrature', () => {
  // Six digits are given; minority carriers and the mesh take the rest. Irvin's own curves (Bell Syst. Tech. J. 41, 387, 1962)
  // exist as drawings only and rest on older mobilities, so no tolerance against them would mean anything.
  test.each(publishedTable<Layer>('diffused-layers'))(
    '$type-type $shape, surface $surface_cm3 in $background_cm3, method $method',
    (row) => {
      const made = average(diffusedLayer(row, row.method === 'M' ? 'masetti' : 'mf723'));
      expect(Math.abs(made / row.conductivity_Scm - 1)).toBeLessThan(1e-4);
    },
  );
});

describe('textbook layers', () => {
  test('the npn base of Jaeger, Introduction to Microelectronic Fabrication, ch. 4: junction and Rs xj (from memory)', () => {
    // Gaussian, surface 1.1e18, 2 sqrt(Dt) = 1.46 um, background 3e16: xj 2.77 um, Rs xj about 800 ohm um, Rs about 290.
    const { result } = solve(
      study({
        temperature_C: 23,
        wafer: { dopant: 'phosphorus', concentration_cm3: 3e16 },
        steps: [
          {
            step: 'gaussian',
            dopant: 'boron',
            peak_cm3: 1.1e18,
            depth_um: 0,
            sigma_um: 1.46 / Math.SQRT2 / 1,
          },
        ],
        models: { mobility: 'mf723', carriers: 'neutral' },
      }),
    );
    const [base] = result.layers;
    expect(Math.abs(base.bottom_um / 2.77 - 1)).toBeLessThan(2e-3);
    expect(Math.abs((base.sheetResistance_ohmSq * base.bottom_um) / 800 - 1)).toBeLessThan(0.03);
    expect(Math.abs(base.sheetResistance_ohmSq / 290 - 1)).toBeLessThan(0.03);
  });

  test('the p-well of Plummer, Deal and Griffin, Silicon VLSI Technology, ch. 7: only the hole mobility of 1967 gives its 3.7 S/cm (from memory)', () => {
    const well = { type: 'p', shape: 'gauss', background_cm3: 1e15, surface_cm3: 4e17 } as const;
    expect(Math.abs(average(diffusedLayer(well, 'caughey-thomas')) / 3.87 - 1)).toBeLessThan(0.01);
    const modern = average(diffusedLayer(well, 'klaassen'));
    expect(modern).toBeGreaterThan(5.5);
    expect(modern).toBeLessThan(5.9);
  });
});
