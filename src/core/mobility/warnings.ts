/** What a user must know about a mobility model's use: values outside its published range, borrowed coefficients. */

import { ZERO_CELSIUS } from '../material/constants';
import type { Warning } from '../study/problem';
import type { MobilityInput, MobilityModel } from './model';

/**
 * Warnings about using `model` for `input`, one per cause: total ionised impurities above or below the range, temperature outside it
 * (code `mobility-range`), dopants without coefficients of their own (`mobility-borrowed`), and what is known to be
 * wrong with the model (`mobility-caution`).
 */
export function mobilityWarnings(model: MobilityModel, input: MobilityInput): Warning[] {
  return [
    ...concentrationWarnings(model, input),
    ...temperatureWarnings(model, input.temperature),
    ...borrowedWarnings(model, input),
    ...(model.caution ? [{ code: 'mobility-caution', message: `${model.title}: ${model.caution}` }] : []),
  ];
}

function concentrationWarnings(model: MobilityModel, input: MobilityInput): Warning[] {
  const [lowest, highest] = model.range.concentration;
  let smallest = Number.POSITIVE_INFINITY;
  let largest = 0;
  for (let i = 0; i < input.donors.length; i++) {
    const total = input.donors[i] + input.acceptors[i];
    if (total < smallest) smallest = total;
    if (total > largest) largest = total;
  }
  const outside = (value: number, side: string): Warning => ({
    code: 'mobility-range',
    message: `${scientific(value)} cm^-3 of ionised impurities is ${side} the range of ${model.title} (${scientific(lowest)} to ${scientific(highest)} cm^-3).`,
  });
  return [
    ...(largest > highest ? [outside(largest, 'above')] : []),
    ...(smallest < lowest ? [outside(smallest, 'below')] : []),
  ];
}

function temperatureWarnings(model: MobilityModel, temperature: number): Warning[] {
  const [lowest, highest] = model.range.temperature;
  if (temperature >= lowest && temperature <= highest) return [];
  const found = celsius(temperature, 1);
  const [from, to] = [celsius(lowest, 0), celsius(highest, 0)];
  const message = model.dependsOnTemperature
    ? `${found} C is outside the range of ${model.title} (${from} to ${to} C).`
    : `${model.title} gives the mobility at room temperature (${from} to ${to} C), not at ${found} C: its values do not change with temperature.`;
  return [{ code: 'mobility-range', message }];
}

function borrowedWarnings(model: MobilityModel, input: MobilityInput): Warning[] {
  const lenders = [
    { parts: input.donorParts, lender: 'phosphorus' },
    { parts: input.acceptorParts, lender: 'boron' },
  ];
  return lenders.flatMap(({ parts, lender }) =>
    parts
      .filter(({ dopant }) => !model.ownDopants.includes(dopant))
      .map(({ dopant }) => ({
        code: 'mobility-borrowed',
        message: `${model.title} has no coefficients for ${dopant}; those of ${lender} are used.`,
      })),
  );
}

function scientific(value: number): string {
  return Number(value.toPrecision(4)).toExponential().replace('e+', 'e');
}

function celsius(temperature: number, digits: number): number {
  return Number((temperature - ZERO_CELSIUS).toFixed(digits));
}
