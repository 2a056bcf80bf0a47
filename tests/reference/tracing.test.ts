import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect } from 'vitest';
import { boundaryDistance } from '../../src/lib/prepare/trace/boundary-distance';
import { flatten, readPathData, type Matrix, type Point } from '../../src/lib/prepare/trace/curve';
import { traceMask } from '../../src/lib/prepare/trace/trace-mask';
import { nodeTools } from '../../src/rendering/node-tools';
import { needsTool } from '../setup/reference-tool';
import { referenceCheck } from './check';
import { readTable } from './read-table';

const tools = nodeTools();
const SIDE = 128;
type Inside = (x: number, y: number) => boolean;

const turned = (deg: number, inside: Inside): Inside => {
  const a = (deg * Math.PI) / 180;
  return (x, y) => {
    const [dx, dy] = [x - 64, y - 64];
    return inside(64 + dx * Math.cos(a) + dy * Math.sin(a), 64 - dx * Math.sin(a) + dy * Math.cos(a));
  };
};
const disc =
  (r: number): Inside =>
  (x, y) =>
    Math.hypot(x - 64, y - 64) < r;
const box =
  (w: number, h: number): Inside =>
  (x, y) =>
    Math.abs(x - 64) < w / 2 && Math.abs(y - 64) < h / 2;
const TIPS = Array.from({ length: 10 }, (_, k): Point => {
  const [r, a] = [k % 2 === 0 ? 55 : 24, -Math.PI / 2 + (k * Math.PI) / 5];
  return [64 + r * Math.cos(a), 64 + r * Math.sin(a)];
});
const star: Inside = (x, y) => {
  let inside = false;
  TIPS.forEach(([ax, ay], n) => {
    const [bx, by] = TIPS[(n + 9) % 10];
    if (ay > y !== by > y && x < ((bx - ax) * (y - ay)) / (by - ay) + ax) inside = !inside;
  });
  return inside;
};
const SHAPES: Record<string, Inside> = {
  'disc r=50': disc(50),
  'ring 50/40': (x, y) => disc(50)(x, y) && !disc(40)(x, y),
  'square 80 axis': box(80, 80),
  'square 70 at 17deg': turned(17, box(70, 70)),
  'bar 6px at 30deg': turned(30, box(100, 6)),
  'star 5': star,
};

/** Pixels of which at least half lies within, by 8 × 8 points. */
function bitmapOf(inside: Inside): Uint8Array {
  return Uint8Array.from({ length: SIDE * SIDE }, (_, n) => {
    const [column, row] = [n % SIDE, Math.floor(n / SIDE)];
    let hits = 0;
    for (let k = 0; k < 64; k += 1)
      if (inside(column + ((k % 8) + 0.5) / 8, row + (Math.floor(k / 8) + 0.5) / 8)) hits += 1;
    return hits >= 32 ? 1 : 0;
  });
}

/** Outlines that Debian's program finds, in pixels with the origin at the top. */
function debianOutlines(mask: Uint8Array): Point[][] {
  const folder = mkdtempSync(join(tmpdir(), 'umberline-potrace-'));
  try {
    const rows = Array.from({ length: SIDE }, (_, row) =>
      mask.subarray(row * SIDE, (row + 1) * SIDE).join(' '),
    );
    writeFileSync(join(folder, 'in.pbm'), `P1\n${SIDE} ${SIDE}\n${rows.join('\n')}\n`);
    execFileSync('potrace', [
      '--svg',
      '--turdsize',
      '2',
      '-o',
      join(folder, 'out.svg'),
      join(folder, 'in.pbm'),
    ]);
    const svg = readFileSync(join(folder, 'out.svg'), 'utf8');
    const matrix: Matrix = [0.1, 0, 0, -0.1, 0, SIDE];
    expect(svg).toContain(`transform="translate(0.000000,${SIDE}.000000) scale(0.100000,-0.100000)"`);
    return [...svg.matchAll(/ d="([^"]*)"/g)].flatMap(([, data]) =>
      readPathData(data, matrix).map((curve) => flatten(curve, 0.01)),
    );
  } finally {
    rmSync(folder, { recursive: true });
  }
}

async function ourOutlines(mask: Uint8Array) {
  const raster = { kind: 'mask' as const, width: SIDE, height: SIDE, pitchXMm: 1, pitchYMm: 1, data: mask };
  const spot = { widthMm: 1.6, heightMm: 1.6, shape: 'ellipse' as const };
  return traceMask(raster, { spot, corners: 'kept' }, tools);
}

