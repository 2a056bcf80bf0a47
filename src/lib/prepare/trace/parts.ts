import type { Point } from './curve';
import { boundsOf, EMPTY, signedArea, subtract, unite, type Region } from './region';

export type Bounds = readonly [left: number, top: number, right: number, bottom: number];

export const meet = (a: Bounds, b: Bounds): boolean =>
  a[0] < b[2] && b[0] < a[2] && a[1] < b[3] && b[1] < a[3];
export const within = (a: Bounds, b: Bounds): boolean =>
  a[0] >= b[0] && a[1] >= b[1] && a[2] <= b[2] && a[3] <= b[3];

/** A connected part of an area with the holes in it. */
export interface Part {
  region: Region;
  bounds: Bounds;
}

function holds(outline: readonly Point[], [x, y]: Point): boolean {
  let inside = false;
  for (let index = 0, before = outline.length - 1; index < outline.length; before = index, index += 1) {
    const [ax, ay] = outline[index];
    const [bx, by] = outline[before];
    if (ay > y !== by > y && x < ((bx - ax) * (y - ay)) / (by - ay) + ax) inside = !inside;
  }
  return inside;
}

/**
 * Connected parts of a region, each with its holes.
 * @param region as the operations on regions give it: outer outlines turn one way, holes the other; unchanged
 */
export function partsOf(region: Region): Part[] {
  const outlines = region.map((path) => ({
    path,
    area: signedArea(path),
    bounds: boundsOf([path]) as Bounds,
  }));
  // The largest outline of all cannot be a hole.
  const largest = outlines.reduce((most, { area }) => (Math.abs(area) > Math.abs(most) ? area : most), 0);
  const outer = outlines.filter(({ area }) => area * largest > 0);
  const parts = outer.map(({ path, bounds, area }) => ({ region: [path], bounds, size: Math.abs(area) }));
  for (const { path, bounds, area } of outlines) {
    if (area * largest > 0) continue;
    const homes = parts.filter((part) => within(bounds, part.bounds) && holds(part.region[0], path[0]));
    const home = homes.sort((a, b) => a.size - b.size)[0];
    home?.region.push(path);
  }
  return parts;
}

/** Corners and comparisons that building an area may take; beyond them a render is the quicker way to it. */
const MAX_EFFORT = 20_000_000;

/** An area that is built up and cut into, part by part, so that each change costs no more than what it touches. */
export class GrowingArea {
  private parts: Part[] = [];
  private effort = 0;

  /** Whether it has become too much work to go on exactly. */
  get isTooMuch(): boolean {
    return this.effort > MAX_EFFORT;
  }

  touches(bounds: Bounds): boolean {
    this.effort += this.parts.length;
    return this.parts.some((part) => meet(part.bounds, bounds));
  }

  add(area: Region): void {
    for (const part of partsOf(area)) {
      const touched = this.takeTouched(part.bounds);
      if (touched.length === 0) this.parts.push(part);
      else this.parts.push(...partsOf(touched.reduce((sum, { region }) => unite(sum, region), part.region)));
    }
  }

  cut(area: Region): void {
    for (const part of partsOf(area)) {
      for (const { region } of this.takeTouched(part.bounds))
        this.parts.push(...partsOf(subtract(region, part.region)));
    }
  }

  get region(): Region {
    return this.parts.length === 0 ? EMPTY : this.parts.flatMap(({ region }) => region);
  }

  private takeTouched(bounds: Bounds): Part[] {
    this.effort += this.parts.length;
    const touched: Part[] = [];
    this.parts = this.parts.filter((part) => {
      const apart = !meet(part.bounds, bounds);
      if (!apart) touched.push(part);
      return apart;
    });
    // A corner costs about as much as a few hundred comparisons.
    this.effort +=
      300 * touched.reduce((sum, { region }) => sum + region.reduce((n, path) => n + path.length, 0), 0);
    return touched;
  }
}
