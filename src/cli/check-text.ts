import type { Finding, Place } from '../lib/preflight/finding';
import type { CheckReport } from '../lib/prepare/report';

const PLACES_SHOWN = 5;

/** A length as people read it: three decimals under 1 mm, else at most two. */
export const mm = (value: number): string => `${Number(value.toFixed(value < 1 ? 3 : 2))} mm`;

const count = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`;

const placeText = ({ xMm, yMm, minMm }: Place): string =>
  `${xMm.toFixed(1)}, ${yMm.toFixed(1)}${minMm === null ? '' : ` (${mm(minMm)})`}`;

function placesLine({ places, count: all }: Finding): string[] {
  if (places.length === 0) return [];
  const shown = places.slice(0, PLACES_SHOWN).map(placeText).join('; ');
  const more = all > PLACES_SHOWN ? `; and ${all - PLACES_SHOWN} more` : '';
  return [`    at mm from left and top: ${shown}${more}`];
}

function measuredLine({ minMm, limitMm, measured }: Finding): string[] {
  if (minMm !== null)
    return [`    smallest ${mm(minMm)}${limitMm === null ? '' : `, needed ${mm(limitMm)}`}`];
  if (measured === null) return [];
  const limit = measured.limit === null ? '' : `, limit ${Number(measured.limit.toFixed(2))}`;
  return [`    measured ${Number(measured.value.toFixed(2))} ${measured.unit}${limit}`];
}

const findingLines = (finding: Finding): string[] => [
  '',
  `  ${finding.severity}: ${finding.title}${finding.count > 1 ? ` (${finding.count} places)` : ''}`,
  `    ${finding.advice}`,
  ...measuredLine(finding),
  ...placesLine(finding),
];

function soundWidthLine(report: CheckReport): string[] {
  if (report.smallestSoundWidthMm === null) return [];
  return ['', `Smallest sound width: ${mm(report.smallestSoundWidthMm)}.`];
}

/** What check found, as text for people. */
export function checkText(name: string, report: CheckReport): string {
  const { artwork, findings } = report;
  const head = [
    `${name}: ${artwork.format.toUpperCase()}, placed at ${mm(report.widthMm)} by ${mm(report.heightMm)}.`,
    `Scanning at ${report.directionDeg} degrees, the spot is ${mm(report.sizeAcrossMm)} across the lines.`,
    ...artwork.remarks.map((remark) => `${remark}`),
    '',
    findings.length === 0
      ? 'Nothing was found that would not engrave.'
      : `${count(findings.length, 'finding', 'findings')}:`,
  ];
  const foot = ['', `Suggested treatment: ${artwork.suggestedTreatment}. ${artwork.suggestionReason}`, ''];
  return [...head, ...findings.flatMap(findingLines), ...soundWidthLine(report), ...foot].join('\n');
}
