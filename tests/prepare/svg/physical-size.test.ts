import { describe, expect, test } from 'vitest';
import { lengthPx, physicalSize, readViewBox } from '../../../src/lib/prepare/svg/physical-size';

describe('lengthPx', () => {
  test.each([
    ['96', 96],
    ['96px', 96],
    ['1in', 96],
    ['25.4mm', 96],
    ['2.54cm', 96],
    ['101.6Q', 96],
    ['72pt', 96],
    ['6pc', 96],
    ['2em', 32],
    ['1e2', 100],
    ['.5in', 48],
    [' 10 px ', 10],
    ['+3', 3],
  ])('%s is %d px', (text, px) => expect(lengthPx(text)).toBeCloseTo(px, 9));

  test.each([undefined, '', '100%', 'auto', 'calc(1px)', '10 20', '10furlong'])('%s is no length', (text) =>
    expect(lengthPx(text)).toBe(null),
  );
});

describe('readViewBox', () => {
  test('commas and spaces part the numbers', () => {
    expect(readViewBox('0 0 10 20')).toEqual([0, 0, 10, 20]);
    expect(readViewBox('-1,-2,10,20')).toEqual([-1, -2, 10, 20]);
  });
  test('anything else is none', () => {
    expect(readViewBox(undefined)).toBe(null);
    expect(readViewBox('0 0 10')).toBe(null);
    expect(readViewBox('0 0 a b')).toBe(null);
  });
});

describe('physicalSize', () => {
  test('both sides with units', () => {
    const page = physicalSize({ width: '50mm', height: '1in' });
    expect(page.ownWidthMm).toBeCloseTo(50, 9);
    expect(page.ownHeightMm).toBe(25.4);
    expect(page.viewBox[2]).toBeCloseTo(188.976, 3);
  });

  test('no unit is px, 96 to the inch', () => {
    expect(physicalSize({ width: '96', height: '192' })).toMatchObject({
      ownWidthMm: 25.4,
      ownHeightMm: 50.8,
    });
  });

  test('one side follows from the other and the viewBox', () => {
    expect(physicalSize({ width: '50mm', viewBox: '0 0 100 40' }).ownHeightMm).toBeCloseTo(20, 9);
    expect(physicalSize({ height: '20mm', viewBox: '0 0 100 40' }).ownWidthMm).toBeCloseTo(50, 9);
  });

  test('a viewBox alone gives proportions and no size', () => {
    const page = physicalSize({ viewBox: '0 0 300 100' });
    expect(page).toMatchObject({ ownWidthMm: null, ownHeightMm: null, widthPx: 300, heightPx: 100 });
    expect(physicalSize({ width: '100%', height: '100%', viewBox: '0 0 300 100' }).ownWidthMm).toBe(null);
  });

  test.each([
    [undefined, [-50, 0, 200, 100]],
    ['xMidYMid meet', [-50, 0, 200, 100]],
    ['xMinYMid', [0, 0, 200, 100]],
    ['xMaxYMax meet', [-100, 0, 200, 100]],
    ['xMidYMid slice', [0, 25, 100, 50]],
    ['xMidYMin slice', [0, 0, 100, 50]],
    ['none', [0, 0, 100, 100]],
  ])('preserveAspectRatio %s frames a square in a page of 2:1', (preserveAspectRatio, frame) => {
    const attributes = { width: '200', height: '100', viewBox: '0 0 100 100' };
    const page = physicalSize(preserveAspectRatio ? { ...attributes, preserveAspectRatio } : attributes);
    expect(page.frame).toEqual(frame);
  });

  test.each([
    [{}, 'unknown-size'],
    [{ width: '10mm' }, 'unknown-size'],
    [{ width: '0', height: '10' }, 'unreadable'],
    [{ viewBox: '0 0 0 10' }, 'unreadable'],
    [{ viewBox: '0 0 1e9 1e9' }, 'unreadable'],
    [{ width: '200m', height: '1e9mm', viewBox: '0 0 1 1' }, 'unreadable'],
  ])('%o is refused', (attributes, code) => {
    expect(() => physicalSize(attributes as Record<string, string>)).toThrow(
      expect.objectContaining({ code }),
    );
  });
});
