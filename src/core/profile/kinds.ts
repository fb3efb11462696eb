/** The kinds of shapes as plain data. Depths and lengths in cm, concentrations in cm^-3, Dt in cm^2, doses in cm^-2. */

interface ShapeBase {
  /** Depths worth a mesh node: peaks, shoulders (mean +- 1, 2, 4 sigma), kinks. Ascending, >= 0. */
  readonly marks: readonly number[];
  /** Depths at which the concentration jumps: the mesh puts a node on either side. */
  readonly jumps: readonly number[];
}

/** peak exp(-(x-mean)^2 / 2 sigma^2) for x >= from, nothing above, then diffused by Dt behind a sealed surface. */
export interface GaussianShape extends ShapeBase {
  readonly kind: 'gaussian';
  readonly peak: number;
  /** May lie above the surface (negative). */
  readonly mean: number;
  readonly sigma: number;
  readonly from: number;
  readonly Dt: number;
}

/** surface erfc(x/length), then diffused by Dt behind a sealed surface. */
export interface ErfcShape extends ShapeBase {
  readonly kind: 'erfc';
  readonly surface: number;
  readonly length: number;
  readonly Dt: number;
}

/** A constant concentration between two depths, then diffused by Dt behind a sealed surface. */
export interface UniformShape extends ShapeBase {
  readonly kind: 'uniform';
  readonly concentration: number;
  readonly from: number;
  /** Infinity for a wafer. */
  readonly to: number;
  readonly Dt: number;
}

/** A Pearson distribution of given moments whose integral over all x is `dose`; only the part x >= from is there. */
export interface PearsonShape extends ShapeBase {
  readonly kind: 'pearson';
  readonly dose: number;
  readonly mean: number;
  readonly straggle: number;
  readonly skewness: number;
  /** Fourth central moment over straggle^4; 3 for a normal distribution. */
  readonly kurtosis: number;
  readonly from: number;
}

/** Measured or computed points, shifted down by `shift`; only the part x >= from is there. */
export interface TableShape extends ShapeBase {
  readonly kind: 'table';
  /** Ascending. */
  readonly depth: Float64Array;
  readonly concentration: Float64Array;
  readonly shift: number;
  readonly from: number;
}

/** Another shape shifted down by `shift`, of which only the part x >= from is left. */
export interface MovedShape extends ShapeBase {
  readonly kind: 'moved';
  readonly source: Shape;
  readonly shift: number;
  readonly from: number;
}

/** Another shape diffused by Dt behind a sealed surface, evaluated by numerical convolution. */
export interface ConvolvedShape extends ShapeBase {
  readonly kind: 'convolved';
  readonly source: Shape;
  readonly Dt: number;
}

export type Shape =
  | GaussianShape
  | ErfcShape
  | UniformShape
  | PearsonShape
  | TableShape
  | MovedShape
  | ConvolvedShape;

/** Concentration at a depth x >= 0: never negative, never NaN. */
export type ConcentrationAt = (x: number) => number;
