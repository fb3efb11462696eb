/** Which depths the tracks show at first: the doped part, not the half millimetre of wafer below it. */

import type { ResultDocument, SolvedColumns } from '../../core/index';

export interface DepthWindow {
  readonly from_um: number;
  readonly to_um: number;
}

const BELOW_JUNCTION = 1.6;
/** Net doping within this fraction of its value at the bottom counts as background. */
const BACKGROUND_TOLERANCE = 0.02;
const UNDISTURBED_UM = 1;

/**
 * From the surface to 1.6 times the deepest junction or 1.15 times the depth where net doping falls to background,
 * whichever is deeper; never beyond the film.
 */
export function defaultWindow(result: ResultDocument, columns: SolvedColumns): DepthWindow {
  const end = columns.depth_um[columns.depth_um.length - 1];
  const junction = Math.max(
    0,
    ...result.junctions.map((each) => each.electrical_um ?? each.metallurgical_um ?? 0),
  );
  const wanted = Math.max(BELOW_JUNCTION * junction, 1.15 * backgroundDepth(columns));
  return { from_um: 0, to_um: Math.min(end, wanted > 0 ? roundUp(wanted) : UNDISTURBED_UM) };
}

/** Deepest node where net doping still differs from that at the bottom; 0 when it never does. */
function backgroundDepth({ depth_um, net_cm3 }: SolvedColumns): number {
  const background = net_cm3[net_cm3.length - 1];
  for (let i = depth_um.length - 1; i >= 0; i--)
    if (Math.abs(net_cm3[i] - background) > BACKGROUND_TOLERANCE * Math.abs(background)) return depth_um[i];
  return 0;
}

/** Up to two significant digits, so that a small edit does not move the axis. */
function roundUp(value: number): number {
  const step = 10 ** (Math.floor(Math.log10(value)) - 1);
  return Math.ceil(value / step - 1e-9) * step;
}

/** A window zoomed about a depth; `factor` < 1 zooms in. Stays within the film. */
export function zoomed(window: DepthWindow, at_um: number, factor: number, end_um: number): DepthWindow {
  const width = Math.min(end_um, Math.max(1e-5, (window.to_um - window.from_um) * factor));
  const fraction = (at_um - window.from_um) / (window.to_um - window.from_um);
  return clamped({ from_um: at_um - fraction * width, to_um: at_um + (1 - fraction) * width }, end_um);
}

/** The window moved inside 0 to the film's end, its width kept where it fits. */
export function clamped({ from_um, to_um }: DepthWindow, end_um: number): DepthWindow {
  const width = Math.min(end_um, to_um - from_um);
  const from = Math.min(Math.max(0, from_um), end_um - width);
  return { from_um: from, to_um: from + width };
}
