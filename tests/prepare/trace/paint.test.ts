import { describe, expect, test } from 'vitest';
import { effectOf, readColour } from '../../../src/lib/prepare/trace/paint';

describe('readColour', () => {
  test.each([
    ['#f00', [1, 0, 0, 1]],
    ['#ff000080', [1, 0, 0, 128 / 255]],
    ['#0008', [0, 0, 0, 136 / 255]],
    ['rgb(255, 0, 0)', [1, 0, 0, 1]],
    ['rgba(255,0,0,.5)', [1, 0, 0, 0.5]],
    ['rgb(50% 0% 0% / 50%)', [0.5, 0, 0, 0.5]],
    ['hsl(120, 100%, 50%)', [0, 1, 0, 1]],
    ['hsl(0 0% 50%)', [0.5, 0.5, 0.5, 1]],
    ['Navy', [0, 0, 128 / 255, 1]],
    ['rebeccapurple', [0.4, 0.2, 0.6, 1]],
    ['transparent', [0, 0, 0, 0]],
  ])('%s', (text, colour) =>
    readColour(text)!.forEach((value, n) => expect(value).toBeCloseTo(colour[n], 6)),
  );

  test.each(['', 'nocolour', '#12', '#12345', 'rgb(1,2)', 'url(#a)'])('%s is none', (text) =>
    expect(readColour(text)).toBe(null),
  );
});

describe('effectOf', () => {
  test('dark is ink, light hides, a veil does neither', () => {
    expect(effectOf([0, 0, 0, 1], 53.4)).toBe('ink');
    expect(effectOf([1, 1, 1, 1], 53.4)).toBe('light');
    expect(effectOf([0, 0, 0, 0], 53.4)).toBe('none');
    expect(effectOf([0, 0, 0, 0.3], 53.4)).toBe('none');
    expect(effectOf([1, 1, 1, 0.3], 53.4)).toBe('none');
    expect(effectOf([1, 1, 1, 0.9], 53.4)).toBe('light');
  });

  test('the dividing level decides: sRGB 127 and 128 stand on two sides of 53.4', () => {
    expect(effectOf([127 / 255, 127 / 255, 127 / 255, 1], 53.4)).toBe('ink');
    expect(effectOf([128 / 255, 128 / 255, 128 / 255, 1], 53.4)).toBe('light');
    expect(effectOf([128 / 255, 128 / 255, 128 / 255, 1], 60)).toBe('ink');
  });
});
