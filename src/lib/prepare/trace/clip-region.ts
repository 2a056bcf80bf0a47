import type { SvgNode } from '../svg/parse-xml';
import type { Style } from '../svg/resolve-styles';
import { SHAPES } from '../svg/vocabulary';
import { flatten, multiply, readPathData, readTransform, type Matrix } from './curve';
import { INITIAL, inherit } from './inherited';
import { boundsOf, intersect, regionOf, unite, type Region } from './region';
import { shapePath, useOffset, type Viewport } from './shape';

/** What a clip path is read within. */
export interface ClipAround {
  matrix: Matrix;
  style: Style;
  viewport: Viewport;
}

const isElement = (child: SvgNode | string): child is SvgNode => typeof child !== 'string';
const EVERYWHERE_MM = 1e6;
const EVERYWHERE: Region = [
  [
    [-EVERYWHERE_MM, -EVERYWHERE_MM],
    [EVERYWHERE_MM, -EVERYWHERE_MM],
    [EVERYWHERE_MM, EVERYWHERE_MM],
    [-EVERYWHERE_MM, EVERYWHERE_MM],
  ],
];

/** Areas that clip paths leave (CSS Masking Level 1, section 4), as far as they are made of shapes. */
export class ClipReader {
  constructor(
    private readonly byId: ReadonlyMap<string, SvgNode>,
    private readonly styles: ReadonlyMap<SvgNode, Style>,
    private readonly toleranceMm: number,
  ) {}

  /** Area of a clip path, mm; null where only a render can tell it. */
  region(value: string, node: SvgNode, here: ClipAround, depth = 0): Region | null {
    const id = /^\s*url\(\s*['"]?#([^)'"\s]+)['"]?\s*\)\s*$/.exec(value)?.[1];
    if (id === undefined || depth > 10) return null;
    const path = this.byId.get(id);
    // A clip path that is not there clips nothing, as the renderer has it.
    if (path?.name !== 'clipPath') return EVERYWHERE;
    const own = this.styles.get(path) ?? {};
    let matrix = multiply(here.matrix, readTransform(path.attributes.transform));
    if (path.attributes.clipPathUnits === 'objectBoundingBox') {
      if (!SHAPES.has(node.name)) return null;
      const [left, top, right, bottom] = boundsOf(
        readPathData(shapePath(node, here.viewport)).map((c) => flatten(c, 0.01)),
      );
      if (!(right > left) || !(bottom > top)) return null;
      matrix = multiply(matrix, [right - left, 0, 0, bottom - top, left, top]);
    }
    let region: Region = [];
    for (const child of path.children.filter(isElement)) {
      const part = this.part(child, { ...here, matrix, style: inherit(INITIAL, own) }, depth);
      if (part === null) return null;
      region = unite(region, part);
    }
    if (own['clip-path'] === undefined || own['clip-path'] === 'none') return region;
    const outer = this.region(own['clip-path'], node, here, depth + 1);
    return outer && intersect(region, outer);
  }

  private part(node: SvgNode, around: ClipAround, depth: number): Region | null {
    const own = this.styles.get(node) ?? {};
    if (own.display === 'none' || own.visibility === 'hidden') return [];
    let matrix = multiply(around.matrix, readTransform(node.attributes.transform));
    if (node.name === 'use') {
      const target = this.byId.get(node.attributes.href?.slice(1) ?? '');
      if (!target || depth > 10) return null;
      matrix = multiply(matrix, useOffset(node, around.viewport));
      return this.part(target, { ...around, matrix }, depth + 1);
    }
    if (!SHAPES.has(node.name)) return null;
    const rule = inherit(around.style, own)['clip-rule'] === 'evenodd' ? 'evenodd' : 'nonzero';
    const curves = readPathData(shapePath(node, around.viewport), matrix);
    const region = regionOf(
      curves.map((curve) => flatten(curve, this.toleranceMm)),
      rule,
    );
    if (own['clip-path'] === undefined || own['clip-path'] === 'none') return region;
    const further = this.region(own['clip-path'], node, { ...around, matrix }, depth + 1);
    return further && intersect(region, further);
  }
}
