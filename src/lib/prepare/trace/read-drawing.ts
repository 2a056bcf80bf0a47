import { parseXml, type SvgNode } from '../svg/parse-xml';
import { readViewBox } from '../svg/physical-size';
import { resolveStyles, type Style } from '../svg/resolve-styles';
import { SHAPES } from '../svg/vocabulary';
import { readRoot } from '../svg/window-svg';
import {
  flatten,
  IDENTITY,
  multiply,
  readPathData,
  readTransform,
  transformCurve,
  type Curve,
  type Matrix,
} from './curve';
import { ClipReader } from './clip-region';
import { dash } from './dash';
import type { Drawing, Painting } from './drawing';
import { gradientEffect } from './gradient-effect';
import { INITIAL, inherit, opacityOf, readDashes, readPaint, readPen, type Paint } from './inherited';
import { effectOf } from './paint';
import { intersect, regionOf, type Region } from './region';
import { readLength, shapePath, useOffset, type Viewport } from './shape';
import { viewportMatrix } from './viewport-matrix';

/** What an element stands in. */
interface Around {
  matrix: Matrix;
  style: Style;
  opacity: number;
  clip: Region | null;
  viewport: Viewport;
  /** within a mask, a filter, a blend or a clip that only a render can tell */
  veiled: boolean;
}

const isElement = (child: SvgNode | string): child is SvgNode => typeof child !== 'string';
const UNDRAWN = /^(defs|symbol|linearGradient|radialGradient|clipPath|mask|pattern|marker|filter)$/;

class Reader {
  readonly paintings: Painting[] = [];
  needsRender = false;
  private byId = new Map<string, SvgNode>();
  private unfollowed = new Set<SvgNode>();
  private readonly clips: ClipReader;
  readonly followed = new Set<SvgNode>();

  constructor(
    root: SvgNode,
    private readonly styles: Map<SvgNode, Style>,
    private readonly dividingLstar: number,
    private readonly toleranceMm: number,
  ) {
    this.clips = new ClipReader(this.byId, styles, toleranceMm);
    const visit = (node: SvgNode): void => {
      const { id } = node.attributes;
      if (id !== undefined && !this.byId.has(id)) this.byId.set(id, node);
      node.children.filter(isElement).forEach(visit);
    };
    visit(root);
  }

  read(node: SvgNode, around: Around): void {
    const own = this.styles.get(node) ?? {};
    if (own.display === 'none' || UNDRAWN.test(node.name)) return;
    const style = inherit(around.style, own);
    const opacity = around.opacity * opacityOf(own.opacity);
    const matrix = multiply(around.matrix, readTransform(node.attributes.transform));
    const here = this.veil(node, own, { ...around, style, opacity, matrix });
    if (SHAPES.has(node.name)) this.readShape(node, here);
    else if (node.name === 'use') this.readUse(node, here);
    else if (node.name === 'svg') this.readViewport(node, here, node);
    else if (node.name === 'switch') this.readSwitch(node, here);
    else if (node.name === 'g') node.children.filter(isElement).forEach((child) => this.read(child, here));
    else if (/^(text|image)$/.test(node.name) && style.visibility !== 'hidden') this.needsRender = true;
  }

  close(): void {
    for (const element of this.unfollowed) this.followed.delete(element);
  }

  private veil(node: SvgNode, own: Style, here: Around): Around {
    const set = (name: string): boolean =>
      own[name] !== undefined && !/^(none|normal|auto)$/.test(own[name].trim());
    if (set('mask') || set('filter') || set('mix-blend-mode')) return { ...here, veiled: true };
    if (!set('clip-path')) return here;
    const clip = this.clips.region(own['clip-path'], node, here);
    if (clip === null) return { ...here, veiled: true };
    return { ...here, clip: here.clip ? intersect(here.clip, clip) : clip };
  }

  private readUse(node: SvgNode, here: Around): void {
    const target = this.byId.get(node.attributes.href?.slice(1) ?? '');
    if (!target) return;
    const moved = { ...here, matrix: multiply(here.matrix, useOffset(node, here.viewport)) };
    if (target.name !== 'symbol' && target.name !== 'svg') {
      this.read(target, moved);
      return;
    }
    const own = this.styles.get(target) ?? {};
    if (own.display === 'none') return;
    const within = {
      ...moved,
      style: inherit(moved.style, own),
      opacity: moved.opacity * opacityOf(own.opacity),
    };
    this.readViewport(target, within, node);
  }

  /** Contents of a nested svg or of a symbol, whose size its user may set. */
  private readViewport(node: SvgNode, here: Around, sized: SvgNode): void {
    const { width, height } = { ...node.attributes, ...pickSize(sized) };
    const [wide, high] = [readLength(width, here.viewport, 'x'), readLength(height, here.viewport, 'y')];
    const [w, h] = [wide ?? here.viewport[0], high ?? here.viewport[1]];
    if (!(w > 0) || !(h > 0)) return;
    const offset = node.name === 'svg' ? useOffset(node, here.viewport) : IDENTITY;
    const placed = multiply(here.matrix, offset);
    const box = readViewBox(node.attributes.viewBox);
    const inner = box ? viewportMatrix(box, w, h, node.attributes.preserveAspectRatio ?? '') : null;
    const { overflow } = this.styles.get(node) ?? {};
    let { clip } = here;
    if (overflow !== 'visible' && overflow !== 'auto') {
      const frame = readPathData(`M0 0H${w}V${h}H0Z`, placed).map((curve) => flatten(curve, 1));
      clip = clip ? intersect(clip, frame) : regionOf(frame, 'nonzero');
    }
    const within: Around = {
      ...here,
      clip,
      matrix: inner ? multiply(placed, inner) : placed,
      viewport: box ? [box[2], box[3]] : [w, h],
    };
    node.children.filter(isElement).forEach((child) => this.read(child, within));
  }

