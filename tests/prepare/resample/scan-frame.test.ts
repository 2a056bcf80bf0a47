import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { perpendicularScan, scanFrame } from '../../../src/lib/prepare/resample/scan-frame';

const scan = (directionDeg: number, linePitchMm: number, alongPitchMm = linePitchMm) => ({
  directionDeg,
  linePitchMm,
  alongPitchMm,
});

describe('scan frame', () => {
  test('300 × 200 mm at 0.06 mm', () => {
    expect(scanFrame(300, 200, scan(0, 0.06))).toMatchObject({
      columns: 5000,
      rows: 3333,
      linesAre: 'rows',
      angleDeg: 0,
    });
  });

  test.each([0, 180, -180])('at %i° every row is a scan line', (deg) => {
    const frame = scanFrame(30, 20, scan(deg, 0.1, 0.05));
    expect(frame).toMatchObject({ columns: 600, rows: 200, pitchXMm: 0.05, pitchYMm: 0.1, linesAre: 'rows' });
  });

  test.each([90, -90])('at %i° every column is a scan line', (deg) => {
    const frame = scanFrame(30, 20, scan(deg, 0.1, 0.05));
    expect(frame).toMatchObject({
      columns: 300,
      rows: 400,
      pitchXMm: 0.1,
      pitchYMm: 0.05,
      linesAre: 'columns',
    });
  });

  test.each([
    [10, 0.3, 33],
    [0.3, 0.1, 3],
    [1, 2, 1],
    [0.15, 0.1, 1],
  ])('%d mm at %d mm has %i lines', (extent, pitch, lines) =>
    expect(scanFrame(extent, extent, scan(0, pitch)).rows).toBe(lines),
  );

  test('at 45° the file holds the whole square', () => {
    const frame = scanFrame(10, 10, scan(45, 0.1));
    expect(frame.widthMm).toBeCloseTo(14.142, 3);
    expect([frame.columns, frame.rows]).toEqual([141, 141]);
    expect(frame.origin.xMm).toBeCloseTo(5, 9);
    expect(frame.origin.yMm).toBeCloseTo(-5, 9);
    expect(frame.outline[1].xMm).toBeCloseTo(15, 9);
    expect(frame.outline[1].yMm).toBeCloseTo(5, 9);
  });

  test('holds every corner of the artwork, whatever the angle', () => {
    const side = fc.double({ min: 1, max: 300, noNaN: true });
    fc.assert(
      fc.property(side, side, fc.double({ min: -180, max: 180, noNaN: true }), (width, height, deg) => {
        const frame = scanFrame(width, height, scan(deg, 0.2));
        const a = (frame.angleDeg * Math.PI) / 180;
        for (const [x, y] of [
          [0, 0],
          [width, 0],
          [0, height],
          [width, height],
        ]) {
          const [dx, dy] = [x - frame.origin.xMm, y - frame.origin.yMm];
          const [u, v] = [dx * Math.cos(a) + dy * Math.sin(a), dy * Math.cos(a) - dx * Math.sin(a)];
          expect(u).toBeGreaterThan(-1e-6);
          expect(u).toBeLessThan(frame.widthMm + 1e-6);
          expect(v).toBeGreaterThan(-1e-6);
          expect(v).toBeLessThan(frame.heightMm + 1e-6);
        }
      }),
    );
  });

  test('a perpendicular pass turns by 90° and stays within half a turn', () => {
    const pitches = { linePitchMm: 0.07, alongPitchMm: 0.08 };
    expect(perpendicularScan(0, pitches)).toEqual({ directionDeg: 90, ...pitches });
    expect(perpendicularScan(150, pitches).directionDeg).toBe(-120);
    expect(perpendicularScan(-180, pitches).directionDeg).toBe(-90);
  });

  test('refuses nothing to scan', () => expect(() => scanFrame(0, 10, scan(0, 0.1))).toThrow(RangeError));
});
