import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { neutralCarriers } from '../../src/core/carriers/neutral';
import type { Dopant } from '../../src/core/material/dopants';
import { intrinsicDensity } from '../../src/core/material/intrinsic';
import { MOBILITY_MODELS, mobilityModel } from '../../src/core/mobility/list';
import type { MobilityModel } from '../../src/core/mobility/model';
import { MOBILITY_NAMES } from '../../src/core/study/names';
import { oneDepth } from './oneDepth';

/** Both mobilities of neutral silicon with one donor and one acceptor. */
function neutral(
  model: MobilityModel,
  donor: Dopant,
  donors: number,
  acceptors: number,
  temperature: number,
) {
  const electrons = new Float64Array(1);
  const holes = new Float64Array(1);
  neutralCarriers(Float64Array.of(donors - acceptors), intrinsicDensity(temperature), electrons, holes);
  const dopants = { [donor]: donors, boron: acceptors };
  return oneDepth(model, { dopants, electrons: electrons[0], holes: holes[0], temperature });
}

const models = fc.constantFrom(...MOBILITY_MODELS);
const concentration = fc.double({ min: 14, max: 19.5, noNaN: true }).map((power) => 10 ** power);
const insideRange = (model: MobilityModel, part: number) =>
  model.range.temperature[0] + part * (model.range.temperature[1] - model.range.temperature[0]);

describe('the mobility models', () => {
  test('are found by every name a study may use', () => {
    expect(MOBILITY_MODELS.map(({ name }) => name)).toEqual([...MOBILITY_NAMES]);
    for (const name of MOBILITY_NAMES) expect(mobilityModel(name).name).toBe(name);
  });

  test('give positive mobilities for any doping and temperature in range, parts no smaller than the whole', () => {
    fc.assert(
      fc.property(
        models,
        concentration,
        concentration,
        fc.double({ min: 0, max: 1, noNaN: true }),
        (model, a, b, part) => {
          const at = neutral(model, 'phosphorus', a, b, insideRange(model, part));
          expect(at.electrons).toBeGreaterThan(0);
          expect(at.holes).toBeGreaterThan(0);
          expect(Number.isFinite(at.electrons + at.holes)).toBe(true);
          if (model.hasParts) {
            expect(Math.min(at.electronLattice, at.electronImpurity)).toBeGreaterThanOrEqual(at.electrons);
            expect(Math.min(at.holeLattice, at.holeImpurity)).toBeGreaterThanOrEqual(at.holes);
          }
        },
      ),
    );
  });

  test('give lower majority mobility when impurities of both signs are added and the net doping stays', () => {
    fc.assert(
      fc.property(
        models,
        concentration,
        fc.double({ min: 0.05, max: 3, noNaN: true }),
        (model, doping, ratio) => {
          const added = doping * ratio;
          const before = neutral(model, 'phosphorus', doping, 0, 300).electrons;
          expect(neutral(model, 'phosphorus', doping + added, added, 300).electrons).toBeLessThan(before);
          const holesBefore = neutral(model, 'phosphorus', 0, doping, 300).holes;
          expect(neutral(model, 'phosphorus', added, doping + added, 300).holes).toBeLessThan(holesBefore);
        },
      ),
    );
  });

  test('give lower majority mobility at higher doping', () => {
    fc.assert(
      fc.property(
        models,
        concentration,
        fc.double({ min: 1.05, max: 3, noNaN: true }),
        (model, doping, ratio) => {
          const [light, heavy] = [doping, doping * ratio];
          expect(neutral(model, 'phosphorus', heavy, 0, 300).electrons).toBeLessThan(
            neutral(model, 'phosphorus', light, 0, 300).electrons,
          );
          expect(neutral(model, 'phosphorus', 0, heavy, 300).holes).toBeLessThan(
            neutral(model, 'phosphorus', 0, light, 300).holes,
          );
        },
      ),
    );
  });

  test('fill every depth as they fill it alone', () => {
    const donors = Float64Array.of(1e15, 1e17, 3e19);
    const acceptors = Float64Array.of(5e16, 0, 1e18);
    const arsenic = Float64Array.of(0, 5e16, 2.9e19);
    const phosphorus = donors.map((all, i) => all - arsenic[i]);
    const [electrons, holes] = [new Float64Array(3), new Float64Array(3)];
    neutralCarriers(
      donors.map((all, i) => all - acceptors[i]),
      1e10,
      electrons,
      holes,
    );
    for (const model of MOBILITY_MODELS) {
      const output = { electrons: new Float64Array(3), holes: new Float64Array(3) };
      model.evaluate(
        {
          temperature: 300,
          donors,
          acceptors,
          electrons,
          holes,
          donorParts: [
            { dopant: 'arsenic', ionised: arsenic },
            { dopant: 'phosphorus', ionised: phosphorus },
          ],
          acceptorParts: [{ dopant: 'boron', ionised: acceptors }],
        },
        output,
      );
      for (let i = 0; i < 3; i++) {
        const dopants = { arsenic: arsenic[i], phosphorus: phosphorus[i], boron: acceptors[i] };
        const alone = oneDepth(model, { dopants, electrons: electrons[i], holes: holes[i] });
        expect(output.electrons[i]).toBe(alone.electrons);
        expect(output.holes[i]).toBe(alone.holes);
      }
    }
  });
});
