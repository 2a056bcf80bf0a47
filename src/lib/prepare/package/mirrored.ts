import { readPathData, writePathData } from '../trace/curve';
import type { Linework } from '../trace/linework';

/**
 * The same lines with left and right exchanged, in their coordinates: no transform that a later program could miss.
 * @param linework unchanged
 * @returns new lines within the same width and height
 * @example mirrored({ widthMm: 10, …, paths: ['M1 2L3 4'] }).paths // ['M9 2L7 4']
 */
export function mirrored(linework: Linework): Linework {
  const paths = linework.paths.flatMap((data) =>
    readPathData(data, [-1, 0, 0, 1, linework.widthMm, 0]).map(writePathData),
  );
  return { ...linework, paths };
}
