/** A dopant that a gas or a glass holds at the surface. */

import type { Dopant } from '../../material/dopants';

export interface Source {
  readonly dopant: Dopant;
  /** cm^-3 */
  readonly surface: number;
  readonly stepIndex: number;
}
