import { expect } from 'vitest';
import { lineExtent, sizeAcross, spotArea, type Spot } from '../../src/lib/machines/spot';
import { referenceCheck } from './check';

const rectangle: Spot = { widthMm: 0.06, heightMm: 0.08, shape: 'rectangle' };
const ellipse: Spot = { ...rectangle, shape: 'ellipse' };
const STEPS = 200_000;

/** Widest extent of a drawn outline across a direction: the outline is walked point by point and projected. */
function drawnExtent(spot: Spot, directionDeg: number): number {
  const a = (directionDeg * Math.PI) / 180;
  let widest = 0;
  for (let i = 0; i < STEPS; i++) {
    const t = (2 * Math.PI * i) / STEPS;
    const [x, y] =
      spot.shape === 'ellipse'
        ? [(spot.widthMm / 2) * Math.cos(t), (spot.heightMm / 2) * Math.sin(t)]
        : [(spot.widthMm / 2) * Math.sign(Math.cos(t)), (spot.heightMm / 2) * Math.sign(Math.sin(t))];
    widest = Math.max(widest, Math.abs(-x * Math.sin(a) + y * Math.cos(a)));
  }
  return 2 * widest;
}

referenceCheck(
  {
    what: 'size across at 45° of a 0.06 × 0.08 mm spot is 0.0707 mm for both shapes',
    basis: 'computed',
    source: 'second moment of the spot across the direction, worked by hand',
    within: 'last printed digit',
  },
  () => {
    expect(sizeAcross(rectangle, 45)).toBeCloseTo(0.0707, 4);
    expect(sizeAcross(ellipse, 45)).toBeCloseTo(0.0707, 4);
  },
);

referenceCheck(
  {
    what: 'swept extent of that rectangle at 45° is 0.0990 mm',
    basis: 'computed',
    source: 'projection of the corners, worked by hand',
    within: 'last printed digit',
  },
  () => expect(lineExtent(rectangle, 45)).toBeCloseTo(0.099, 4),
);

referenceCheck(
  {
    what: 'line extent at 24 angles for ellipse and rectangle, 1:1 to 2:1',
    basis: 'computed',
    source: 'outline drawn with 200,000 points and projected, in the test',
    within: '1e-9 mm',
  },
  () => {
    const sides = [
      [0.07, 0.11],
      [0.1, 0.1],
      [0.05, 0.1],
    ];
    for (const [widthMm, heightMm] of sides) {
      for (const shape of ['ellipse', 'rectangle'] as const) {
        for (let deg = 0; deg < 360; deg += 15) {
          const spot: Spot = { widthMm, heightMm, shape };
          expect(Math.abs(lineExtent(spot, deg) - drawnExtent(spot, deg))).toBeLessThan(1e-9);
        }
      }
    }
  },
);

referenceCheck(
  {
    what: 'pitch equals the spot’s height at 0° and its width at 90°',
    basis: 'common practice',
    source: 'the best pitch lies close to the spot size across the lines; workshop experience',
  },
  () => {
    expect(sizeAcross(ellipse, 0)).toBe(0.08);
    expect(sizeAcross(ellipse, 90)).toBeCloseTo(0.06, 12);
    expect(spotArea(rectangle)).toBeCloseTo(0.0048, 12);
  },
);
