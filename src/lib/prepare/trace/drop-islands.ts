/** What was left out of a mask. */
export interface Dropped {
  /** dark parts that became ground */
  islands: number;
  /** holes that became dark */
  holes: number;
}

/**
 * Takes parts of up to a number of pixels out of a mask: dark islands (joined over corners too) and light holes (joined over
 * edges), which is how dark parts hold together.
 * @param mask 1 dark, 0 light, row-major; changed in place
 * @param width columns
 * @param height rows
 * @param limit largest part that is taken out, px; 0 takes out nothing
 * @returns how many parts were taken out
 */
export function dropIslands(mask: Uint8Array, width: number, height: number, limit: number): Dropped {
  const dropped: Dropped = { islands: 0, holes: 0 };
  if (limit < 1) return dropped;
  const seen = new Uint8Array(mask.length);
  const queue = new Int32Array(mask.length);
  const grow = (start: number, value: number): number => {
    let [head, tail] = [0, 1];
    queue[0] = start;
    seen[start] = 1;
    const visit = (at: number): void => {
      if (seen[at] === 0 && mask[at] === value) {
        seen[at] = 1;
        queue[tail++] = at;
      }
    };
    while (head < tail) {
      const at = queue[head++];
      const column = at % width;
      const [left, right, up, down] = [column > 0, column < width - 1, at >= width, at < mask.length - width];
      if (left) visit(at - 1);
      if (right) visit(at + 1);
      if (up) visit(at - width);
      if (down) visit(at + width);
      if (value === 0) continue;
      if (left && up) visit(at - width - 1);
      if (right && up) visit(at - width + 1);
      if (left && down) visit(at + width - 1);
      if (right && down) visit(at + width + 1);
    }
    return tail;
  };
  for (const value of [1, 0]) {
    seen.fill(0);
    for (let start = 0; start < mask.length; start += 1) {
      if (mask[start] !== value || seen[start] === 1) continue;
      const size = grow(start, value);
      if (size > limit || size === mask.length) continue;
      for (let index = 0; index < size; index += 1) mask[queue[index]] = 1 - value;
      if (value === 1) dropped.islands += 1;
      else dropped.holes += 1;
    }
  }
  return dropped;
}
