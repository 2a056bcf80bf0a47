import type { FoundPlace } from './inspect-window';

/** How near two ends must lie to belong to one stroke that was cut by a seam, px. */
const MEET_PX = 3;

/**
 * Joins places that were cut apart where two windows meet.
 * Ends near a seam are sorted into a grid; places with ends within 3 px of each other become one.
 * @param places px of the whole artwork; their lists of ends are given up
 * @returns the same places, joined ones once
 */
export function mergeSeams(places: readonly FoundPlace[]): FoundPlace[] {
  const parent = places.map((_, n) => n);
  const root = (n: number): number => {
    while (parent[n] !== n) n = parent[n] = parent[parent[n]];
    return n;
  };
  const byCell = new Map<string, { x: number; y: number; place: number }[]>();
  places.forEach(({ ends }, place) => {
    for (let k = 0; k < ends.length; k += 2) {
      const [x, y] = [ends[k], ends[k + 1]];
      const [column, row] = [Math.floor(x / MEET_PX), Math.floor(y / MEET_PX)];
      for (let dy = -1; dy <= 1; dy++) {
        for (let dx = -1; dx <= 1; dx++) {
          for (const other of byCell.get(`${column + dx},${row + dy}`) ?? []) {
            if (Math.hypot(other.x - x, other.y - y) <= MEET_PX) parent[root(place)] = root(other.place);
          }
        }
      }
      const key = `${column},${row}`;
      const cell = byCell.get(key);
      if (cell) cell.push({ x, y, place });
      else byCell.set(key, [{ x, y, place }]);
    }
  });
  const joined = new Map<number, FoundPlace>();
  places.forEach((place, n) => {
    const whole = joined.get(root(n));
    if (!whole) joined.set(root(n), { ...place, ends: [] });
    else joinInto(whole, place);
  });
  return [...joined.values()];
}

function joinInto(whole: FoundPlace, place: FoundPlace): void {
  whole.left = Math.min(whole.left, place.left);
  whole.top = Math.min(whole.top, place.top);
  whole.right = Math.max(whole.right, place.right);
  whole.bottom = Math.max(whole.bottom, place.bottom);
  if (place.smallestPx < whole.smallestPx)
    [whole.smallestPx, whole.limitPx] = [place.smallestPx, place.limitPx];
  whole.worstRatio = Math.min(whole.worstRatio, place.worstRatio);
  whole.fading &&= place.fading;
  whole.soundScale = Math.max(whole.soundScale, place.soundScale);
}
