/**
 * A shape is one dopant's contribution to the silicon as plain data: a concentration for every depth x >= 0.
 *
 * Every kind keeps what makes it exact. A heat treatment behind a sealed surface turns one shape into another
 * ({@link diffuse}), epitaxy buries it ({@link bury}), etching strips it ({@link strip}); {@link evaluator} turns it into
 * a fast function of depth. Depths and lengths in cm, concentrations in cm^-3, Dt in cm^2, doses in cm^-2.
 */
export interface ShapeBase {
  /** Depths worth a mesh node: peaks, shoulders (mean +- 1, 2, 4 sigma), kinks. */
  readonly marks: readonly number[];
  /** Depths at which the concentration jumps: the mesh puts a node on either side. */
  readonly jumps: readonly number[];
}
