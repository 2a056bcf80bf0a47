import type { SvgNode } from '../svg/parse-xml';
import type { Curve, Matrix } from './curve';
import type { Effect } from './paint';
import type { Pen, Region } from './region';

/** One painting of a shape, in the order in which the drawing paints. */
export interface Painting {
  kind: 'fill' | 'stroke';
  /** element that paints; the same for each repetition by `use` */
  element: SvgNode;
  /** ink or light where it can be told by a colour; unknown where only a render can tell */
  effect: Exclude<Effect, 'none'> | 'unknown';
  /** mm on the placed artwork; a fill's are all closed */
  curves: Curve[];
  rule: 'nonzero' | 'evenodd';
  /** what the painting is confined to, mm; null: nothing */
  clip: Region | null;
  /** for a stroke: the pen in the shape's own units, the curves before and the matrix after */
  pen: Pen | null;
  ownCurves: Curve[];
  matrix: Matrix;
  /** a fill whose own stroke is ink: the stroke is the line */
  underOwnStroke: boolean;
}

export interface Drawing {
  paintings: Painting[];
  /** whether something is painted that only a render can tell: text, pictures, gradients of both kinds, masks, filters … */
  needsRender: boolean;
  /** elements whose stroke is followed wherever they are used */
  followed: Set<SvgNode>;
  widthMm: number;
  heightMm: number;
}
