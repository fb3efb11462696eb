/** Layers of net doping that hold hardly any carriers: depleted from their junctions or the surface. */

import type { CarrierState } from '../carriers/state';
import type { Warning } from '../study/problem';

/** A layer counts as depleted when its majority nowhere rises to half the net doping. */
const FILLED = 0.5;

export interface DopedLayer {
  readonly type: 'n' | 'p';
  /** cm */
  readonly top: number;
  readonly bottom: number;
}

/** The layers between sign changes of net doping in which the majority is nowhere at home. */
export function depletedLayers({ doping, electrons, holes }: CarrierState): DopedLayer[] {
  const { depth, net, junctions } = doping;
  const bounds = [0, ...junctions, depth.length - 1];
  return bounds.slice(1).flatMap((to, k): DopedLayer[] => {
    const from = bounds[k];
    const type = net[(from + to) >> 1] > 0 ? 'n' : 'p';
    const carriers = type === 'n' ? electrons : holes;
    for (let i = from; i <= to; i++) if (net[i] !== 0 && carriers[i] >= FILLED * Math.abs(net[i])) return [];
    return [{ type, top: depth[from], bottom: depth[to] }];
  });
}

export function depletionWarnings(state: CarrierState): Warning[] {
  return depletedLayers(state).map(({ type, top, bottom }) => ({
    code: 'layer-depleted',
    message: `the ${type}-doped layer from ${microns(top)} to ${microns(bottom)} um is depleted: it does not conduct as ${type}-type silicon`,
  }));
}

const microns = (cm: number): string => (cm * 1e4).toPrecision(4);