/** Greatest and mean distance between two sets of outlines, both ways, from points every tenth of a pixel. */
function between(a: readonly (readonly Point[])[], b: readonly (readonly Point[])[]) {
  const points = (outlines: readonly (readonly Point[])[]): Point[] =>
    outlines.flatMap((outline) =>
      outline.flatMap(([x, y], n) => {
        const [nextX, nextY] = outline[(n + 1) % outline.length];
        const steps = Math.max(1, Math.ceil(Math.hypot(nextX - x, nextY - y) * 10));
        return Array.from({ length: steps }, (_, k): Point => [
          x + ((nextX - x) * k) / steps,
          y + ((nextY - y) * k) / steps,
        ]);
      }),
    );
  const [ours, theirs] = [points(a), points(b)];
  const nearest = (from: Point[], to: Point[]): number[] =>
    from
      .filter((_, n) => n % 5 === 0)
      .map(([x, y]) => to.reduce((best, [u, v]) => Math.min(best, Math.hypot(x - u, y - v)), Infinity));
  const distances = [nearest(ours, theirs), nearest(theirs, ours)];
  const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
  return { hausdorff: Math.max(...distances.flat()), mean: (mean(distances[0]) + mean(distances[1])) / 2 };
}

for (const [name, inside] of Object.entries(SHAPES)) {
  referenceCheck(
    {
      what: 'traced outlines beside those of Debian’s potrace on the same pixels, six shapes',
      basis: 'computed',
      source: 'Debian potrace 1.16 (Selinger 2003), called in the test',
      within: 'Hausdorff 1.2 px, mean boundary 0.2 px',
    },
    async () => {
      needsTool('potrace');
      const mask = bitmapOf(inside);
      const { region } = await ourOutlines(mask);
      const { hausdorff, mean } = between(region, debianOutlines(mask));
      expect(hausdorff, `${name} Hausdorff`).toBeLessThan(1.2);
      expect(mean, `${name} mean`).toBeLessThan(0.2);
    },
  );
}

referenceCheck(
  {
    what: 'traced outlines beside the exact shapes, greatest and mean distance no worse than potrace’s own',
    basis: 'computed',
    source: 'Debian potrace 1.16 on 128 × 128 bitmaps of exact shapes, potrace_fidelity.csv',
    within: '0.35 px of the tabled Hausdorff, 0.1 px of the tabled mean',
  },
  async () => {
    const rows = readTable('potrace_fidelity.csv').filter(
      (row) => row.alphamax === '1.0' && row.opttolerance === '0.2',
    );
    expect(rows.length).toBe(6);
    for (const row of rows) {
      const fine = 4;
      const inside = SHAPES[row.shape];
      const exact = Uint8Array.from({ length: (SIDE * fine) ** 2 }, (_, n) =>
        inside(((n % (SIDE * fine)) + 0.5) / fine, (Math.floor(n / (SIDE * fine)) + 0.5) / fine) ? 1 : 0,
      );
      const { region } = await ourOutlines(bitmapOf(inside));
      const enlarged = region.map((path) => path.map(([x, y]): Point => [x * fine, y * fine]));
      const { meanPx, hausdorffPx } = boundaryDistance(enlarged, exact, SIDE * fine, SIDE * fine)!;
      expect(hausdorffPx / fine, `${row.shape} Hausdorff`).toBeLessThan(Number(row.hausdorff_px) + 0.35);
      expect(meanPx / fine, `${row.shape} mean`).toBeLessThan(Number(row.mean_boundary_px) + 0.1);
    }
  },
);

referenceCheck(
  {
    what: 'the distance that tracing is judged by, on two overlapping blocks of pixels',
    basis: 'computed',
    source: 'numpy and scipy, iou_hausdorff_golden.json',
    within: '1e-9',
  },
  () => {
    const golden = JSON.parse(
      readFileSync(join(import.meta.dirname, 'data', 'iou_hausdorff_golden.json'), 'utf8'),
    ) as {
      iou: number;
      intersection: number;
      union: number;
      hausdorff_pixels_of_sets: number;
    };
    const a: Inside = (x, y) => y >= 10 && y <= 29 && x >= 10 && x <= 29;
    const b: Inside = (x, y) => y >= 12 && y <= 29 && x >= 11 && x <= 32;
    const all = Array.from({ length: 1600 }, (_, n): Point => [n % 40, Math.floor(n / 40)]);
    expect(all.filter(([x, y]) => a(x, y) && b(x, y)).length).toBe(golden.intersection);
    expect(all.filter(([x, y]) => a(x, y) || b(x, y)).length).toBe(golden.union);
    // The golden figure is between pixel centres; as outlines the blocks differ by three pixels at the right as well.
    const mask = Uint8Array.from(all, ([x, y]) => (b(x, y) ? 1 : 0));
    const outline: Point[] = [
      [10, 10],
      [30, 10],
      [30, 30],
      [10, 30],
    ];
    const { hausdorffPx } = boundaryDistance([outline], mask, 40, 40)!;
    expect(hausdorffPx).toBeCloseTo(golden.hausdorff_pixels_of_sets, 9);
  },
);
