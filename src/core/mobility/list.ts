/** The mobility models by the names a study uses. */

import type { MobilityName } from '../study/names';
import { arora } from './arora';
import { caugheyThomas } from './caugheyThomas';
import { klaassen } from './klaassen';
import { masetti } from './masetti';
import { mf723 } from './mf723';
import type { MobilityModel } from './model';

/** In the order in which they are offered. */
export const MOBILITY_MODELS: readonly MobilityModel[] = [klaassen, masetti, arora, caugheyThomas, mf723];

const BY_NAME: Record<MobilityName, MobilityModel> = {
  klaassen,
  masetti,
  arora,
  'caughey-thomas': caugheyThomas,
  mf723,
};

export function mobilityModel(name: MobilityName): MobilityModel {
  return BY_NAME[name];
}
