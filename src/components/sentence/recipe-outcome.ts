import { dose, opticalPower } from '@/lib/machines/dose';
import { scanTime } from '@/lib/machines/scan-time';
import type { Design } from '@/lib/orders/views';
import { perpendicularScan, scanFrame } from '@/lib/prepare/resample/scan-frame';
import type { Scan } from '@/lib/prepare/settings';
import { durationWords } from '../time-words';
import type { ChoiceContext } from './context';

interface Run {
  scan: Scan;
  powerPercent: number;
  speedMmPerS: number;
}

function runsOf({ scan, perpendicular, recipe }: Design): Run[] {
  if (!recipe) return [];
  const first = { scan, powerPercent: recipe.powerPercent, speedMmPerS: recipe.speedMmPerS };
  if (!perpendicular || !recipe.perpendicular) return [first];
  return [first, { scan: perpendicularScan(scan.directionDeg, perpendicular), ...recipe.perpendicular }];
}

function secondsOf({ scan, speedMmPerS }: Run, { machine, widthMm, heightMm }: ChoiceContext): number | null {
  if (!machine || widthMm === null || heightMm === null) return null;
  const frame = scanFrame(widthMm, heightMm, scan);
  const along = frame.linesAre === 'rows';
  return scanTime({
    lines: along ? frame.rows : frame.columns,
    lineMm: along ? frame.widthMm : frame.heightMm,
    linePitchMm: scan.linePitchMm,
    speedMmPerS,
    accelerationMmPerS2: machine.accelerationMmPerS2,
    scanning: machine.scanning,
  });
}

/** Dose and time of a typed recipe in words, before anything is prepared: what the report will say of the same figures. */
export function recipeOutcome(design: Design, context: ChoiceContext): string {
  const { machine } = context;
  if (!machine) return '';
  if (design.treatment === 'linework')
    return 'A followed line has no dose of an area. Power and speed alone decide its darkness.';
  const runs = runsOf(design);
  const powers = runs.map((run) => opticalPower(machine, run.powerPercent));
  const total = runs.reduce(
    (sum, run, i) => sum + dose(powers[i].watts, run.speedMmPerS, run.scan.linePitchMm),
    0,
  );
  const seconds = runs.map((run) => secondsOf(run, context));
  const known = seconds.every((s): s is number => s !== null);
  const assumed = powers.some((power) => power.assumesLinear) ? ', assumes linear power' : '';
  const time = known ? ` About ${durationWords(seconds.reduce((a, b) => a + b, 0))} a piece.` : '';
  return `Dose ${total.toFixed(3)} J/mm²${assumed}.${time}`;
}
