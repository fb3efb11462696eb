/**
 * A shape is one dopant's contribution to the silicon as plain data: a concentration for every depth x >= 0.
 *
 * Every kind keeps what makes it exact. A heat treatment behind a sealed surface turns one shape into another
 * ({@link diffuse}), epitaxy buries it ({@link bury}), etching strips it ({@link strip}); {@link evaluator} turns it into
 * a fast function of depth. Depths and lengths in cm, concentrations in cm^-3, Dt in cm^2, doses in cm^-2.
 */

import { gaussLegendre, integratePanels } from '../numeric/gaussLegendre';
import type { Anatomy } from './anatomy';
import { convolved, convolvedAnatomy, convolvedEvaluator } from './convolved';
import { erfcAnatomy, erfcEvaluator, erfcShape } from './erfc';
import { gaussian, gaussianAnatomy, gaussianEvaluator } from './gaussian';
import type { ConcentrationAt, Shape } from './kinds';
import { moved, movedAnatomy, movedEvaluator } from './moved';
import { pearson, pearsonAnatomy, pearsonEvaluator } from './pearson';
import { table, tableAnatomy, tableEvaluator } from './table';
import { uniform, uniformAnatomy, uniformEvaluator } from './uniform';

export type { ConcentrationAt, Shape } from './kinds';
export { erfcShape, gaussian, pearson, table, uniform };

const DOSE_RULE = gaussLegendre(16);

/** A fast function of depth (cm, x >= 0) to concentration (cm^-3): never negative, never NaN. Precomputes what it needs. */
export function evaluator(shape: Shape): ConcentrationAt {
  switch (shape.kind) {
    case 'gaussian':
      return gaussianEvaluator(shape);
    case 'erfc':
      return erfcEvaluator(shape);
    case 'uniform':
      return uniformEvaluator(shape);
    case 'pearson':
      return pearsonEvaluator(shape);
    case 'table':
      return tableEvaluator(shape);
    case 'moved':
      return movedEvaluator(shape, evaluator(shape.source));
    case 'convolved':
      return convolvedEvaluator(shape.Dt, evaluator(shape.source), anatomyOf(shape.source));
  }
}

/** Heat treatment: diffusion by Dt (cm^2) in semi-infinite silicon whose surface lets nothing through. */
export function diffuse(shape: Shape, Dt: number): Shape {
  if (Dt === 0) return shape;
  switch (shape.kind) {
    case 'gaussian':
      return gaussian(shape.peak, shape.mean, shape.sigma, shape.from, shape.Dt + Dt);
    case 'erfc':
      return erfcShape(shape.surface, shape.length, shape.Dt + Dt);
    case 'uniform':
      return fillsEverything(shape)
        ? shape
        : uniform(shape.concentration, shape.from, shape.to, shape.Dt + Dt);
    case 'convolved':
      return convolved(shape.source, shape.Dt + Dt);
    default:
      return convolved(shape, Dt);
  }
}

/** Epitaxy: everything lies deeper by `thickness` (cm), nothing above it. */
export function bury(shape: Shape, thickness: number): Shape {
  return displace(shape, thickness);
}

/** Etching: the uppermost `thickness` (cm) is gone, the rest lies nearer to the surface. */
export function strip(shape: Shape, thickness: number): Shape {
  return displace(shape, -thickness);
}

/** Dose (cm^-2) between the surface and `toDepth` (cm), to 1e-9 of itself; Infinity for all there is. */
export function doseOf(shape: Shape, toDepth: number): number {
  const { edges, beyond } = anatomyOf(shape);
  if (edges.length === 0) return 0;
  const inside = Array.from(edges).filter((x) => x < toDepth);
  const end = edges[edges.length - 1];
  if (inside.length > 0 && toDepth < end) inside.push(toDepth);
  const rest = beyond > 0 && toDepth > end ? beyond * (toDepth - end) : 0;
  return integratePanels(evaluator(shape), inside, DOSE_RULE) + rest;
}

function fillsEverything(shape: Shape): boolean {
  return shape.kind === 'uniform' && shape.from === 0 && shape.to === Number.POSITIVE_INFINITY;
}

/** Kinds that keep a window of their own stay themselves until they have diffused; the others are moved as they are. */
function displace(shape: Shape, by: number): Shape {
  const from = (before: number): number => Math.max(0, before + by);
  switch (shape.kind) {
    case 'gaussian':
      if (shape.Dt > 0) break;
      return gaussian(shape.peak, shape.mean + by, shape.sigma, from(shape.from));
    case 'uniform':
      if (shape.Dt > 0) break;
      return uniform(shape.concentration, from(shape.from), from(shape.to));
    case 'pearson':
      return pearson(shape.dose, { ...shape, mean: shape.mean + by }, from(shape.from));
    case 'table':
      return table(shape.depth, shape.concentration, shape.shift + by, from(shape.from));
  }
  return moved(shape, by, from(0));
}

function anatomyOf(shape: Shape): Anatomy {
  switch (shape.kind) {
    case 'gaussian':
      return gaussianAnatomy(shape);
    case 'erfc':
      return erfcAnatomy(shape);
    case 'uniform':
      return uniformAnatomy(shape);
    case 'pearson':
      return pearsonAnatomy(shape);
    case 'table':
      return tableAnatomy(shape);
    case 'moved':
      return movedAnatomy(shape, anatomyOf(shape.source));
    case 'convolved':
      return convolvedAnatomy(shape, anatomyOf(shape.source));
  }
}
