import { angleWords, pitchWords, speedWords } from '@/lib/orders/sentence';
import type { PassReport, Report } from '@/lib/prepare/report';
import { durationWords } from '../time-words';

type Run = { powerPercent: number; speedMmPerS: number } | null | undefined;

function focusWords(offsetMm: number): string {
  if (offsetMm === 0) return 'in focus';
  return `head ${Number(Math.abs(offsetMm).toFixed(2))} mm ${offsetMm > 0 ? 'above' : 'below'} focus`;
}

/** For a turned raster: its angle, and where its top left corner lies on the artwork. */
export function frameWords({ scanFrame }: PassReport): string | null {
  if (!scanFrame) return null;
  const at = (mm: number): string => `${mm < 0 ? '−' : ''}${Math.abs(mm).toFixed(2)}`;
  return `The file lies turned by ${angleWords(scanFrame.angleDeg)}, clockwise positive. Its top left corner is ${at(scanFrame.originXMm)} mm right and ${at(scanFrame.originYMm)} mm down from the artwork’s top left corner.`;
}

/** One pass in the words of the ticket: what is run, how, and how long it takes. */
export function passLine(pass: PassReport, report: Report, speedUnit: 'mm/s' | 'mm/min'): string {
  const { recipe } = report.settings;
  const run: Run = pass.pass === 1 ? recipe : recipe?.perpendicular;
  return [
    `${pass.lines.toLocaleString('en-GB')} lines at ${angleWords(pass.directionDeg)}, ${pitchWords(pass.linePitchMm)} apart`,
    ...(run ? [`power ${run.powerPercent} %, speed ${speedWords(run.speedMmPerS, speedUnit)}`] : []),
    ...(recipe ? [focusWords(recipe.focusOffsetMm)] : []),
    ...(pass.runOffMm === null ? [] : [`run-off ${pass.runOffMm.toFixed(1)} mm at both ends`]),
    ...(pass.doseJPerMm2 === null
      ? []
      : [`${pass.doseJPerMm2.toFixed(3)} J/mm²${pass.assumesLinearPower ? ' (assumes linear power)' : ''}`]),
    ...(pass.scanSeconds === null ? [] : [durationWords(pass.scanSeconds)]),
  ].join('; ');
}

/** Linework as one line of the ticket. */
export function lineworkLine(report: Report, speedUnit: 'mm/s' | 'mm/min'): string | null {
  const { trace, settings } = report;
  if (settings.treatment !== 'linework' || !trace) return null;
  const { recipe } = settings;
  return [
    `Follow ${trace.paths.toLocaleString('en-GB')} paths, ${trace.lengthMm.toFixed(0)} mm in all`,
    ...(recipe
      ? [
          `power ${recipe.powerPercent} %, speed ${speedWords(recipe.speedMmPerS, speedUnit)}`,
          focusWords(recipe.focusOffsetMm),
        ]
      : []),
  ].join('; ');
}

/** The same file in several formats as one name: "U-1004-pass1-0.110mm-0deg-1a2b3c4d, as .png, .tiff or .bmp". */
export function fileWords(names: readonly string[]): string {
  const stems = [...new Set(names.map((name) => name.replace(/\.[^.]+$/, '')))];
  return stems
    .map((stem) => {
      const endings = names
        .filter((name) => name.startsWith(`${stem}.`))
        .map((name) => name.slice(stem.length));
      const last = endings.pop();
      return `${stem}, as ${endings.length > 0 ? `${endings.join(', ')} or ` : ''}${last}`;
    })
    .join('; ');
}
