import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  fitView,
  keepInFrame,
  nextIndex,
  pan,
  showPlace,
  toFrame,
  toPlate,
  wholePixelZoom,
  zoomAt,
  zoomLimits,
} from '../../../src/components/viewer/view';

const plate = { widthMm: 120, heightMm: 80 };
const frame = { widthPx: 832, heightPx: 432 };

describe('fitView', () => {
  it('shows the whole artwork with a margin', () => {
    const view = fitView(plate, frame);
    expect(view).toEqual({ centreXMm: 60, centreYMm: 40, pxPerMm: 5 });
    expect(toFrame(view, frame, 0, 0).yPx).toBeCloseTo(16);
  });
  it('copes with a frame that has no size yet', () => {
    expect(fitView(plate, { widthPx: 0, heightPx: 0 }).pxPerMm).toBeGreaterThan(0);
  });
});

describe('zoomAt', () => {
  const limits = zoomLimits(plate, frame, 0.1);
  it('reaches 64 px for one prepared pixel and half the fitted size', () => {
    expect(limits.most).toBe(640);
    expect(limits.least).toBe(2.5);
  });
  it('keeps the point under the pointer where it is', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 832, noNaN: true }),
        fc.double({ min: 0, max: 432, noNaN: true }),
        fc.double({ min: 0.2, max: 8, noNaN: true }),
        (xPx, yPx, factor) => {
          const before = fitView(plate, frame);
          const held = toPlate(before, frame, xPx, yPx);
          const after = zoomAt(before, frame, { xPx, yPx }, factor, limits);
          const back = toFrame(after, frame, held.xMm, held.yMm);
          expect(back.xPx).toBeCloseTo(xPx, 6);
          expect(back.yPx).toBeCloseTo(yPx, 6);
        },
      ),
    );
  });
  it('stops at the limits', () => {
    const near = zoomAt(fitView(plate, frame), frame, { xPx: 1, yPx: 1 }, 1e6, limits);
    expect(near.pxPerMm).toBe(640);
  });
});

describe('pan and keepInFrame', () => {
  it('moves the artwork with the hand', () => {
    expect(pan({ centreXMm: 60, centreYMm: 40, pxPerMm: 10 }, 50, -20)).toMatchObject({
      centreXMm: 55,
      centreYMm: 42,
    });
  });
  it('centres what is smaller than the frame and leaves no gap beside what is larger', () => {
    const small = keepInFrame({ centreXMm: 3, centreYMm: 70, pxPerMm: 2 }, plate, frame);
    expect(small).toMatchObject({ centreXMm: 60, centreYMm: 40 });
    const large = keepInFrame({ centreXMm: -5, centreYMm: 500, pxPerMm: 20 }, plate, frame);
    expect(toFrame(large, frame, 0, 0).xPx).toBeCloseTo(0);
    expect(toFrame(large, frame, 120, 80).yPx).toBeCloseTo(frame.heightPx);
  });
});

describe('wholePixelZoom', () => {
  it('gives every prepared pixel the same whole number of screen pixels', () => {
    expect(wholePixelZoom(0.1, 12, 2) * 0.1 * 2).toBeCloseTo(12);
    expect(wholePixelZoom(0.11, 1, 1) * 0.11).toBeCloseTo(1);
  });
});

describe('showPlace', () => {
  const limits = zoomLimits(plate, frame, 0.1);
  it('brings the place to the centre and closer', () => {
    const view = showPlace(
      fitView(plate, frame),
      frame,
      { xMm: 10, yMm: 20, widthMm: 0.05, heightMm: 0.05 },
      limits,
      0.1,
    );
    expect(view).toMatchObject({ centreXMm: 10, centreYMm: 20 });
    expect(view.pxPerMm).toBe(90);
  });
  it('does not go further away', () => {
    const near = { centreXMm: 1, centreYMm: 1, pxPerMm: 500 };
    expect(
      showPlace(near, frame, { xMm: 60, yMm: 40, widthMm: 100, heightMm: 60 }, limits, 0.1).pxPerMm,
    ).toBe(500);
  });
});

describe('nextIndex', () => {
  it('goes round and copes with none', () => {
    expect(nextIndex(null, 0)).toBeNull();
    expect(nextIndex(null, 3)).toBe(0);
    expect(nextIndex(2, 3)).toBe(0);
    expect(nextIndex(0, 3)).toBe(1);
  });
});
