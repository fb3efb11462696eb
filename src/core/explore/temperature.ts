/** Sheet resistance against temperature for every layer, and the coefficients that a designer enters for it. */

import { solve as leastSquares, Matrix } from 'ml-matrix';
import { carriersOf } from '../carriers/carriers';
import { carrierWarnings } from '../carriers/warnings';
import { ZERO_CELSIUS } from '../material/constants';
import { conduction } from '../sheet/conduction';
import { layerSpans, sheetConductance } from '../sheet/layers';
import { prepare } from '../solve';
import { InputProblem, NoSolution, type Warning } from '../study/problem';
import type { Study } from '../study/schema';
import { findLayer, followedLayer } from './layerOf';

export interface TemperatureSpan {
  readonly from_C: number;
  readonly to_C: number;
  /** Temperatures in the span, both ends included. */
  readonly points: number;
}

export interface TemperatureLayer {
  index: number;
  type: 'n' | 'p';
  /** By temperature; null where the layer has gone. */
  sheetResistance_ohmSq: (number | null)[];
  /** At the study's own temperature, to which the coefficients refer. */
  reference_ohmSq: number;
  /** R/R_reference = 1 + TC1 dT + TC2 dT^2 by least squares over the span; null with fewer than three values. */
  tcr1_ppmK: number | null;
  tcr2_ppmK2: number | null;
  /** Largest difference of that parabola from the values, in per cent of the reference. */
  worst_percent: number | null;
}

export interface TemperatureResult {
  format: 'ohmstrata-temperature/1';
  study: string;
  mobility: string;
  reference_C: number;
  temperature_C: number[];
  layers: TemperatureLayer[];
  warnings: Warning[];
}

const COLDEST_C = -73.15;
const HOTTEST_C = 226.85;
const MOST_POINTS = 1000;

/**
 * Solves the stack at every temperature of the span; the doping is the same, carriers, ionisation and mobility follow.
 * @throws InputProblem for a span that cannot be used, NoSolution for a mobility model of one temperature only.
 */
export function temperatureSweep(study: Study, { from_C, to_C, points }: TemperatureSpan): TemperatureResult {
  checkSpan(from_C, to_C, points);
  const { doping, model, choice, recipe } = prepare(study);
  if (!model.dependsOnTemperature)
    throw new NoSolution(
      `${model.title} knows one temperature only; choose klaassen or arora, which follow temperature`,
    );
  const at = (celsius: number) => {
    const state = carriersOf(doping, { ...choice, temperature: celsius + ZERO_CELSIUS });
    return { state, flow: conduction(state, model) };
  };
  const reference_C = study.temperature_C;
  const reference = at(reference_C);
  const temperatures = Array.from(
    { length: points },
    (_, i) => from_C + ((to_C - from_C) * i) / (points - 1),
  );
  const solved = temperatures.map(at);
  const layers = layerSpans(reference.state).map((span, k): TemperatureLayer => {
    const layer = followedLayer(reference.state, k + 1);
    const own = 1 / sheetConductance(reference.state.doping.depth, reference.flow.conductivity, span);
    const values = solved.map(({ state, flow }) => {
      const found = findLayer(state, layer);
      return found && 1 / sheetConductance(state.doping.depth, flow.conductivity, found);
    });
    return {
      index: k + 1,
      type: span.type,
      sheetResistance_ohmSq: values,
      reference_ohmSq: own,
      ...parabola(temperatures, values, reference_C, own),
    };
  });
  return {
    format: 'ohmstrata-temperature/1',
    study: study.name,
    mobility: model.name,
    reference_C,
    temperature_C: temperatures,
    layers,
    warnings: carrierWarnings(
      { ...choice, temperature: Math.max(from_C, to_C) + ZERO_CELSIUS },
      recipe.models.ionisation,
      doping,
    ),
  };
}

function checkSpan(from: number, to: number, points: number): void {
  for (const [key, value] of [
    ['from_C', from],
    ['to_C', to],
  ] as const)
    if (!(value >= COLDEST_C && value <= HOTTEST_C))
      throw new InputProblem(`found ${value}; ${COLDEST_C} to ${HOTTEST_C} C are allowed`, { key });
  if (!(to > from)) throw new InputProblem(`found ${to}; it must be above from_C ${from}`, { key: 'to_C' });
  if (!(Number.isInteger(points) && points >= 2 && points <= MOST_POINTS))
    throw new InputProblem(`found ${points}; 2 to ${MOST_POINTS} are allowed`, { key: 'points' });
}

/** TC1 and TC2 by least squares, tied to the reference. */
function parabola(
  temperatures: readonly number[],
  values: readonly (number | null)[],
  reference_C: number,
  reference: number,
): Pick<TemperatureLayer, 'tcr1_ppmK' | 'tcr2_ppmK2' | 'worst_percent'> {
  const known = temperatures.flatMap((t, i): [number, number][] => {
    const value = values[i];
    return value === null ? [] : [[t - reference_C, value / reference - 1]];
  });
  if (known.filter(([difference]) => difference !== 0).length < 3)
    return { tcr1_ppmK: null, tcr2_ppmK2: null, worst_percent: null };
  const solution = leastSquares(
    new Matrix(known.map(([d]) => [d, d * d])),
    Matrix.columnVector(known.map(([, change]) => change)),
    true,
  );
  const [first, second] = [solution.get(0, 0), solution.get(1, 0)];
  const worst = Math.max(...known.map(([d, change]) => Math.abs(first * d + second * d * d - change)));
  return { tcr1_ppmK: first * 1e6, tcr2_ppmK2: second * 1e6, worst_percent: worst * 100 };
}
