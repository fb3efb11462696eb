/** Every curve's value at one depth, for the reading line, for speech and for the clipboard. */

import type { SolvedColumns } from '../../core/index';
import { digits } from '../state/digits';
import type { Curve } from './curves';
import { valueAtDepth } from './interpolate';
import { DEPTH_UNIT_NAMES, type DepthUnit, PER_UM } from './view';

export interface Reading {
  readonly curve: Curve;
  readonly value: number;
}

/** Values of all curves at a depth; curves without a value there are left out. */
export function readAt(columns: SolvedColumns, curves: readonly Curve[], at_um: number): Reading[] {
  return curves
    .map((curve) => ({
      curve,
      value: valueAtDepth(columns.depth_um, curve.values, at_um, curve.unit === 'cm⁻³'),
    }))
    .filter(({ value }) => Number.isFinite(value));
}

export const depthText = (um: number, unit: DepthUnit): string =>
  `${(um * PER_UM[unit]).toPrecision(4)} ${DEPTH_UNIT_NAMES[unit]}`;

/** "boron 1.2e17 cm⁻³; holes ..." */
export function readingText(at_um: number, unit: DepthUnit, readings: readonly Reading[]): string {
  const values = readings.map(({ curve, value }) => `${curve.longName} ${digits(value, 3)} ${curve.unit}`);
  return `${depthText(at_um, unit)}: ${values.join('; ')}`;
}
