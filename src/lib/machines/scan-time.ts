function assertAbove0(values: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(values)) {
    if (!(value > 0) || !Number.isFinite(value))
      throw new RangeError(`expected ${name} above 0, got ${value}`);
  }
}

/**
 * Travel beyond each end of a scan line that the head needs to reach speed, mm: v² ÷ 2a.
 * @param speedMmPerS mm/s, above 0
 * @param accelerationMmPerS2 mm/s², above 0
 * @throws RangeError when a value is not above 0
 * @example runOff(300, 3000) // 15
 */
export function runOff(speedMmPerS: number, accelerationMmPerS2: number): number {
  assertAbove0({ speedMmPerS, accelerationMmPerS2 });
  return speedMmPerS ** 2 / (2 * accelerationMmPerS2);
}

/**
 * Time of a move from rest to rest, s.
 * A trapezoid of speed where the way is long enough to reach full speed, else a triangle.
 * @param lengthMm way, mm, from 0
 * @param speedMmPerS highest speed, mm/s, above 0
 * @param accelerationMmPerS2 mm/s², above 0
 * @throws RangeError when a value is outside its range
 * @example moveTime(100, 300, 3000) // 0.433333
 */
export function moveTime(lengthMm: number, speedMmPerS: number, accelerationMmPerS2: number): number {
  assertAbove0({ speedMmPerS, accelerationMmPerS2 });
  if (!(lengthMm >= 0)) throw new RangeError(`expected lengthMm from 0, got ${lengthMm}`);
  if (lengthMm < speedMmPerS ** 2 / accelerationMmPerS2) return 2 * Math.sqrt(lengthMm / accelerationMmPerS2);
  return lengthMm / speedMmPerS + speedMmPerS / accelerationMmPerS2;
}

export interface ScanJob {
  /** scan lines, 1 or more */
  lines: number;
  /** length of one, mm, above 0 */
  lineMm: number;
  linePitchMm: number;
  speedMmPerS: number;
  accelerationMmPerS2: number;
  scanning: 'one-way' | 'two-way';
}

/**
 * Scanning time of a raster, s, with run-off at both ends of every line.
 * Two-way: n·(L/v + 2v/a) and n − 1 steps from line to line; one-way: n − 1 returns over L + v²/a, the step within them.
 * Controllers that limit jerk are slower, those that skip empty lines faster.
 * @param job lengths in mm, speed in mm/s, acceleration in mm/s²; unchanged
 * @throws RangeError when a value is not above 0
 * @example scanTime of 100 × 100 mm at 0.1 mm, 300 mm/s, 3000 mm/s², two-way: 544.869
 */
export function scanTime(job: ScanJob): number {
  const { lines, lineMm, linePitchMm, speedMmPerS: v, accelerationMmPerS2: a, scanning } = job;
  assertAbove0({ lines, lineMm, linePitchMm });
  const line = moveTime(lineMm + v ** 2 / a, v, a);
  const step = moveTime(linePitchMm, v, a);
  const between = scanning === 'two-way' ? step : Math.max(step, line);
  return lines * line + (lines - 1) * between;
}
