import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ELEMENTARY_CHARGE } from '../src/core/material/constants';
import { intrinsicDensity } from '../src/core/material/intrinsic';
import { resistivityOf } from '../src/core/material/mf723';
import { mobilityModel } from '../src/core/mobility/list';
import { uniformSilicon } from '../src/core/mobility/uniform';
import type { Solution } from '../src/core/result';
import { type SolveOptions, solve } from '../src/core/solve';
import type { Study } from '../src/core/study/schema';
import { integrate } from './support/quadrature';
import { study } from './support/studies';

const implant = { step: 'implant', dopant: 'boron', dose_cm2: 1.2e13, energy_keV: 60 } as const;
const anneal = { step: 'anneal', temperature_C: 1000, time_min: 35 } as const;

/** Studies that differ in everything the mesh has to cope with. */
const GALLERY: Record<string, Study> = {
  'implant and anneal': study({ steps: [implant, anneal] }),
  'shallow arsenic, as implanted': study({
    wafer: { dopant: 'boron', resistivity_ohmCm: 10 },
    steps: [{ step: 'implant', dopant: 'arsenic', dose_cm2: 2e15, energy_keV: 10 }],
  }),
  'three layers': study({
    wafer: { dopant: 'boron', concentration_cm3: 1e15 },
    steps: [
      { step: 'epitaxy', thickness_um: 4, dopant: 'phosphorus', concentration_cm3: 5e15 },
      { step: 'implant', dopant: 'boron', dose_cm2: 1e14, energy_keV: 40 },
      { step: 'anneal', temperature_C: 1100, time_min: 60 },
      { step: 'predeposition', dopant: 'phosphorus', temperature_C: 950, time_min: 20 },
      { step: 'anneal', temperature_C: 1000, time_min: 20 },
    ],
    models: { activation: 'solubility' },
  }),
  'abrupt boxes': study({
    steps: [
      { step: 'uniform', dopant: 'boron', concentration_cm3: 1e17, to_um: 1 },
      { step: 'uniform', dopant: 'arsenic', concentration_cm3: 1e20, to_um: 0.1 },
    ],
  }),
  'diffused, then etched and annealed again': study({
    steps: [
      { step: 'erfc', dopant: 'boron', surface_cm3: 1e19, length_um: 0.5 },
      anneal,
      { step: 'etch', thickness_um: 0.15 },
      { step: 'anneal', temperature_C: 1050, time_min: 20 },
    ],
  }),
  'a table, annealed': study({
    steps: [
      {
        step: 'table',
        dopant: 'boron',
        depth_um: Array.from({ length: 120 }, (_, i) => i * 0.005),
        concentration_cm3: Array.from(
          { length: 120 },
          (_, i) => 1e18 * Math.exp(-(((i * 0.005 - 0.15) / 0.07) ** 2)),
        ),
      },
      { step: 'anneal', temperature_C: 900, time_min: 20 },
    ],
  }),
  'nearly compensated': study({
    wafer: { dopant: 'phosphorus', concentration_cm3: 1e16 },
    steps: [
      { step: 'uniform', dopant: 'boron', concentration_cm3: 0.998e16, to_um: 5 },
      { step: 'gaussian', dopant: 'boron', peak_cm3: 1e17, depth_um: 0.5, sigma_um: 0.05 },
    ],
  }),
  'a steep tail on a broad profile': study({
    wafer: { dopant: 'arsenic', concentration_cm3: 5.8e15 },
    temperature_C: 85,
    steps: [
      { step: 'uniform', dopant: 'boron', concentration_cm3: 2.8e18, to_um: 0.0622 },
      { step: 'anneal', temperature_C: 846.6, time_min: 4.7 },
      { step: 'gaussian', dopant: 'boron', peak_cm3: 8e14, depth_um: -0.127, sigma_um: 0.846 },
    ],
  }),
  'carriers spilt into a light wafer': study({
    wafer: { dopant: 'boron', concentration_cm3: 1.28e15 },
    steps: [
      { step: 'predeposition', dopant: 'phosphorus', temperature_C: 852.3, time_min: 2.88 },
      { step: 'etch', thickness_um: 0.00184 },
    ],
  }),
  'a layer on more of its own type': study({
    wafer: { dopant: 'arsenic', concentration_cm3: 4.1e16 },
    steps: [{ step: 'gaussian', dopant: 'phosphorus', peak_cm3: 4.5e17, depth_um: 0.988, sigma_um: 0.192 }],
  }),
  'film on oxide': study({
    wafer: { dopant: 'boron', concentration_cm3: 1e15, buriedOxide_um: 0.2 },
    steps: [{ step: 'implant', dopant: 'phosphorus', dose_cm2: 1e13, energy_keV: 40 }, anneal],
  }),
};

