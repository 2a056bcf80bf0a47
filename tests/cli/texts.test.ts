import { expect, test } from 'vitest';
import { readArguments } from '../../src/cli/arguments';
import { checkText, mm } from '../../src/cli/check-text';
import { helpText } from '../../src/cli/help';
import { OPTIONS } from '../../src/cli/option-table';
import { timingsText } from '../../src/cli/timings-text';
import type { Finding } from '../../src/lib/preflight/finding';
import type { CheckReport } from '../../src/lib/prepare/report';
import { SCREEN_NAMES } from '../../src/lib/prepare/settings';

const hairline: Finding = {
  id: 'hairline',
  severity: 'blocker',
  title: 'Strokes thinner than a burned line',
  count: 7,
  places: Array.from({ length: 7 }, (_, i) => ({ xMm: i, yMm: 2, widthMm: 0, heightMm: 0, minMm: 0.04 })),
  minMm: 0.04,
  limitMm: 0.11,
  measured: null,
  advice: 'Draw them at least 0.11 mm wide.',
  waivable: true,
};
const report: CheckReport = {
  reportVersion: 1,
  artwork: {
    sha256: '',
    bytes: 1,
    format: 'svg',
    kind: 'vector',
    widthPx: 1,
    heightPx: 1,
    ownWidthMm: null,
    ownHeightMm: null,
    remarks: ['A remark.'],
    suggestedTreatment: 'linework',
    suggestionReason: 'It is drawn in lines.',
    tonalShare: 0,
  },
  widthMm: 60,
  heightMm: 24.3333,
  directionDeg: 0,
  sizeAcrossMm: 0.11,
  findings: [hairline],
  smallestSoundWidthMm: 165,
  measuredPxPerMm: 60,
};

test('a finding is told with its measure, its limit, five places and the rest counted', () => {
  const text = checkText('mark.svg', report);
  expect(text).toContain('mark.svg: SVG, placed at 60 mm by 24.33 mm.');
  expect(text).toContain('1 finding:');
  expect(text).toContain('blocker: Strokes thinner than a burned line (7 places)');
  expect(text).toContain('smallest 0.04 mm, needed 0.11 mm');
  expect(text).toContain('4.0, 2.0 (0.04 mm); and 2 more');
  expect(text).toContain('Smallest sound width: 165 mm.');
  expect(text).toContain('A remark.');
});

test('a figure that is no width is told with its unit', () => {
  const measured = { value: 142.4, limit: 231, unit: 'ppi' };
  const coarse: Finding = {
    ...hairline,
    id: 'resolution',
    severity: 'warning',
    count: 1,
    places: [],
    minMm: null,
    limitMm: null,
    measured,
  };
  expect(checkText('a', { ...report, findings: [coarse] })).toContain('measured 142.4 ppi, limit 231');
});

test('nothing found is said so', () => {
  const text = checkText('a', { ...report, findings: [], smallestSoundWidthMm: null });
  expect(text).toContain('Nothing was found that would not engrave.');
  expect(text).not.toContain('Smallest sound width');
});

test.each([
  [0.0314, '0.031 mm'],
  [1, '1 mm'],
  [24.3333, '24.33 mm'],
  [0.1, '0.1 mm'],
])('%s mm reads %s', (value, text) => {
  expect(mm(value)).toBe(text);
});

test('the help names every option, every screen and every exit status', () => {
  const text = helpText();
  for (const name of Object.keys(OPTIONS)) expect(text).toContain(`--${name}`);
  for (const name of SCREEN_NAMES) expect(text).toContain(name);
  for (const status of [0, 1, 2, 3, 4]) expect(text).toMatch(new RegExp(`^ {2}${status} {2}\\w`, 'm'));
  for (const line of text.split('\n')) expect(line.length).toBeLessThanOrEqual(100);
});

test('the example of the help is a command that is understood', () => {
  const example = helpText().trim().split('\n').at(-1) ?? '';
  expect(readArguments(example.trim().split(' ').slice(1))).toMatchObject({ command: 'check' });
});

test('timings are a line for each stage', () => {
  expect(timingsText({ ingest: 12.4, screen: 1000 })).toBe(
    'ingest                        12 ms\nscreen                      1000 ms\n',
  );
});
