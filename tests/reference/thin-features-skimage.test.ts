import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect } from 'vitest';
import { contourOf } from '../../src/lib/imaging/contour';
import { squaredDistance, cappedDistance } from '../../src/lib/imaging/distance';
import { divide } from '../../src/lib/imaging/field';
import { medialAxis } from '../../src/lib/imaging/medial-axis';
import { asBytes, bar, coverageOf, disc, hole, star, type Polygon } from '../drawn/coverage';
import { DEBIAN_PYTHON, needsTool } from '../setup/reference-tool';
import { referenceCheck } from './check';

const SIZE = 96;

/** Answer of a Python program that reads a square picture of bytes. */
function ask(program: string, data: Uint8Array): unknown {
  const folder = mkdtempSync(path.join(tmpdir(), 'thin-features-'));
  try {
    const file = path.join(folder, 'picture');
    writeFileSync(file, data);
    const head = `import json, numpy as np\na = np.fromfile(${JSON.stringify(file)}, np.uint8).reshape(-1, ${SIZE})\n`;
    const { stdout, stderr, status } = spawnSync(DEBIAN_PYTHON, ['-c', head + program], { encoding: 'utf8' });
    if (status !== 0) throw new Error(stderr);
    return JSON.parse(stdout);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

const PICTURES: readonly (readonly Polygon[])[] = [
  [disc(40, 44, 50), hole(disc(40, 44, 41)), bar(80, 48, 70, 5, 84)],
  [star(48, 48, 7, 44, 20, 5)],
  [bar(48, 20, 80, 6.4, 3), bar(48, 40, 80, 4.7, 21), bar(40, 75, 60, 9, 160)],
];

referenceCheck(
  {
    what: 'distance transforms of three drawn pictures',
    basis: 'computed',
    source: 'scipy.ndimage.distance_transform_edt of Debian 12, run by the test',
    within: '1e-6 px²',
  },
  () => {
    needsTool('python3-skimage');
    for (const polygons of PICTURES) {
      const mask = asBytes(coverageOf(SIZE, SIZE, polygons)).map((v) => (v > 127 ? 1 : 0));
      const program =
        'from scipy.ndimage import distance_transform_edt as d\nprint(json.dumps((d(a) ** 2).ravel().tolist()))';
      const theirs = ask(program, mask) as number[];
      squaredDistance(mask, SIZE, SIZE).forEach((value, i) =>
        expect(Math.abs(value - theirs[i])).toBeLessThan(1e-6),
      );
    }
  },
);

referenceCheck(
  {
    what: 'stroke widths of three drawn pictures against twice the distance to a sub-pixel contour',
    basis: 'computed',
    source:
      'skimage.measure.find_contours at 127.5 and brute-force distances from our points, Debian 12, run by the test',
    within: 'mean 0.2 px, any 0.4 px: the contour there is by straight interpolation alone',
  },
  () => {
    needsTool('python3-skimage');
    for (const polygons of PICTURES) {
      const data = asBytes(coverageOf(SIZE, SIZE, polygons));
      const field = { width: SIZE, height: SIZE, data };
      const division = divide(field, 127.5);
      const points = medialAxis(
        division,
        cappedDistance(division, 8),
        contourOf(field, division, 127.5),
        1,
        10,
      );
      expect(points.count).toBeGreaterThan(10);
      const list = JSON.stringify([...points.x].map((x, n) => [points.y[n] - 0.5, x - 0.5]));
      const program =
        'from skimage.measure import find_contours\n' +
        'c = [np.concatenate([k[:-1] + (k[1:] - k[:-1]) * t for t in np.linspace(0, 1, 9)]) for k in find_contours(a.astype(float), 127.5)]\n' +
        `c = np.concatenate(c)\np = np.array(${list})\n` +
        'print(json.dumps((2 * np.sqrt(((p[:, None, :] - c[None, :, :]) ** 2).sum(2)).min(1)).tolist()))';
      const theirs = ask(program, data) as number[];
      theirs.forEach((width, n) => {
        // Below 2 px, at the very tips, neither can tell.
        if (points.width[n] >= 2) expect(Math.abs(width - points.width[n])).toBeLessThan(0.4);
      });
      const mean =
        theirs.reduce((sum, width, n) => sum + Math.abs(width - points.width[n]), 0) / theirs.length;
      expect(mean).toBeLessThan(0.2);
    }
  },
);
