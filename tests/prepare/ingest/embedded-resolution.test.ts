import { describe, expect, test } from 'vitest';
import { embeddedResolution } from '../../../src/lib/prepare/ingest/embedded-resolution';
import { tiffResolution } from '../../../src/lib/prepare/ingest/tiff-directory';

/** A TIFF directory with the three tags of a resolution, in either byte order. */
function directory(
  order: 'II' | 'MM',
  x: [number, number],
  y: [number, number] | null,
  unit: number,
): Uint8Array {
  const little = order === 'II';
  const file = new Uint8Array(80);
  const view = new DataView(file.buffer);
  file.set([order.charCodeAt(0), order.charCodeAt(1)]);
  view.setUint16(2, 42, little);
  view.setUint32(4, 8, little);
  view.setUint16(8, 3, little);
  const entry = (index: number, tag: number, type: number, value: number, short = false): void => {
    const at = 10 + 12 * index;
    view.setUint16(at, tag, little);
    view.setUint16(at + 2, type, little);
    view.setUint32(at + 4, 1, little);
    if (short) view.setUint16(at + 8, value, little);
    else view.setUint32(at + 8, value, little);
  };
  entry(0, 282, 5, 56);
  entry(1, y ? 283 : 999, 5, 64);
  entry(2, 296, 3, unit, true);
  [...x, ...(y ?? [0, 0])].forEach((value, i) => view.setUint32(56 + 4 * i, value, little));
  return file;
}

function png(unit: number, x: number, y: number): Uint8Array {
  const file = new Uint8Array(70);
  const view = new DataView(file.buffer);
  view.setUint32(8, 13);
  file.set(new TextEncoder().encode('IHDR'), 12);
  view.setUint32(33, 9);
  file.set(new TextEncoder().encode('pHYs'), 37);
  view.setUint32(41, x);
  view.setUint32(45, y);
  file[49] = unit;
  return file;
}

/** A JPEG's opening: JFIF density, and where asked an EXIF block after it. */
function jpeg(unit: number, density: number, exif?: Uint8Array): Uint8Array {
  const jfif = [
    0xff,
    0xe0,
    0,
    16,
    0x4a,
    0x46,
    0x49,
    0x46,
    0,
    1,
    2,
    unit,
    density >> 8,
    density & 255,
    density >> 8,
    density & 255,
    0,
    0,
  ];
  const block = exif ? [0xff, 0xe1, 0, exif.length + 8, 0x45, 0x78, 0x69, 0x66, 0, 0, ...exif] : [];
  return Uint8Array.from([0xff, 0xd8, ...jfif, ...block, 0xff, 0xda, 0, 2]);
}

describe('TIFF directory', () => {
  test.each(['II', 'MM'] as const)('%s: per inch and per centimetre', (order) => {
    expect(tiffResolution(directory(order, [508, 1], [254, 1], 2))).toEqual({ xPxPerMm: 20, yPxPerMm: 10 });
    expect(tiffResolution(directory(order, [1000, 3], [1000, 3], 3))?.xPxPerMm).toBeCloseTo(100 / 3, 9);
  });
  test('one axis alone counts for both', () => {
    expect(tiffResolution(directory('II', [508, 1], null, 2))).toEqual({ xPxPerMm: 20, yPxPerMm: 20 });
  });
  test('no unit, nothing over nothing, or rubbish is none', () => {
    expect(tiffResolution(directory('II', [508, 1], [508, 1], 1))).toBeNull();
    expect(tiffResolution(directory('II', [508, 0], [508, 0], 2))).toBeNull();
    expect(tiffResolution(new TextEncoder().encode('no directory'))).toBeNull();
    expect(tiffResolution(new Uint8Array(0))).toBeNull();
    expect(tiffResolution(directory('II', [508, 1], [508, 1], 2).subarray(0, 30))).toBeNull();
  });
});

describe('embedded resolution', () => {
  test('PNG in pixels per metre, X and Y apart', () => {
    expect(embeddedResolution('png', png(1, 20_000, 10_000))).toEqual({ xPxPerMm: 20, yPxPerMm: 10 });
    expect(embeddedResolution('png', png(0, 4, 3))).toBeNull();
  });
  test('JFIF per inch and per centimetre', () => {
    expect(embeddedResolution('jpeg', jpeg(1, 254))?.xPxPerMm).toBeCloseTo(10, 9);
    expect(embeddedResolution('jpeg', jpeg(2, 200))?.xPxPerMm).toBeCloseTo(20, 9);
    expect(embeddedResolution('jpeg', jpeg(0, 1))).toBeNull();
  });
  test('EXIF wins over JFIF’s placeholder', () => {
    expect(
      embeddedResolution('jpeg', jpeg(1, 72, directory('MM', [300, 1], [300, 1], 2)))?.xPxPerMm,
    ).toBeCloseTo(300 / 25.4, 9);
  });
  test('WebP and AVIF by their EXIF block, with or without its opening', () => {
    const block = directory('II', [508, 1], [508, 1], 2);
    const opened = Uint8Array.from([0x45, 0x78, 0x69, 0x66, 0, 0, ...block]);
    for (const exif of [block, opened])
      expect(embeddedResolution('webp', new Uint8Array(12), exif)?.xPxPerMm).toBe(20);
    expect(embeddedResolution('avif', new Uint8Array(12))).toBeNull();
  });
  test.each([1, 25.4, 72, 96])('%d to the inch is what programs write when nobody chose', (ppi) => {
    expect(
      embeddedResolution('tiff', directory('II', [Math.round(ppi * 10), 10], [Math.round(ppi * 10), 10], 2)),
    ).toBeNull();
  });
});
