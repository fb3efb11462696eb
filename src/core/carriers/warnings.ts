/** What is to be said about the carriers at a temperature. */

import { INTRINSIC_RANGE, INTRINSIC_SOURCE } from '../material/intrinsic';
import type { Warning } from '../study/problem';

/** A remark when `temperature` (K) lies outside the measurements behind the intrinsic density. */
export function intrinsicWarnings(temperature: number): Warning[] {
  const [low, high] = INTRINSIC_RANGE;
  if (temperature >= low && temperature <= high) return [];
  return [
    {
      code: 'intrinsic-range',
      message: `intrinsic density at ${temperature.toFixed(1)} K is extrapolated: ${INTRINSIC_SOURCE} measured ${low} to ${high} K`,
    },
  ];
}
