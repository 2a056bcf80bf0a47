import type { SvgNode } from '../svg/parse-xml';
import type { Style } from '../svg/resolve-styles';
import { opacityOf } from './inherited';
import { effectOf, readColour, type Effect } from './paint';

const MAX_CHAIN = 20;

/**
 * Effect of a gradient: that of its stops where all do the same, else unknown.
 * @param id of the gradient
 * @param opacity multiplied in
 * @param dividingLstar L* that parts burned from unburned
 * @param byId elements of the drawing; a gradient may take its stops from another
 * @param styles properties of the stops
 * @returns unknown for patterns, for what is not there and for stops that differ
 */
export function gradientEffect(
  id: string,
  opacity: number,
  dividingLstar: number,
  byId: ReadonlyMap<string, SvgNode>,
  styles: ReadonlyMap<SvgNode, Style>,
  depth = 0,
): Effect | 'unknown' {
  const server = byId.get(id);
  if (!server || !/Gradient$/.test(server.name) || depth > MAX_CHAIN) return 'unknown';
  const stops = server.children
    .filter((child) => typeof child !== 'string')
    .filter(({ name }) => name === 'stop');
  if (stops.length === 0) {
    const next = server.attributes.href?.slice(1);
    return next === undefined
      ? 'unknown'
      : gradientEffect(next, opacity, dividingLstar, byId, styles, depth + 1);
  }
  const effects = new Set<Effect>(
    stops.map((stop) => {
      const style = styles.get(stop) ?? {};
      const [r, g, b, alpha] = readColour(style['stop-color'] ?? 'black') ?? [0, 0, 0, 1];
      return effectOf([r, g, b, alpha * opacityOf(style['stop-opacity']) * opacity], dividingLstar);
    }),
  );
  return effects.size === 1 ? [...effects][0] : 'unknown';
}
