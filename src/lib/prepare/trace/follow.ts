import { apply, flatten, polyline, type Curve, type Point } from './curve';
import type { Drawing, Painting } from './drawing';
import { GrowingArea, meet, within, type Bounds } from './parts';
import { boundsOf, cutLine, intersect, offsetByDisc, penArea, regionOf, type Region } from './region';

/** Beyond so many comparisons of paintings with each other, hidden lines are no longer looked for. */
const MAX_COMPARISONS = 20_000_000;

/** A painting with its area worked out when it is first asked for. */
class Layer {
  readonly bounds: Bounds;
  private known: Region | null = null;

  constructor(
    readonly painting: Painting,
    private readonly toleranceMm: number,
  ) {
    const flat = painting.curves.map((curve) => flatten(curve, toleranceMm));
    const [left, top, right, bottom] = boundsOf(flat);
    const reach = painting.pen ? this.penReach(painting) : 0;
    this.bounds = [left - reach, top - reach, right + reach, bottom + reach];
  }

  private penReach({ pen, matrix: [a, b, c, d] }: Painting): number {
    return (pen!.width / 2) * Math.max(Math.hypot(a, b), Math.hypot(c, d)) * Math.max(1, pen!.miterLimit);
  }

  /** Widest half of the pen on the artwork, mm. */
  get halfPenMm(): number {
    const { pen, matrix } = this.painting;
    return pen ? (pen.width / 2) * Math.sqrt(Math.abs(matrix[0] * matrix[3] - matrix[1] * matrix[2])) : 0;
  }

  get area(): Region {
    this.known ??= this.clipped(this.painting.pen ? this.strokeArea() : this.fillArea());
    return this.known;
  }

  private clipped(area: Region): Region {
    const { clip } = this.painting;
    return clip ? intersect(area, clip) : area;
  }

  private fillArea(): Region {
    const { curves, rule } = this.painting;
    return regionOf(
      curves.map((curve) => flatten(curve, this.toleranceMm)),
      rule,
    );
  }

  // The pen is drawn in the shape's own units, so that a stretched shape has a stretched pen.
  private strokeArea(): Region {
    const { ownCurves, pen, matrix } = this.painting;
    const stretch = Math.max(1e-9, Math.hypot(matrix[0], matrix[1]), Math.hypot(matrix[2], matrix[3]));
    const tolerance = this.toleranceMm / stretch;
    // Areas are worked out in fixed decimals of a mm: own units are brought to that size first.
    const lines = ownCurves.map((curve) => ({
      points: flatten(curve, tolerance).map(([x, y]): Point => [x * stretch, y * stretch]),
      closed: curve.closed,
    }));
    const area = penArea(lines, { ...pen!, width: pen!.width * stretch }, this.toleranceMm);
    const placed = area.map((path) => path.map(([x, y]) => apply(matrix, [x / stretch, y / stretch])));
    return regionOf(placed, 'nonzero');
  }
}

/**
 * Ink areas of a drawing whose paints are all known: what is filled dark, less what is painted light over it. Null where
 * the paintings lie over each other so often that a render is the quicker way.
 */
function inkAreas(layers: readonly Layer[]): Region | null {
  const ink = new GrowingArea();
  for (const layer of layers) {
    const { kind, effect, underOwnStroke } = layer.painting;
    if (effect === 'unknown' || (kind === 'stroke' && effect === 'ink')) continue;
    // A dark area with a dark line of its own round it is that line; what lies under it does not show.
    if (effect === 'ink' && !underOwnStroke) ink.add(layer.area);
    else if (ink.touches(layer.bounds)) ink.cut(layer.area);
    if (ink.isTooMuch) return null;
  }
  return ink.region;
}

function samePoints(a: readonly Point[], b: readonly Point[]): boolean {
  const length = (points: readonly Point[]): number =>
    points.reduce(
      (sum, p, i) => (i === 0 ? 0 : sum + Math.hypot(p[0] - points[i - 1][0], p[1] - points[i - 1][1])),
      0,
    );
  return Math.abs(length(a) - length(b)) <= 1e-3;
}

/** The parts of a curve inside or outside a region; the curve itself where nothing is cut from it. */
function cutCurve(curve: Curve, region: Region, keep: 'inside' | 'outside', toleranceMm: number): Curve[] {
  const points = flatten(curve, toleranceMm);
  const chain = curve.closed ? [...points, points[0]] : points;
  const parts = cutLine(chain, region, keep);
  if (parts.length === 1 && samePoints(parts[0], chain)) return [curve];
  return parts.map((part) => polyline(part, false));
}

function followLayer(layer: Layer, covers: readonly Layer[], page: Region, toleranceMm: number): Curve[] {
  const { painting, halfPenMm } = layer;
  let curves = painting.curves;
  if (!within(layer.bounds, boundsOf(page) as Bounds)) {
    curves = curves.flatMap((curve) => cutCurve(curve, page, 'inside', toleranceMm));
  }
  const { clip } = painting;
  if (clip) curves = curves.flatMap((curve) => cutCurve(curve, clip, 'inside', toleranceMm));
  for (const cover of covers) {
    if (curves.length === 0) break;
    // A line is left out only where it is hidden in its whole width.
    const hiding = offsetByDisc(cover.area, -Math.max(halfPenMm, toleranceMm), toleranceMm);
    if (hiding.length > 0)
      curves = curves.flatMap((curve) => cutCurve(curve, hiding, 'outside', toleranceMm));
  }
  return curves;
}

/** Lines of the drawing's dark strokes: their centrelines, less what is clipped, off the page or hidden by what is painted later. */
function strokeLines(
  layers: readonly Layer[],
  isFollowed: (layer: Layer) => boolean,
  page: Region,
  toleranceMm: number,
): Curve[] {
  const strokes = layers.filter(isFollowed).length;
  const looksForHidden = strokes * layers.length <= MAX_COMPARISONS;
  return layers.flatMap((layer, index) => {
    if (!isFollowed(layer)) return [];
    const covers = looksForHidden
      ? layers.slice(index + 1).filter(({ painting, bounds }) => {
          const isCover =
            painting.effect === 'light' || (painting.kind === 'fill' && painting.effect === 'ink');
          return isCover && meet(bounds, layer.bounds);
        })
      : [];
    return followLayer(layer, covers, page, toleranceMm);
  });
}

/** What a drawing comes to as lines: those of its strokes, and areas whose outlines are still to be found. */
export interface Followed {
  lines: Curve[];
  /** ink areas; null where only a render can tell them */
  areas: Region | null;
}

/**
 * Lines and areas of a drawing. A dark stroke is a line along its centre, whatever its width; a dark fill is an area; light
 * paint takes away what it covers.
 * @param drawing unchanged
 * @param toleranceMm farthest that a chord may lie from a curve where areas are worked out; lines keep their curves
 */
export function follow(drawing: Drawing, toleranceMm: number): Followed {
  const { widthMm, heightMm, needsRender, followed } = drawing;
  const page: Region = [
    [
      [0, 0],
      [widthMm, 0],
      [widthMm, heightMm],
      [0, heightMm],
    ],
  ];
  const layers = drawing.paintings.map((painting) => new Layer(painting, toleranceMm));
  const isFollowed = ({ painting }: Layer): boolean =>
    painting.kind === 'stroke' &&
    painting.effect === 'ink' &&
    (!needsRender || followed.has(painting.element));
  const lines = strokeLines(layers, isFollowed, page, toleranceMm);
  const areas = needsRender ? null : inkAreas(layers);
  return { lines, areas: areas && intersect(areas, page) };
}