const readings = (of: Study, options?: SolveOptions) => solve(of, options).result;

describe('every readout is independent of the mesh', () => {
  test.each(Object.keys(GALLERY))(
    '%s: half the cells move no sheet resistance by 0.02 percent and no junction by 0.1 nm',
    (name) => {
      const coarse = readings(GALLERY[name]);
      const fine = readings(GALLERY[name], { refinement: 2 });
      expect(fine.layers.length).toBe(coarse.layers.length);
      expect(fine.mesh.nodes).toBeGreaterThanOrEqual(coarse.mesh.nodes);
      coarse.layers.forEach((layer, i) => {
        expect(Math.abs(fine.layers[i].sheetResistance_ohmSq / layer.sheetResistance_ohmSq - 1)).toBeLessThan(
          2e-4,
        );
        expect(Math.abs(fine.layers[i].hallDose_cm2 / layer.hallDose_cm2 - 1)).toBeLessThan(2e-4);
        expect(Math.abs(fine.layers[i].peakNet_cm3 / layer.peakNet_cm3 - 1)).toBeLessThan(1e-2);
      });
      coarse.junctions.forEach((junction, i) => {
        for (const key of ['metallurgical_um', 'electrical_um'] as const) {
          const [a, b] = [fine.junctions[i][key], junction[key]];
          expect(a === null).toBe(b === null);
          if (a !== null && b !== null) expect(Math.abs(a - b)).toBeLessThan(1e-4);
        }
      });
    },
  );

  test('and a solve repeats to the last bit', () => {
    for (const of of Object.values(GALLERY)) expect(solve(of)).toEqual(solve(of));
  });
});

describe('layer integrals against adaptive quadrature of the analytic profile', () => {
  test.each([
    [1e17, 0.5],
    [5e18, 0.3],
    [1e20, 0.2],
  ])('a Gaussian of %f cm^-3, sigma %f um, to 1e-4', (peak, sigma) => {
    const background = 1.3e15;
    const temperature = 298.15;
    const klaassen = mobilityModel('klaassen');
    const ni = intrinsicDensity(temperature);
    const [layer] = readings(
      study({
        steps: [{ step: 'gaussian', dopant: 'boron', peak_cm3: peak, depth_um: 0.1, sigma_um: sigma }],
        models: { carriers: 'neutral', ionisation: 'complete' },
      }),
    ).layers;
    const junction = 0.1 + sigma * Math.sqrt(2 * Math.log(peak / background));
    expect(layer.bottom_um).toBeCloseTo(junction, 9);
    const conductivity = (depth: number) => {
      const acceptors = peak * Math.exp(-(((depth - 0.1) / sigma) ** 2) / 2);
      const half = (acceptors - background) / 2;
      const holes = half + Math.sqrt(half * half + ni * ni);
      return compensated(klaassen, acceptors, background, holes, (ni * ni) / holes, temperature);
    };
    const reference = integrate(conductivity, 0, junction, 1e-9) * 1e-4;
    expect(Math.abs(layer.sheetConductance_S / reference - 1)).toBeLessThan(1e-4);
  });

  /** Conductivity of one depth with both dopants, by the model called for that depth alone. */
  function compensated(
    model: ReturnType<typeof mobilityModel>,
    acceptors: number,
    donors: number,
    holes: number,
    electrons: number,
    temperature: number,
  ): number {
    const output = { electrons: new Float64Array(1), holes: new Float64Array(1) };
    model.evaluate(
      {
        temperature,
        donors: Float64Array.of(donors),
        acceptors: Float64Array.of(acceptors),
        electrons: Float64Array.of(electrons),
        holes: Float64Array.of(holes),
        donorParts: [{ dopant: 'phosphorus', ionised: Float64Array.of(donors) }],
        acceptorParts: [{ dopant: 'boron', ionised: Float64Array.of(acceptors) }],
      },
      output,
    );
    return ELEMENTARY_CHARGE * (holes * output.holes[0] + electrons * output.electrons[0]);
  }
});

