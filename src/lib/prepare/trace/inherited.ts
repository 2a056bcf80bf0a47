import type { Style } from '../svg/resolve-styles';
import { readColour, type Colour } from './paint';
import { readLength, type Viewport } from './shape';
import type { Pen } from './region';

/** Properties that elements take over from their parents (SVG 2, appendix F), as far as they decide where lines run. */
const INHERITED = [
  'fill',
  'fill-rule',
  'fill-opacity',
  'stroke',
  'stroke-width',
  'stroke-opacity',
  'stroke-linecap',
  'stroke-linejoin',
  'stroke-miterlimit',
  'stroke-dasharray',
  'stroke-dashoffset',
  'color',
  'visibility',
  'clip-rule',
  'marker',
  'marker-start',
  'marker-mid',
  'marker-end',
] as const;

export const INITIAL: Style = { fill: 'black', stroke: 'none', 'stroke-width': '1', color: 'black' };

/** An element's properties with those of its parent beneath. */
export function inherit(parent: Style, own: Style): Style {
  const style: Style = {};
  for (const name of INHERITED) if (parent[name] !== undefined) style[name] = parent[name];
  for (const [name, value] of Object.entries(own)) if (value !== 'inherit') style[name] = value;
  if (own.color === 'currentColor') style.color = parent.color ?? 'black';
  return style;
}

/** Opacity 0–1 of a property's text: a number or a percentage, held within the range; 1 where it cannot be read. */
export function opacityOf(text: string | undefined): number {
  const value = Number.parseFloat(text ?? '1');
  if (!Number.isFinite(value)) return 1;
  return Math.min(1, Math.max(0, text?.trim().endsWith('%') ? value / 100 : value));
}

/** A paint: none, a colour, or the id of a gradient or pattern. */
export type Paint = { kind: 'none' } | { kind: 'colour'; colour: Colour } | { kind: 'server'; id: string };

/** The paint that a fill or stroke asks for; `style` gives the current colour. Black where it cannot be read. */
export function readPaint(text: string | undefined, style: Style): Paint {
  const value = (text ?? 'none').trim();
  if (value === 'none') return { kind: 'none' };
  const server = /^url\(\s*['"]?#([^)'"\s]+)['"]?\s*\)/.exec(value);
  if (server) return { kind: 'server', id: server[1] };
  const colour = /^currentcolor$/i.test(value) ? readColour(style.color ?? 'black') : readColour(value);
  // What cannot be read paints as if it had not been said; black is the safer reading of a mark.
  return { kind: 'colour', colour: colour ?? [0, 0, 0, 1] };
}

const CAPS = { butt: 'butt', round: 'round', square: 'square' } as const;
const JOINS = { miter: 'miter', round: 'round', bevel: 'bevel' } as const;

/** Width in user units, cap, join and mitre limit of a stroke; the defaults of SVG 2, section 13.5, where unsaid. */
export function readPen(style: Style, viewport: Viewport): Pen {
  return {
    width: Math.max(0, readLength(style['stroke-width'], viewport, 'both') ?? 1),
    cap: CAPS[style['stroke-linecap'] as keyof typeof CAPS] ?? 'butt',
    join: JOINS[style['stroke-linejoin'] as keyof typeof JOINS] ?? 'miter',
    miterLimit: Number.parseFloat(style['stroke-miterlimit'] ?? '4') || 4,
  };
}

/** Dashes and gaps in user units, an even number of them; null for an unbroken line. */
export function readDashes(style: Style, viewport: Viewport): number[] | null {
  const text = style['stroke-dasharray'];
  if (!text || text.trim() === 'none') return null;
  const lengths = text
    .trim()
    .split(/[\s,]+/)
    .map((part) => readLength(part, viewport, 'both'));
  if (lengths.some((length) => length === null || length < 0)) return null;
  const dashes = lengths as number[];
  if (dashes.reduce((sum, length) => sum + length, 0) <= 0) return null;
  return dashes.length % 2 === 0 ? dashes : [...dashes, ...dashes];
}
