import type { Field } from '../../imaging/field';
import type { PlacementFacts } from '../../preflight/facts';
import type { MeasureSettings } from './measure-settings';

const over = (value: number): number => Math.max(0, Math.round(value * 1e6) / 1e6);

/** How far burned pixels reach beyond the ellipse of a round blank, mm, along the line from its centre. */
function beyondRound(settings: MeasureSettings, field: Field, level: number): number | null {
  const { blank, widthMm, heightMm } = settings;
  if (blank?.outline !== 'round') return null;
  const [rx, ry] = [blank.widthMm / 2, blank.heightMm / 2];
  const turns = settings.quarterTurns;
  let most = 0;
  for (let y = 0; y < field.height; y++) {
    for (let x = 0; x < field.width; x++) {
      if (field.data[y * field.width + x] <= level) continue;
      const [fx, fy] = turned((x + 0.5) / field.width, (y + 0.5) / field.height, turns);
      const dx = blank.leftMm + fx * widthMm - rx;
      const dy = blank.topMm + fy * heightMm - ry;
      const reach = Math.hypot(dx / rx, dy / ry);
      if (reach > 1) most = Math.max(most, Math.hypot(dx, dy) * (1 - 1 / reach));
    }
  }
  return most;
}

/** A place in fractions of the artwork after quarter turns clockwise. */
export function turned(fx: number, fy: number, quarterTurns: 0 | 1 | 2 | 3): [number, number] {
  if (quarterTurns === 1) return [1 - fy, fx];
  if (quarterTurns === 2) return [1 - fx, 1 - fy];
  if (quarterTurns === 3) return [fy, 1 - fx];
  return [fx, fy];
}

/**
 * Where the placed artwork lies against the blank and the bed.
 * The bed must hold the size and, where the speed is known, the run-off v²/2a at both ends of every line.
 * @param settings placed size, blank, machine and speed; unchanged
 * @param field coverage of the whole artwork before its turns; unchanged
 * @param level that parts burned from unburned, 0–255
 * @returns lengths in mm; null where there is nothing to hold against
 */
export function placementFacts(settings: MeasureSettings, field: Field, level: number): PlacementFacts {
  const { widthMm, heightMm, blank, machine, directionDeg } = settings;
  const speed = settings.speedMmPerS ?? null;
  const runOffMm = machine && speed ? speed ** 2 / (2 * machine.accelerationMmPerS2) : 0;
  const angle = (directionDeg * Math.PI) / 180;
  return {
    widthMm,
    heightMm,
    beyondBlank: blank && {
      leftMm: over(-blank.leftMm),
      topMm: over(-blank.topMm),
      rightMm: over(blank.leftMm + widthMm - blank.widthMm),
      bottomMm: over(blank.topMm + heightMm - blank.heightMm),
    },
    beyondRoundMm: beyondRound(settings, field, level),
    runOffMm,
    beyondBed: machine && {
      xMm: over(widthMm + 2 * runOffMm * Math.abs(Math.cos(angle)) - machine.bedWidthMm),
      yMm: over(heightMm + 2 * runOffMm * Math.abs(Math.sin(angle)) - machine.bedHeightMm),
    },
  };
}
