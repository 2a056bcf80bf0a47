import { formatHex, lab65, lrgb, type Rgb } from 'culori';
import { expect } from 'vitest';
import { lstarOfLuminance, luminanceOfLstar } from '../../src/lib/imaging/cie-lightness';
import { LUMINANCE_WEIGHTS, linearOfHex, linearToSrgb, srgbToLinear } from '../../src/lib/imaging/srgb';
import { referenceCheck } from './check';
import { readTable } from './read-table';

const rgb = (r: number, g: number, b: number): Rgb => ({ mode: 'rgb', r: r / 255, g: g / 255, b: b / 255 });

referenceCheck(
  {
    what: 'relative luminance and L* of 28 grey code values',
    basis: 'computed',
    source: 'transfer function of IEC 61966-2-1 and L* of CIE 15, tabled in double precision',
    within: '1e-6',
  },
  () => {
    const rows = readTable('grey_sRGB_to_Lstar.csv');
    expect(rows).toHaveLength(28);
    for (const row of rows) {
      const luminance = srgbToLinear(Number(row.srgb8) / 255);
      expect(Math.abs(luminance - Number(row.Y))).toBeLessThan(1e-6);
      expect(Math.abs(lstarOfLuminance(luminance) - Number(row.Lstar))).toBeLessThan(1e-6);
    }
  },
);

referenceCheck(
  {
    what: 'L* in steps of 5 back to luminance and sRGB code value',
    basis: 'computed',
    source: 'inverse L* of CIE 15 and inverse transfer function of IEC 61966-2-1, tabled in double precision',
    within: '1e-6, 5e-5 of a code value',
  },
  () => {
    const rows = readTable('Lstar_to_sRGB.csv');
    expect(rows).toHaveLength(21);
    for (const row of rows) {
      const luminance = luminanceOfLstar(Number(row.Lstar));
      expect(Math.abs(luminance - Number(row.Y))).toBeLessThan(1e-6);
      expect(Math.abs(linearToSrgb(luminance) * 255 - Number(row.srgb8_exact))).toBeLessThan(5e-5);
    }
  },
);

referenceCheck(
  {
    what: '18 % reflectance is L* 49.496',
    basis: 'computed',
    source: 'formula of CIE 15, worked by hand',
    within: 'last printed digit',
  },
  () => expect(lstarOfLuminance(0.18)).toBeCloseTo(49.496, 3),
);

referenceCheck(
  {
    what: 'linear light of 512 colours and L* of 256 greys',
    basis: 'computed',
    source: 'culori 4.0.2',
    within: '1e-9',
  },
  () => {
    const levels = [0, 36, 73, 109, 146, 182, 219, 255];
    for (const r of levels) {
      for (const g of levels) {
        for (const b of levels) {
          const other = lrgb(rgb(r, g, b));
          const ours = linearOfHex(formatHex(rgb(r, g, b)));
          [other.r, other.g, other.b].forEach((value, index) => {
            expect(Math.abs(value - ours[index])).toBeLessThan(1e-9);
          });
        }
      }
    }
    for (let code = 0; code < 256; code++) {
      const ours = lstarOfLuminance(srgbToLinear(code / 255));
      expect(Math.abs(lab65(rgb(code, code, code)).l - ours)).toBeLessThan(1e-9);
    }
  },
);

referenceCheck(
  {
    what: 'shares of red, green and blue in luminance: 0.2126, 0.7152, 0.0722',
    basis: 'published',
    source: 'IEC 61966-2-1, D65',
  },
  () => {
    expect(LUMINANCE_WEIGHTS).toEqual({ red: 0.2126, green: 0.7152, blue: 0.0722 });
    expect(LUMINANCE_WEIGHTS.red + LUMINANCE_WEIGHTS.green + LUMINANCE_WEIGHTS.blue).toBeCloseTo(1, 12);
  },
);