describe('a table reads as the profile it was sampled from', () => {
  // 100 points a decade of fall-off: the analytic Gaussian against its own samples.
  test.each([
    [1e18, 0.15, 0.06],
    [1e20, 0.0, 0.1],
  ])(
    'peak %f, mean %f, sigma %f: sheet resistance within 0.3 percent, junction within a nanometre',
    (peak, mean, sigma) => {
      const gaussian = (x: number) => peak * Math.exp(-(((x - mean) / sigma) ** 2) / 2);
      const depths: number[] = [0];
      while (gaussian(depths[depths.length - 1]) > 1e13 && depths.length < 5000) {
        const x = depths[depths.length - 1];
        const slope = Math.max(Math.abs(x - mean) / (sigma * sigma) / Math.LN10, 1 / (10 * sigma));
        depths.push(x + 0.01 / slope);
      }
      const [table] = readings(
        study({
          steps: [
            { step: 'table', dopant: 'boron', depth_um: depths, concentration_cm3: depths.map(gaussian) },
          ],
        }),
      ).layers;
      const [direct] = readings(
        study({
          steps: [{ step: 'gaussian', dopant: 'boron', peak_cm3: peak, depth_um: mean, sigma_um: sigma }],
        }),
      ).layers;
      expect(Math.abs(table.sheetResistance_ohmSq / direct.sheetResistance_ohmSq - 1)).toBeLessThan(3e-3);
      expect(Math.abs(table.bottom_um - direct.bottom_um)).toBeLessThan(1e-3);
    },
  );
});

describe('what a study may ask for', () => {
  test('a disabled step takes no part', () => {
    const off = study({ steps: [{ ...implant, disabled: true }, anneal] });
    expect(readings(off).layers).toHaveLength(1);
    expect(readings(off).steps.map(({ index }) => index)).toEqual([2]);
  });

  test('a wafer by its resistivity is a wafer by the concentration of MF723', () => {
    const { wafer } = readings(study({ wafer: { dopant: 'boron', resistivity_ohmCm: 10 } }));
    expect(wafer.concentration_cm3).toBeGreaterThan(1.3e15);
    expect(wafer.concentration_cm3).toBeLessThan(1.4e15);
  });

  test('the wafer’s resistivity is told by the standard and by the study’s own mobility model', () => {
    const { wafer } = readings(
      study({
        wafer: { dopant: 'boron', concentration_cm3: 1e17 },
        temperature_C: 40,
        models: { mobility: 'arora' },
      }),
    );
    expect(wafer.resistivity_ohmCm).toBe(resistivityOf('boron', 1e17).value);
    expect(wafer.modelResistivity_ohmCm).toBe(uniformSilicon('boron', 1e17, 313.15, 'arora').resistivity);
  });

  test('a measurement is compared in percent and in its own sigma', () => {
    const plain = readings(study({ steps: [implant, anneal] })).layers[0].sheetResistance_ohmSq;
    const [compared, beyond] = readings(
      study({
        steps: [implant, anneal],
        measurements: [
          { kind: 'fourPoint', layer: 1, sheetResistance_ohmSq: plain * 1.05, sigma_ohmSq: plain * 0.01 },
          { kind: 'fourPoint', layer: 9, sheetResistance_ohmSq: 100 },
        ],
      }),
    ).measurements;
    expect(compared.difference_percent).toBeCloseTo(5, 9);
    expect(compared.difference_sigma).toBeCloseTo(5, 9);
    expect(beyond).toMatchObject({ predicted_ohmSq: null, difference_percent: null, difference_sigma: null });
  });

  test('a film ends at its buried oxide', () => {
    const [film] = readings(GALLERY['film on oxide']).layers.slice(-1);
    expect(film).toMatchObject({ bottom_um: expect.closeTo(0.2, 12), bottomEdge: 'buriedOxide' });
  });

  test('an unread table is refused with its key', () => {
    expect(() => solve(study({ steps: [{ step: 'table', dopant: 'boron', file: 'a.csv' }] }))).toThrow(
      /has not been read/,
    );
  });

  test('shares of a layer add up to one', () => {
    const { columns, result } = solve(GALLERY['three layers']);
    const ends = result.layers.map(({ bottom_um }) => columns.depth_um.findIndex((x) => x >= bottom_um));
    for (const end of ends) expect(columns.cumulativeShare[end]).toBeGreaterThanOrEqual(0);
    expect(columns.cumulativeShare[columns.cumulativeShare.length - 1]).toBeCloseTo(1, 12);
  });
});

