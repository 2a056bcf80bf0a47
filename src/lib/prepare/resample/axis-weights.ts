/** For each place along an axis: the samples that it is made of and their shares. */
export interface AxisWeights {
  /** samples that each place is made of */
  taps: number;
  /** first of them, one entry a place */
  first: Int32Array;
  /** shares, `taps` entries a place; they add up to 1 */
  shares: Float64Array;
}

/** Mitchell and Netravali's cubic with B = C = 1/3 (SIGGRAPH 1988), support 2. */
function mitchell(distance: number): number {
  const x = Math.abs(distance);
  if (x < 1) return (7 * x ** 3 - 12 * x ** 2 + 16 / 3) / 6;
  return x < 2 ? ((-7 / 3) * x ** 3 + 12 * x ** 2 - 20 * x + 32 / 3) / 6 : 0;
}

/** Share of [from, to] that each whole sample from `first` on covers. */
function areaShares(from: number, to: number, first: number, shares: Float64Array): void {
  for (let tap = 0; tap < shares.length; tap++) {
    const sample = first + tap;
    shares[tap] = Math.max(0, Math.min(to, sample + 1) - Math.max(from, sample)) / (to - from);
  }
}

function reducing(from: number, to: number): AxisWeights {
  const scale = from / to;
  const taps = Math.min(from, Number.isInteger(scale) ? scale : Math.ceil(scale) + 1);
  const first = new Int32Array(to);
  const shares = new Float64Array(to * taps);
  for (let i = 0; i < to; i++) {
    first[i] = Math.min(Math.floor((i * from) / to), from - taps);
    areaShares((i * from) / to, ((i + 1) * from) / to, first[i], shares.subarray(i * taps, (i + 1) * taps));
  }
  return { taps, first, shares };
}

function enlarging(from: number, to: number): AxisWeights {
  const taps = Math.min(4, from);
  const first = new Int32Array(to);
  const shares = new Float64Array(to * taps);
  for (let i = 0; i < to; i++) {
    const centre = ((i + 0.5) * from) / to - 0.5;
    const base = Math.floor(centre) - 1;
    first[i] = Math.max(0, Math.min(base, from - taps));
    for (let tap = 0; tap < 4; tap++) {
      const sample = Math.max(0, Math.min(base + tap, from - 1));
      shares[i * taps + sample - first[i]] += mitchell(base + tap - centre);
    }
  }
  return { taps, first, shares };
}

/**
 * How an axis of samples is brought to another number of samples over the same extent.
 * Fewer or as many: every sample counts by the area that it covers, which makes no halos; more: Mitchell and Netravali's
 * cubic, with the end samples carried on beyond the edge.
 * @param from samples there are, 1 or more
 * @param to samples asked for, 1 or more
 * @throws RangeError when either is not a whole number from 1
 * @example axisWeights(4, 2) // two places of two samples, ½ each
 * @see Mitchell & Netravali, SIGGRAPH 1988, 221–228
 */
export function axisWeights(from: number, to: number): AxisWeights {
  for (const count of [from, to]) {
    if (!Number.isInteger(count) || count < 1)
      throw new RangeError(`expected a whole number of samples from 1, got ${count}`);
  }
  return from >= to ? reducing(from, to) : enlarging(from, to);
}
