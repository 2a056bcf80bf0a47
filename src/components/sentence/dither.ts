/** Small pictures of the screens on the page itself: a ramp of burn, 0 on the left to 1 on the right, as dots. */

type Kernel = readonly (readonly [dx: number, dy: number, share: number])[];

const KERNELS = {
  'floyd-steinberg-1976': [[1, 0, 7 / 16], [-1, 1, 3 / 16], [0, 1, 5 / 16], [1, 1, 1 / 16]],
  'jarvis-judice-ninke-1976': [
    [1, 0, 7 / 48], [2, 0, 5 / 48],
    [-2, 1, 3 / 48], [-1, 1, 5 / 48], [0, 1, 7 / 48], [1, 1, 5 / 48], [2, 1, 3 / 48],
    [-2, 2, 1 / 48], [-1, 2, 3 / 48], [0, 2, 5 / 48], [1, 2, 3 / 48], [2, 2, 1 / 48],
  ],
  'stucki-1981': [
    [1, 0, 8 / 42], [2, 0, 4 / 42],
    [-2, 1, 2 / 42], [-1, 1, 4 / 42], [0, 1, 8 / 42], [1, 1, 4 / 42], [2, 1, 2 / 42],
    [-2, 2, 1 / 42], [-1, 2, 2 / 42], [0, 2, 4 / 42], [1, 2, 2 / 42], [2, 2, 1 / 42],
  ],
} as const satisfies Record<string, Kernel>;

const ramp = (column: number, width: number): number => (column + 0.5) / width;

/** Rows of dots of a ramp by error diffusion, left to right; 1 = burned. */
export function diffusedRamp(name: keyof typeof KERNELS, width: number, height: number): number[][] {
  const error = Array.from({ length: height + 2 }, () => new Float64Array(width + 4));
  return Array.from({ length: height }, (_, row) =>
    Array.from({ length: width }, (_, column) => {
      const wanted = ramp(column, width) + error[row][column + 2];
      const dot = wanted >= 0.5 ? 1 : 0;
      for (const [dx, dy, share] of KERNELS[name]) error[row + dy][column + 2 + dx] += (wanted - dot) * share;
      return dot;
    }),
  );
}

/** Threshold 0–1 of the recursive 8 × 8 matrix (Bayer 1973). */
function bayer8(column: number, row: number): number {
  let value = 0;
  for (let bit = 0; bit < 3; bit += 1) {
    const x = (column >> bit) & 1;
    const y = (row >> bit) & 1;
    value = value * 4 + ((x ^ y) * 2 + y);
  }
  return (value + 0.5) / 64;
}

export function orderedRamp(width: number, height: number): number[][] {
  return Array.from({ length: height }, (_, row) =>
    Array.from({ length: width }, (_, column) => (ramp(column, width) > bayer8(column % 8, row % 8) ? 1 : 0)),
  );
}

/** An even grain for the drawing alone: a low-discrepancy threshold that spreads its dots without a visible order. */
export function evenRamp(width: number, height: number): number[][] {
  return Array.from({ length: height }, (_, row) =>
    Array.from({ length: width }, (_, column) => {
      const threshold = (52.9829189 * ((0.06711056 * column + 0.00583715 * row) % 1)) % 1;
      return ramp(column, width) > threshold ? 1 : 0;
    }),
  );
}
