/**
 * Layers between junctions and what a sheet measurement reads of each. In a layer that carriers spill out of or into, net doping
 * counts with the sign of the layer, so that doping of the other sign is taken off.
 *
 * Sheet conductance G = q Int (n mu_n + p mu_p) dx, sheet resistance 1/G. Hall averages of the majority carriers (density c,
 * mobility mu): dose (Int c mu)^2 / Int c mu^2, mobility Int c mu^2 / Int c mu, Hall factor 1: the two-layer-network
 * average of R. L. Petritz, Phys. Rev. 110, 1254 (1958) taken to a continuum (from memory).
 */

import { type CarrierState, majorityBetween } from '../carriers/state';
import { ELEMENTARY_CHARGE } from '../material/constants';
import { integrate } from '../numeric/simpson';
import type { SampledDoping } from '../profile/doping';
import type { Conduction } from './conduction';

/** Where a layer is flat to rounding, its peak is the shallowest depth: later nodes must be higher by this factor. */
const FLAT = 1 + 1e-9;

/** Positions of a layer's first and last node; both are cell ends. */
export interface LayerSpan {
  readonly from: number;
  readonly to: number;
  readonly type: 'n' | 'p';
}

/** Readings of one layer: cm, cm^-2, cm^-3, S, cm^2/Vs. */
export interface LayerReadings {
  readonly sheetConductance: number;
  readonly netDose: number;
  readonly carrierDose: number;
  readonly conductivityMobility: number;
  readonly hallMobility: number;
  readonly hallDose: number;
  readonly surfaceNet: number;
  readonly peakNet: number;
  readonly peakDepth: number;
}

/**
 * The layers from the surface down, between the cuts where one kind of carrier takes over from the other. A layer that a reverse
 * bias has emptied is none.
 */
export function layerSpans(state: CarrierState): LayerSpan[] {
  const bounds = [0, ...state.cuts, state.electrons.length - 1];
  return bounds.slice(1).flatMap((to, i): LayerSpan[] => {
    const from = bounds[i];
    const type = majorityBetween(state, from, to);
    return type ? [{ from, to, type }] : [];
  });
}

/** Sheet conductance of one layer, S. */
export function sheetConductance(depth: Float64Array, conductivity: Float64Array, span: LayerSpan): number {
  return integrate(depth, conductivity, span.from, span.to);
}

/** All readings of one layer. */
export function layerReadings({ doping }: CarrierState, flow: Conduction, span: LayerSpan): LayerReadings {
  const { from, to, type } = span;
  const sign = type === 'n' ? 1 : -1;
  const carriers = type === 'n' ? flow.input.electrons : flow.input.holes;
  const mobility = type === 'n' ? flow.electronMobility : flow.holeMobility;
  const work = new Float64Array(doping.depth.length);
  const total = (value: (i: number) => number): number => {
    for (let i = from; i <= to; i++) work[i] = value(i);
    return integrate(doping.depth, work, from, to);
  };
  const conductance = sheetConductance(doping.depth, flow.conductivity, span);
  const carrierDose = total((i) => carriers[i]);
  const drift = total((i) => carriers[i] * mobility[i]);
  const hall = total((i) => carriers[i] * mobility[i] * mobility[i]);
  return {
    sheetConductance: conductance,
    netDose: total((i) => sign * doping.net[i]),
    carrierDose,
    conductivityMobility: conductance / (ELEMENTARY_CHARGE * carrierDose),
    hallMobility: hall / drift,
    hallDose: (drift * drift) / hall,
    surfaceNet: sign * doping.net[from],
    ...peak(doping, span, sign),
  };
}

/** The largest net doping of the layer and its depth, by the parabola of ln|net| through the three highest nodes. */
function peak(
  { depth, net }: SampledDoping,
  { from, to }: LayerSpan,
  sign: 1 | -1,
): { peakNet: number; peakDepth: number } {
  const at = (i: number) => sign * net[i];
  let top = from;
  for (let i = from; i <= to; i++) if (at(i) > at(top) * FLAT) top = i;
  const node = { peakNet: at(top), peakDepth: depth[top] };
  if (top <= from || top >= to || !(at(top - 1) > 0 && at(top + 1) > 0)) return node;
  const [a, b, c] = [top - 1, top, top + 1].map((i) => Math.log(at(i)));
  const [ha, hc] = [depth[top] - depth[top - 1], depth[top + 1] - depth[top]];
  const slopeBefore = (b - a) / ha;
  const slopeAfter = (c - b) / hc;
  const bend = (2 * (slopeAfter - slopeBefore)) / (ha + hc);
  if (!(bend < 0)) return node;
  const slope = (slopeBefore * hc + slopeAfter * ha) / (ha + hc);
  const rise = -(slope * slope) / (2 * bend);
  // Between even steps the top rises by at most an eighth of the larger drop; more means a corner, or noise on a flat layer.
  if (rise > Math.max(b - a, b - c) / 4) return node;
  return { peakNet: Math.exp(b + rise), peakDepth: depth[top] - slope / bend };
}
