/** Layers of net doping that hold hardly any carriers: depleted from their junctions or the surface. */

import type { CarrierState } from '../carriers/state';
import type { Warning } from '../study/problem';

/** A layer counts as depleted when its majority nowhere rises to half the net doping. */
export const FILLED = 0.5;
/** Part of a layer's peak doping from which on its doping is looked at. */
const PROPER = 0.01;

export interface DopedLayer {
  readonly type: 'n' | 'p';
  /** cm */
  readonly top: number;
  readonly bottom: number;
}

/** The largest part of the net doping that the majority reaches anywhere in a layer; 0 when it has no doping of its type. */
export function filling(
  { doping, electrons, holes }: CarrierState,
  { type, top, bottom }: DopedLayer,
): number {
  const { depth, net } = doping;
  const [carriers, sign] = type === 'n' ? [electrons, 1] : [holes, -1];
  const within = (i: number): number => (depth[i] >= top && depth[i] <= bottom ? sign * net[i] : 0);
  let peak = 0;
  for (let i = 0; i < depth.length; i++) peak = Math.max(peak, within(i));
  let most = 0;
  for (let i = 0; i < depth.length; i++) {
    const own = within(i);
    // Right beside a junction there is hardly any doping to fill.
    if (own > PROPER * peak) most = Math.max(most, carriers[i] / own);
  }
  return most;
}

/** The layers between sign changes of net doping in which the majority is nowhere at home. */
export function depletedLayers(state: CarrierState): DopedLayer[] {
  const { depth, net, junctions } = state.doping;
  const bounds = [0, ...junctions, depth.length - 1];
  return bounds.slice(1).flatMap((to, k): DopedLayer[] => {
    const type = net[(bounds[k] + to) >> 1] > 0 ? 'n' : 'p';
    const layer: DopedLayer = { type, top: depth[bounds[k]], bottom: depth[to] };
    return filling(state, layer) < FILLED ? [layer] : [];
  });
}

export function depletionWarnings(state: CarrierState): Warning[] {
  return depletedLayers(state).map(({ type, top, bottom }) => ({
    code: 'layer-depleted',
    message: `the ${type}-doped layer from ${microns(top)} to ${microns(bottom)} um is depleted: it does not conduct as ${type}-type silicon`,
  }));
}

const microns = (cm: number): string => (cm * 1e4).toPrecision(4);
