import { createRequire } from 'node:module';
import { describe, expect, test } from 'vitest';
import { nodeTools } from '../../src/rendering/node-tools';

const require = createRequire(import.meta.url);
const tools = nodeTools();
const options = { smallestIslandPx: 0, cornerThreshold: 1, curveTolerancePx: 0.2 };

/** Luminance of a grid of . and #. */
function grey(rows: string[]): [Uint8Array, number, number] {
  return [Uint8Array.from(rows.join(''), (mark) => (mark === '#' ? 0 : 255)), rows[0].length, rows.length];
}
const subpaths = (data: string): number => data.split('M').length - 1;

describe('tracing', () => {
  test('a square keeps its corners', async () => {
    const data = await tools.traceGrey(
      ...grey(['......', '.####.', '.####.', '.####.', '.####.', '......']),
      {
        ...options,
        cornerThreshold: 0,
      },
    );
    expect(data).toMatch(/^M[-\d. L]+Z$/);
    for (const corner of ['1 1', '5 1', '5 5', '1 5']) expect(data).toContain(`L${corner}L`);
  });

  test('nothing dark gives nothing; 1 × 1 gives one path', async () => {
    expect(await tools.traceGrey(...grey(['...', '...']), options)).toBe('');
    expect(subpaths(await tools.traceGrey(...grey(['#']), options))).toBe(1);
    expect(subpaths(await tools.traceGrey(...grey(['##', '##']), options))).toBe(1);
  });

  test('a hole is a path of its own; islands and holes up to the limit are dropped', async () => {
    const ring = ['#####..', '#...#..', '#...#.#', '#...#..', '#####..'];
    expect(subpaths(await tools.traceGrey(...grey(ring), options))).toBe(3);
    expect(subpaths(await tools.traceGrey(...grey(ring), { ...options, smallestIslandPx: 1 }))).toBe(2);
    expect(subpaths(await tools.traceGrey(...grey(ring), { ...options, smallestIslandPx: 30 }))).toBe(0);
  });

  test('a wrong number of samples is a wrong call', async () => {
    await expect(tools.traceGrey(new Uint8Array(5), 2, 2, options)).rejects.toThrow(RangeError);
  });

  test('the quick first stage finds the very paths of the package’s own', async () => {
    const Potrace = require('potrace/lib/Potrace.js');
    const Bitmap = require('potrace/lib/types/Bitmap.js');
    const { decompose } = await import('../../src/tracing/decompose.mjs');
    let seed = 12345;
    const random = () => (seed = (seed * 1103515245 + 12345) % 2147483648) / 2147483648;
    for (const [width, height, share] of [
      [1, 1, 1],
      [31, 7, 0.5],
      [32, 9, 0.5],
      [33, 20, 0.3],
      [64, 64, 0.6],
      [100, 3, 0.5],
      [70, 80, 0.9],
    ]) {
      const bitmap = new Bitmap(width + 10, height + 10);
      // The package reads round the edges of a picture without a white margin, so it is given one.
      bitmap.data.forEach((_: number, index: number) => {
        const [column, row] = [index % bitmap.width, Math.floor(index / bitmap.width)];
        const inside = column >= 5 && row >= 5 && column < width + 5 && row < height + 5;
        bitmap.data[index] = inside && random() < share ? 0 : 255;
      });
      const tracer = new Potrace({ turdSize: 2, threshold: 127 });
      tracer._luminanceData = bitmap;
      tracer._bmToPathlist();
      const ours = [...decompose(bitmap.data, bitmap.width, bitmap.height, 127, 2)];
      const plain = (paths: { area: number; pt: { x: number; y: number }[] }[]) =>
        paths.map(({ area, pt }) => ({ area, pt: pt.map(({ x, y }) => [x, y]) }));
      expect(plain(ours)).toEqual(plain(tracer._pathlist));
    }
  });
});
