import { lengthPx } from '../svg/physical-size';
import type { SvgNode } from '../svg/parse-xml';
import type { Matrix } from './curve';

/** Width and height that percentages refer to, in user units. */
export type Viewport = readonly [width: number, height: number];

/** A length in user units; percentages of the width, the height, or the root mean square of both. */
export function readLength(
  text: string | undefined,
  viewport: Viewport,
  along: 'x' | 'y' | 'both',
): number | null {
  const percent = /^\s*([+-]?[\d.]+(?:e[+-]?\d+)?)%\s*$/i.exec(text ?? '');
  if (!percent) return lengthPx(text);
  const [width, height] = viewport;
  const whole =
    along === 'x' ? width : along === 'y' ? height : Math.sqrt((width * width + height * height) / 2);
  return (Number(percent[1]) / 100) * whole;
}

/** The shift of a `use` or nested `svg` by its x and y. */
export function useOffset({ attributes }: SvgNode, viewport: Viewport): Matrix {
  return [
    1,
    0,
    0,
    1,
    readLength(attributes.x, viewport, 'x') ?? 0,
    readLength(attributes.y, viewport, 'y') ?? 0,
  ];
}

function rectangle(x: number, y: number, w: number, h: number, rx: number, ry: number): string {
  if (!(w > 0) || !(h > 0)) return '';
  if (!(rx > 0) || !(ry > 0)) return `M${x} ${y}H${x + w}V${y + h}H${x}Z`;
  const [a, b] = [Math.min(rx, w / 2), Math.min(ry, h / 2)];
  const arc = (dx: number, dy: number): string => `a${a} ${b} 0 0 1 ${dx} ${dy}`;
  return `M${x + a} ${y}H${x + w - a}${arc(a, b)}V${y + h - b}${arc(-a, b)}H${x + a}${arc(-a, -b)}V${y + b}${arc(a, -b)}Z`;
}

function ellipse(cx: number, cy: number, rx: number, ry: number): string {
  if (!(rx > 0) || !(ry > 0)) return '';
  const arc = (x: number, y: number): string => `A${rx} ${ry} 0 0 1 ${x} ${y}`;
  return `M${cx + rx} ${cy}${arc(cx, cy + ry)}${arc(cx - rx, cy)}${arc(cx, cy - ry)}${arc(cx + rx, cy)}Z`;
}

function chain(points: string | undefined, close: boolean): string {
  const numbers = points?.match(/[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?/gi)?.map(Number) ?? [];
  if (numbers.length < 4) return '';
  const pairs = Array.from(
    { length: Math.floor(numbers.length / 2) },
    (_, n) => `${numbers[2 * n]} ${numbers[2 * n + 1]}`,
  );
  return `M${pairs.join('L')}${close ? 'Z' : ''}`;
}

/**
 * Path data of a basic shape in its own user units (SVG 2, chapter 10).
 * @param node a path, rect, circle, ellipse, line, polyline or polygon; unchanged
 * @returns empty where the shape draws nothing
 */
export function shapePath(node: SvgNode, viewport: Viewport): string {
  const { attributes } = node;
  const x = (name: string): number => readLength(attributes[name], viewport, 'x') ?? 0;
  const y = (name: string): number => readLength(attributes[name], viewport, 'y') ?? 0;
  switch (node.name) {
    case 'path':
      return attributes.d ?? '';
    case 'rect': {
      const rx = readLength(attributes.rx, viewport, 'x');
      const ry = readLength(attributes.ry, viewport, 'y');
      return rectangle(x('x'), y('y'), x('width'), y('height'), rx ?? ry ?? 0, ry ?? rx ?? 0);
    }
    case 'circle': {
      const r = readLength(attributes.r, viewport, 'both') ?? 0;
      return ellipse(x('cx'), y('cy'), r, r);
    }
    case 'ellipse': {
      const rx = readLength(attributes.rx, viewport, 'x');
      const ry = readLength(attributes.ry, viewport, 'y');
      return ellipse(x('cx'), y('cy'), rx ?? ry ?? 0, ry ?? rx ?? 0);
    }
    case 'line':
      return `M${x('x1')} ${y('y1')}L${x('x2')} ${y('y2')}`;
    case 'polyline':
      return chain(attributes.points, false);
    case 'polygon':
      return chain(attributes.points, true);
    default:
      return '';
  }
}
