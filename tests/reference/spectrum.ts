/** Discrete Fourier transform of a power-of-two length, in place (Cooley & Tukey 1965). */
function transform(re: Float64Array, im: Float64Array): void {
  const n = re.length;
  for (let i = 1, j = 0; i < n; i++) {
    let bit = n >> 1;
    for (; j & bit; bit >>= 1) j ^= bit;
    j ^= bit;
    if (i < j) {
      [re[i], re[j]] = [re[j], re[i]];
      [im[i], im[j]] = [im[j], im[i]];
    }
  }
  for (let size = 2; size <= n; size *= 2) {
    const half = size / 2;
    for (let start = 0; start < n; start += size) {
      for (let k = 0; k < half; k++) {
        const angle = (-2 * Math.PI * k) / size;
        const [a, b] = [start + k, start + k + half];
        const x = re[b] * Math.cos(angle) - im[b] * Math.sin(angle);
        const y = re[b] * Math.sin(angle) + im[b] * Math.cos(angle);
        [re[b], im[b]] = [re[a] - x, im[a] - y];
        [re[a], im[a]] = [re[a] + x, im[a] + y];
      }
    }
  }
}

const WINDOW = 64;

/** Energy by frequency of one 64 × 64 window of dots, the mean taken away. */
function periodogram(dots: Uint8Array, width: number, left: number, top: number, grey: number): Float64Array {
  const re = new Float64Array(WINDOW * WINDOW);
  const im = new Float64Array(WINDOW * WINDOW);
  for (let y = 0; y < WINDOW; y++) {
    for (let x = 0; x < WINDOW; x++) re[y * WINDOW + x] = dots[(top + y) * width + left + x] - grey;
    transform(re.subarray(y * WINDOW, (y + 1) * WINDOW), im.subarray(y * WINDOW, (y + 1) * WINDOW));
  }
  for (let x = 0; x < WINDOW; x++) {
    const column = Float64Array.from({ length: WINDOW }, (_, y) => re[y * WINDOW + x]);
    const columnIm = Float64Array.from({ length: WINDOW }, (_, y) => im[y * WINDOW + x]);
    transform(column, columnIm);
    for (let y = 0; y < WINDOW; y++) re[y * WINDOW + x] = column[y] ** 2 + columnIm[y] ** 2;
  }
  return re;
}

/**
 * Share of a flat's energy that lies below half its principal frequency √min(g, 1 − g), which shows as coarse grain
 * (Ulichney, Digital Halftoning, 1987). Periodograms of 64 × 64 windows, half overlapping, are averaged; zero is left out.
 */
export function spectrumOf(dots: Uint8Array, side: number, grey: number): { shareBelowHalf: number } {
  const principal = Math.sqrt(Math.min(grey, 1 - grey));
  let all = 0;
  let low = 0;
  for (let top = 0; top + WINDOW <= side; top += WINDOW / 2) {
    for (let left = 0; left + WINDOW <= side; left += WINDOW / 2) {
      periodogram(dots, side, left, top, grey).forEach((energy, i) => {
        if (i === 0) return;
        const [u, v] = [i % WINDOW, Math.floor(i / WINDOW)].map((k) => Math.min(k, WINDOW - k) / WINDOW);
        all += energy;
        if (Math.hypot(u, v) < principal / 2) low += energy;
      });
    }
  }
  return { shareBelowHalf: low / all };
}
