import { describe, expect, it } from 'vitest';
import { visiblePart } from '../../../src/components/viewer/draw';
import { chooseTwo, picturesOf } from '../../../src/components/viewer/pictures';
import { PASSAGE } from '../../../src/lib/prepare/report';
import { preparation } from '../order-fixtures';

describe('picturesOf', () => {
  it('is only what was sent while nothing is prepared', () => {
    expect(picturesOf(null, '/sent.png').map((p) => p.name)).toEqual(['sent']);
    expect(picturesOf(null, null)).toEqual([]);
  });
  it('has the five of the passage, and the prepared raster itself behind the screened one', () => {
    const pictures = picturesOf(preparation, '/sent.png');
    expect(pictures.map((p) => p.name)).toEqual([...PASSAGE]);
    expect(pictures.filter((p) => p.detail !== null).map((p) => p.name)).toEqual(['screened']);
    expect(pictures[3].detail).toMatchObject({ widthPx: 818, heightPx: 545, angleDeg: 0 });
    expect(pictures[3].detail?.xPitchMm).toBeCloseTo(0.11, 3);
  });
});

describe('chooseTwo', () => {
  const all = [...PASSAGE];
  it('lets a third take the place of the one chosen first', () => {
    expect(chooseTwo(['sent', 'burned'], 'toned', all)).toEqual(['burned', 'toned']);
  });
  it('takes one away, but never the last', () => {
    expect(chooseTwo(['sent', 'burned'], 'sent', all)).toEqual(['burned']);
    expect(chooseTwo(['burned'], 'burned', all)).toEqual(['burned']);
  });
});

describe('visiblePart', () => {
  it('is the whole of a picture that fits', () => {
    expect(visiblePart(20, 0.5, 1000, 800)).toEqual({ from: 0, count: 1000 });
  });
  it('is a few pixels of a large one, whole pixels at both ends', () => {
    expect(visiblePart(-64_010, 64, 5000, 800)).toEqual({ from: 1000, count: 13 });
  });
  it('is nothing beside the frame', () => {
    expect(visiblePart(900, 1, 100, 800).count).toBe(0);
    expect(visiblePart(-200, 1, 100, 800).count).toBe(0);
  });
});