  private readSwitch(node: SvgNode, here: Around): void {
    const chosen = node.children.filter(isElement).find(({ attributes }) => {
      const language = attributes.systemLanguage;
      return (
        attributes.requiredExtensions === undefined && (language === undefined || /\ben\b/.test(language))
      );
    });
    if (chosen) this.read(chosen, here);
  }

  private effect(paint: Paint, opacity: number): Painting['effect'] | 'none' {
    if (paint.kind === 'none' || opacity <= 0) return 'none';
    if (paint.kind === 'colour') {
      const [r, g, b, alpha] = paint.colour;
      return effectOf([r, g, b, alpha * opacity], this.dividingLstar);
    }
    return gradientEffect(paint.id, opacity, this.dividingLstar, this.byId, this.styles);
  }

  private readShape(node: SvgNode, here: Around): void {
    const { style, matrix, viewport } = here;
    if (style.visibility === 'hidden' || style.visibility === 'collapse') return;
    const ownCurves = readPathData(shapePath(node, viewport));
    if (ownCurves.length === 0) return;
    if (['marker', 'marker-start', 'marker-mid', 'marker-end'].some((name) => /url/.test(style[name] ?? '')))
      this.needsRender = true;
    const pen = readPen(style, viewport);
    const fill =
      node.name === 'line'
        ? 'none'
        : this.effect(readPaint(style.fill, style), here.opacity * opacityOf(style['fill-opacity']));
    const strokeOpacity = here.opacity * opacityOf(style['stroke-opacity']);
    const stroke =
      pen.width > 0 ? this.effect(readPaint(style.stroke ?? 'none', style), strokeOpacity) : 'none';
    const common = { element: node, clip: here.clip, ownCurves, matrix };
    const rule = style['fill-rule'] === 'evenodd' ? ('evenodd' as const) : ('nonzero' as const);
    if (here.veiled || fill === 'unknown' || stroke === 'unknown') this.needsRender = true;
    if (fill !== 'none') {
      const curves = ownCurves.map((curve): Curve => ({ ...transformCurve(curve, matrix), closed: true }));
      const effect = here.veiled ? 'unknown' : fill;
      this.paintings.push({
        ...common,
        kind: 'fill',
        effect,
        curves,
        rule,
        pen: null,
        underOwnStroke: stroke === 'ink' && !here.veiled,
      });
    }
    if (stroke === 'none') return;
    const effect = here.veiled ? 'unknown' : stroke;
    if (effect === 'ink') this.followed.add(node);
    else this.unfollowed.add(node);
    const dashes = readDashes(style, viewport);
    const drawn = dashes ? this.dashed(ownCurves, dashes, style, viewport, matrix) : ownCurves;
    const curves = drawn.map((curve) => transformCurve(curve, matrix));
    this.paintings.push({
      ...common,
      ownCurves: drawn,
      kind: 'stroke',
      effect,
      curves,
      rule,
      pen,
      underOwnStroke: false,
    });
  }

  private dashed(
    curves: readonly Curve[],
    dashes: number[],
    style: Style,
    viewport: Viewport,
    matrix: Matrix,
  ): Curve[] {
    const offset = readLength(style['stroke-dashoffset'], viewport, 'both') ?? 0;
    const tolerance =
      this.toleranceMm / Math.max(1e-9, Math.hypot(matrix[0], matrix[1]), Math.hypot(matrix[2], matrix[3]));
    return curves.flatMap((curve) => dash(flatten(curve, tolerance), curve.closed, dashes, offset));
  }
}

function pickSize({ attributes }: SvgNode): { width?: string; height?: string } {
  const { width, height } = attributes;
  return { ...(width !== undefined && { width }), ...(height !== undefined && { height }) };
}

/**
 * What a sanitised drawing paints, in order, in mm on the placed artwork: styles inherited, transforms applied, repetitions
 * written out, curves kept.
 * @param svg UTF-8 bytes of a sanitised SVG; unchanged
 * @param placed size in mm, and the lightness that parts ink from ground
 * @param toleranceMm farthest that a chord may lie from a curve where areas are worked out
 */
export function readDrawing(
  svg: Uint8Array,
  placed: { widthMm: number; heightMm: number; dividingLstar: number },
  toleranceMm: number,
): { drawing: Drawing; root: SvgNode; styles: Map<SvgNode, Style> } {
  const { root } = parseXml(new TextDecoder().decode(svg));
  const { styles } = resolveStyles(root);
  const { widthMm, heightMm, dividingLstar } = placed;
  const [left, top, width, height] = readRoot(svg).frame;
  const matrix: Matrix = [
    widthMm / width,
    0,
    0,
    heightMm / height,
    (-left * widthMm) / width,
    (-top * heightMm) / height,
  ];
  const reader = new Reader(root, styles, dividingLstar, toleranceMm);
  const around: Around = {
    matrix,
    style: INITIAL,
    opacity: 1,
    clip: null,
    viewport: [width, height],
    veiled: false,
  };
  for (const child of root.children) if (isElement(child)) reader.read(child, around);
  reader.close();
  const { paintings, needsRender, followed } = reader;
  return { drawing: { paintings, needsRender, followed, widthMm, heightMm }, root, styles };
}