describe('no recipe whatever gives anything but finite, positive readings', () => {
  const dopant = fc.constantFrom(
    'boron',
    'phosphorus',
    'arsenic',
    'antimony',
    'indium',
    'gallium',
    'aluminium',
  );
  const log = (low: number, high: number) =>
    fc.double({ min: low, max: high, noNaN: true }).map((x) => 10 ** x);
  const step = fc.oneof(
    fc.record({
      step: fc.constant('implant'),
      dopant,
      dose_cm2: log(10, 16.5),
      energy_keV: log(0, 3),
      shape: fc.constantFrom('pearson', 'gaussian'),
      ranges: fc.constantFrom('universal', 'lss1975'),
    }),
    fc.record({
      step: fc.constant('anneal'),
      temperature_C: fc.double({ min: 300, max: 1250, noNaN: true }),
      time_min: log(-3, 3),
    }),
    fc.record({
      step: fc.constant('predeposition'),
      dopant,
      temperature_C: fc.double({ min: 800, max: 1200, noNaN: true }),
      time_min: log(-1, 2),
    }),
    fc.record({
      step: fc.constant('gaussian'),
      dopant,
      peak_cm3: log(10, 21),
      depth_um: fc.double({ min: -1, max: 3, noNaN: true }),
      sigma_um: log(-3, 0),
    }),
    fc.record({ step: fc.constant('erfc'), dopant, surface_cm3: log(10, 21), length_um: log(-3, 1) }),
    fc.record({ step: fc.constant('uniform'), dopant, concentration_cm3: log(10, 21), to_um: log(-3, 1) }),
    fc.record({
      step: fc.constant('epitaxy'),
      thickness_um: log(-2, 1),
      dopant,
      concentration_cm3: log(13, 19),
    }),
    fc.record({ step: fc.constant('etch'), thickness_um: log(-3, 0) }),
  );

  const mobility = fc.constantFrom('klaassen', 'masetti', 'arora', 'caughey-thomas', 'mf723');
  const temperature = fc.double({ min: -70, max: 225, noNaN: true });
  const activation = fc.constantFrom('full', 'solubility');
  const solved = (parts: object) => solve(study(parts as Parameters<typeof study>[0]));

  function expectReadings({ result }: Solution): void {
    for (const layer of result.layers) {
      for (const [key, value] of Object.entries(layer))
        if (typeof value === 'number') expect(Number.isFinite(value), `${key} ${value}`).toBe(true);
      expect(layer.sheetResistance_ohmSq).toBeGreaterThan(0);
      expect(layer.bottom_um).toBeGreaterThan(layer.top_um);
    }
    for (const { depletion_um, builtIn_V, capacitance_nFcm2 } of result.junctions) {
      if (depletion_um) expect(depletion_um[1]).toBeGreaterThan(depletion_um[0]);
      if (capacitance_nFcm2 !== null) expect(capacitance_nFcm2).toBeGreaterThan(0);
      if (builtIn_V !== null) expect(builtIn_V).toBeGreaterThan(0);
    }
    expect(result.mesh.nodes).toBeLessThan(6000);
  }

  test('seeded random recipes of up to five steps', () => {
    fc.assert(
      fc.property(
        fc.array(step, { maxLength: 5 }),
        mobility,
        temperature,
        activation,
        (steps, ...choices) => {
          const [name, temperature_C, active] = choices;
          const solution = solved({ steps, temperature_C, models: { mobility: name, activation: active } });
          expectReadings(solution);
          expect(solution.columns.conductivity_Scm.every((value) => value > 0)).toBe(true);
        },
      ),
      { numRuns: 400, seed: 2027 },
    );
  });

  test('nor do surfaces, reverse voltages, levels and statistics of any kind', () => {
    const surface = fc.oneof(
      fc.constant(undefined),
      log(9, 14).map((charge_cm2) => ({ charge_cm2 })),
      log(9, 14).map((charge) => ({ charge_cm2: -charge })),
      fc.double({ min: -2, max: 2, noNaN: true }).map((potential_V) => ({ potential_V })),
    );
    const models = fc.record({
      ionisation: fc.constantFrom('complete', 'levels'),
      statistics: fc.constantFrom('boltzmann', 'fermi-dirac'),
      narrowing: fc.constantFrom('none', 'slotboom1976'),
      activation,
    });
    fc.assert(
      fc.property(
        fc.array(step, { maxLength: 4 }),
        models,
        temperature,
        surface,
        fc.array(log(-1, 3), { maxLength: 3 }),
        (steps, chosen, temperature_C, onSurface, reverseBias_V) => {
          const models = { mobility: 'klaassen', ...chosen };
          expectReadings(solved({ steps, temperature_C, models, surface: onSurface, reverseBias_V }));
        },
      ),
      { numRuns: 250, seed: 4054 },
    );
  });
});
