import { describe, expect, test } from 'vitest';
import { luminanceOfLstar } from '../../../src/lib/imaging/cie-lightness';
import { toneSchema, type StockTone } from '../../../src/lib/prepare/settings';
import { burnTable, untouchedLuminance } from '../../../src/lib/prepare/tone/burn-table';
import { toner } from '../../../src/lib/prepare/tone/tone';

const absolute = toneSchema.parse({});
const scaled = toneSchema.parse({ mode: 'scaled' });
const colours = { groundColour: '#c9a46b', markColour: '#3b2716' };
const beech: StockTone = { name: 'beech', direction: 'darkens', groundLstar: 76, markLstar: 28, ...colours };
const slate: StockTone = { name: 'slate', direction: 'lightens', groundLstar: 30, markLstar: 70, ...colours };
const at = (table: Float32Array, luminance: number): number => table[Math.round(luminance * 65_535)];
const halftone = (tone = absolute, stock: StockTone | null = null): Float32Array =>
  burnTable({ treatment: 'halftone', tone, stock });

describe('no stock', () => {
  test('coverage is 1 − relative luminance', () => {
    for (const y of [0, 0.18, 0.5, 1]) expect(at(halftone(), y)).toBeCloseTo(1 - y, 4);
    expect(halftone()).toHaveLength(65_536);
  });

  test('black and white point', () => {
    const table = halftone(toneSchema.parse({ blackPoint: 0.1, whitePoint: 0.6 }));
    expect([at(table, 0.05), at(table, 0.1), at(table, 0.6), at(table, 0.9)]).toEqual(
      [1, 1, 0, 0].map((v) => expect.closeTo(v, 4)),
    );
    expect(at(table, 0.35)).toBeCloseTo(0.5, 4);
  });

  test('gamma above 1 darkens', () => {
    expect(at(halftone(toneSchema.parse({ gamma: 2 })), 0.5)).toBeCloseTo(0.75, 4);
    expect(at(halftone(toneSchema.parse({ gamma: 0.5 })), 0.25)).toBeCloseTo(0.5, 4);
  });

  test('a white point at or under the black point is refused', () => {
    expect(() => halftone({ ...absolute, blackPoint: 0.5, whitePoint: 0.5 })).toThrow(/white point/);
  });

  test('continuous tone asks for the same burn', () => {
    expect(burnTable({ treatment: 'continuous', tone: absolute, stock: null })).toEqual(halftone());
  });
});

describe('a stock that darkens', () => {
  test('ground asks for nothing, full mark for all, beyond is clipped', () => {
    const table = halftone(absolute, beech);
    expect(at(table, luminanceOfLstar(76))).toBeCloseTo(0, 3);
    expect(at(table, luminanceOfLstar(28))).toBeCloseTo(1, 3);
    expect([at(table, 1), at(table, 0)]).toEqual([0, 1]);
  });

  test('between them reflectance mixes: c = (Yg − Y) ÷ (Yg − Ym)', () => {
    const [ground, mark] = [luminanceOfLstar(76), luminanceOfLstar(28)];
    const asked = luminanceOfLstar(55);
    const c = at(halftone(absolute, beech), asked);
    expect(c * mark + (1 - c) * ground).toBeCloseTo(asked, 3);
  });

  test('scaled brings white to the ground and black to the full mark', () => {
    const table = halftone(scaled, beech);
    for (const y of [0, 0.3, 1]) expect(at(table, y)).toBeCloseTo(1 - y, 4);
  });
});

describe('a stock that lightens', () => {
  test('light parts burn', () => {
    const table = halftone(absolute, slate);
    expect([at(table, 0), at(table, 1)]).toEqual([0, 1]);
    expect(at(table, luminanceOfLstar(70))).toBeCloseTo(1, 3);
    for (const y of [0, 0.3, 1]) expect(at(halftone(scaled, slate), y)).toBeCloseTo(y, 4);
  });

  test('black lies outside it, white outside all others', () => {
    expect(untouchedLuminance({ treatment: 'halftone', stock: slate })).toBe(0);
    expect(untouchedLuminance({ treatment: 'solid', stock: slate })).toBe(65_535);
    expect(untouchedLuminance({ treatment: 'halftone', stock: beech })).toBe(65_535);
    expect(untouchedLuminance({ treatment: 'continuous', stock: null })).toBe(65_535);
  });

  test('a mark on the wrong side of its ground is refused', () => {
    expect(() => halftone(absolute, { ...beech, markLstar: 80 })).toThrow(RangeError);
    expect(() => halftone(absolute, { ...slate, markLstar: 30 })).toThrow(RangeError);
  });
});

describe('linework and solid', () => {
  test('coverage is 1 − code value, whatever tone and stock say', () => {
    const table = burnTable({ treatment: 'solid', tone: scaled, stock: slate });
    expect(table[0]).toBe(1);
    expect(table[65_535]).toBe(0);
    expect(at(table, 0.2158605)).toBeCloseTo(1 - 128 / 255, 4);
  });
});

test('toner looks every sample up and keeps the shape', () => {
  const lightness = {
    kind: 'lightness',
    width: 3,
    height: 1,
    data: Uint16Array.of(0, 32_768, 65_535),
    pitchXMm: 0.1,
    pitchYMm: 0.2,
  } as const;
  const burn = toner(halftone())(lightness);
  expect(burn).toMatchObject({ kind: 'burn', width: 3, height: 1, pitchXMm: 0.1, pitchYMm: 0.2 });
  expect([...burn.data]).toEqual([1, 0.5, 0].map((v) => expect.closeTo(v, 4)));
});
