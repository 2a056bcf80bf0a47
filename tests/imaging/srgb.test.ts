import { describe, expect, test } from 'vitest';
import { lstarOfLuminance, luminanceOfLstar } from '../../src/lib/imaging/cie-lightness';
import {
  codeValues,
  linearOfHex,
  linearToSrgb,
  linearValues,
  srgbToLinear,
} from '../../src/lib/imaging/srgb';

describe('sRGB', () => {
  test('there and back', () => {
    for (let code = 0; code <= 255; code++)
      expect(linearToSrgb(srgbToLinear(code / 255))).toBeCloseTo(code / 255, 9);
  });
  test('half the light is code 187.516', () => expect(255 * linearToSrgb(0.5)).toBeCloseTo(187.516, 3));
  test('the tables hold the same values and are made once', () => {
    expect(codeValues()[32_768]).toBeCloseTo(linearToSrgb(32_768 / 65_535), 6);
    expect(linearValues()[32_768]).toBeCloseTo(srgbToLinear(32_768 / 65_535), 6);
    expect([codeValues()[0], codeValues()[65_535]]).toEqual([0, 1]);
    expect(codeValues()).toBe(codeValues());
    expect(linearValues()).toBe(linearValues());
  });
  test('colours as text', () => {
    expect(linearOfHex('#ffffff')).toEqual([1, 1, 1]);
    expect(linearOfHex('#800000')[0]).toBeCloseTo(srgbToLinear(128 / 255), 12);
    expect(() => linearOfHex('white')).toThrow(RangeError);
    expect(() => linearOfHex('#fff')).toThrow(RangeError);
  });
});

describe('CIE lightness', () => {
  test('there and back, also on the straight piece', () => {
    for (let lstar = 0; lstar <= 100; lstar += 0.5)
      expect(lstarOfLuminance(luminanceOfLstar(lstar))).toBeCloseTo(lstar, 9);
  });
  test('18 % reflectance is L* 49.496', () => expect(lstarOfLuminance(0.18)).toBeCloseTo(49.496, 3));
  test('refuses what is no lightness', () => {
    expect(() => lstarOfLuminance(-0.1)).toThrow(RangeError);
    expect(() => luminanceOfLstar(101)).toThrow(RangeError);
    expect(() => luminanceOfLstar(NaN)).toThrow(RangeError);
  });
});
