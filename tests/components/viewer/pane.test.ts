import { describe, expect, it } from 'vitest';
import { needsDetail, type PaneLayer } from '../../../src/components/viewer/Pane';

const plate = { widthMm: 100, heightMm: 60 };
const view = (pxPerMm: number) => ({ centreXMm: 50, centreYMm: 30, pxPerMm });

function layer(naturalWidth: number, xPitchMm: number, angleDeg = 0): PaneLayer {
  const detail = {
    url: '/file.png',
    widthPx: 1,
    heightPx: 1,
    xPitchMm,
    yPitchMm: xPitchMm,
    angleDeg,
    originXMm: 0,
    originYMm: 0,
  };
  const image = { image: { naturalWidth } as HTMLImageElement, failed: false };
  return {
    picture: { name: 'screened', url: '/picture.png', detail },
    image,
    detail: { image: null, failed: false },
    from: 0,
    to: 1,
  };
}

describe('needsDetail', () => {
  it('asks for the prepared raster once the screen shows more than its picture holds', () => {
    const large = layer(2400, 0.02);
    expect(needsDetail(large, view(20), plate, 1)).toBe(false);
    expect(needsDetail(large, view(30), plate, 1)).toBe(true);
    expect(needsDetail(large, view(15), plate, 2)).toBe(true);
  });
  it('does not where the picture already has every pixel of the raster', () => {
    expect(needsDetail(layer(1000, 0.1), view(640), plate, 1)).toBe(false);
  });
  it('asks for a turned raster as soon as its pixels can be told apart, however fine its upright picture', () => {
    const turned = layer(2400, 0.1, 30);
    expect(needsDetail(turned, view(9), plate, 1)).toBe(false);
    expect(needsDetail(turned, view(11), plate, 1)).toBe(true);
  });
  it('never does for a picture without one, or before the picture is there', () => {
    const plain = layer(1000, 0.01);
    expect(needsDetail({ ...plain, picture: { ...plain.picture, detail: null } }, view(640), plate, 1)).toBe(
      false,
    );
    expect(needsDetail({ ...plain, image: { image: null, failed: false } }, view(640), plate, 1)).toBe(false);
  });
});
