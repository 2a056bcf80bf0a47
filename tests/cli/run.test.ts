import { createHash } from 'node:crypto';
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { manifestSchema } from '../../src/lib/prepare/manifest';
import { checkReportSchema, reportSchema } from '../../src/lib/prepare/report';
import { ROOT, runLine } from './run-line';

const SPOT = ['--spot', '0.07x0.11'];
const sample = (name: string): string => path.join(ROOT, 'samples', name);
let scratch = '';
beforeAll(() => {
  scratch = mkdtempSync(path.join(tmpdir(), 'umberline-run-'));
});
afterAll(() => rmSync(scratch, { recursive: true, force: true }));

describe('check', () => {
  test('--json prints exactly one object and nothing else, status 0 without blockers', async () => {
    const { status, stdout, stderr } = await runLine(
      'check',
      sample('stamp.png'),
      '--width-mm',
      '60',
      ...SPOT,
      '--json',
    );
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout.endsWith('}\n')).toBe(true);
    const report = checkReportSchema.strict().parse(JSON.parse(stdout));
    expect(report).toMatchObject({
      widthMm: 60,
      heightMm: 60,
      directionDeg: 0,
      sizeAcrossMm: 0.11,
      findings: [],
    });
  });

  test('a blocker gives status 1, with places, smallest width, limit and advice', async () => {
    const { status, stdout } = await runLine('check', sample('hairline.svg'), ...SPOT, '--json');
    expect(status).toBe(1);
    const { findings } = checkReportSchema.parse(JSON.parse(stdout));
    const [hairline] = findings;
    expect(hairline).toMatchObject({ id: 'hairline', severity: 'blocker', count: 2 });
    expect(hairline.minMm).toBeCloseTo(0.03, 2);
    expect(hairline.limitMm).toBeCloseTo(0.11, 3);
    expect(hairline.places[0].yMm).toBeCloseTo(5, 1);
    expect(hairline.advice).not.toBe('');
  });

  test('the direction of scanning sets the size across, and the spot’s sides stay where they are', async () => {
    const { stdout } = await runLine(
      'check',
      sample('stamp.png'),
      ...SPOT,
      '--direction-deg',
      '90',
      '--json',
    );
    expect(checkReportSchema.parse(JSON.parse(stdout))).toMatchObject({
      directionDeg: 90,
      sizeAcrossMm: 0.07,
    });
  });

  test('without --json it is told in words, and timings go to standard error', async () => {
    const { stdout, stderr } = await runLine('check', sample('stamp.png'), ...SPOT, '--timings');
    expect(stdout).toContain('stamp.png: PNG, placed at 60 mm by 60 mm.');
    expect(stderr).toMatch(/^measure +\d+ ms$/m);
  });

  test('quarter turns change places of width and height', async () => {
    const line = [
      sample('banner.svg'),
      '--width-mm',
      '30',
      '--quarter-turns',
      '1',
      ...SPOT,
      '--blank-mm',
      '60x160',
      '--json',
    ];
    const { status, stdout } = await runLine('check', ...line);
    const report = checkReportSchema.parse(JSON.parse(stdout));
    expect([status, report.heightMm]).toEqual([0, 120]);
    expect(report.findings.map(({ id }) => id)).not.toContain('outside');
  });
});

describe('prepare', () => {
  const prepare = (out: string, ...more: string[]) =>
    runLine('prepare', sample('stamp.bmp'), '--width-mm', '30', ...SPOT, '--out', out, ...more);

  test('writes files, report and manifest that agree with each other', async () => {
    const out = path.join(scratch, 'agree');
    const { status, stdout } = await prepare(out, '--treatment', 'solid', '--json');
    expect(status).toBe(0);
    const text = readFileSync(path.join(out, 'manifest.json'), 'utf8');
    const manifest = manifestSchema.parse(JSON.parse(text));
    const report = reportSchema.parse(JSON.parse(readFileSync(path.join(out, 'report.json'), 'utf8')));
    expect(report).toEqual(JSON.parse(stdout));
    expect(createHash('sha256').update(text).digest('hex')).toBe(report.manifestSha256);
    expect(readdirSync(out).sort()).toEqual(
      [...manifest.files.map(({ name }) => name), 'manifest.json', 'report.json'].sort(),
    );
    for (const { name, sha256, bytes } of manifest.files) {
      const content = readFileSync(path.join(out, name));
      expect([createHash('sha256').update(content).digest('hex'), content.length]).toEqual([sha256, bytes]);
      expect(name).toMatch(new RegExp(`^stamp-pass1-0\\.110mm-0deg-${report.preparationKey.slice(0, 8)}\\.`));
    }
  });

  test('the same command gives the same bytes', async () => {
    const [one, two] = [path.join(scratch, 'one'), path.join(scratch, 'two')];
    const line = ['--treatment', 'halftone', '--screen', 'even-grain', '--formats', 'png'];
    await prepare(one, ...line);
    await prepare(two, ...line);
    const names = readdirSync(one);
    expect(readdirSync(two)).toEqual(names);
    for (const name of names)
      expect(readFileSync(path.join(two, name)).equals(readFileSync(path.join(one, name)))).toBe(true);
  });

  test('blockers stop no file: status 1, and all of it is there', async () => {
    const out = path.join(scratch, 'blocked');
    const line = ['--treatment', 'solid', '--formats', 'png', '--out', out];
    const { status } = await runLine('prepare', sample('hairline.svg'), ...SPOT, ...line);
    expect(status).toBe(1);
    expect(readdirSync(out).filter((name) => name.endsWith('.json'))).toEqual([
      'manifest.json',
      'report.json',
    ]);
    expect(readdirSync(out)).toHaveLength(3);
  });

  test('pitch, direction, screen, mirror and a perpendicular pass reach the report', async () => {
    const out = path.join(scratch, 'asked');
    const { stdout } = await prepare(
      out,
      '--treatment',
      'halftone',
      '--screen',
      'published:stucki-1981',
      '--pitch-mm',
      '0.2',
      '--pitch-along-mm',
      '0.15',
      '--direction-deg',
      '90',
      '--perpendicular-pitch-mm',
      '0.25',
      '--mirror',
      '--firing',
      'pulsed',
      '--formats',
      'png',
      '--json',
    );
    const report = reportSchema.parse(JSON.parse(stdout));
    expect(report.settings).toMatchObject({
      screen: 'published:stucki-1981',
      mirror: true,
      firing: 'pulsed',
    });
    expect(report.passes.map(({ directionDeg, linePitchMm }) => [directionDeg, linePitchMm])).toEqual([
      [90, 0.2],
      [180, 0.25],
    ]);
    expect(report.passes[0]).toMatchObject({ lines: 150, alongPitchMm: 0.15 });
    expect(report.files).toHaveLength(2);
  });

  test('--pictures adds the five pictures', async () => {
    const out = path.join(scratch, 'pictures');
    await prepare(out, '--treatment', 'solid', '--formats', 'png', '--pitch-mm', '0.3', '--pictures');
    expect(readdirSync(path.join(out, 'pictures')).sort()).toEqual([
      'burned.png',
      'screened.png',
      'sent.png',
      'sized.png',
      'toned.png',
    ]);
  });
});

describe('refusals', () => {
  test.each([
    ['a spot that is missing', ['check', sample('stamp.png')], '--spot is needed'],
    [
      'a width out of range',
      ['check', sample('stamp.png'), ...SPOT, '--width-mm', '5000'],
      '--width-mm takes a number from 1 to 3000 mm',
    ],
    [
      'a screen that comes later',
      [
        'prepare',
        sample('stamp.png'),
        ...SPOT,
        '--treatment',
        'halftone',
        '--screen',
        'spot-aware',
        '--out',
        'x',
      ],
      'comes later',
    ],
    [
      'no size anywhere',
      ['prepare', sample('still-life.png'), ...SPOT, '--treatment', 'halftone', '--out', 'never-made'],
      '--width-mm is needed, from 1 to 3000 mm',
    ],
    [
      'a pitch that would not fit',
      [
        'prepare',
        sample('stamp.png'),
        ...SPOT,
        '--width-mm',
        '3000',
        '--pitch-mm',
        '0.01',
        '--treatment',
        'solid',
        '--out',
        'never-made',
      ],
      '--pitch-mm does not fit',
    ],
    [
      'a file in the place of the folder',
      ['prepare', sample('stamp.png'), ...SPOT, '--treatment', 'solid', '--out', sample('stamp.png')],
      '--out takes a folder',
    ],
  ])('%s: status 2, and the message names option and range', async (_name, argv, words) => {
    const { status, stdout, stderr } = await runLine(...argv);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(words);
  });

  test.each(['half-a-file.png', 'no-bytes.png', 'not-artwork.pdf', 'no-such-file.svg'])(
    '%s: status 3, one plain sentence or two, no stack',
    async (name) => {
      const { status, stdout, stderr } = await runLine(
        'check',
        sample(name),
        '--width-mm',
        '30',
        ...SPOT,
        '--json',
      );
      expect([status, stdout]).toEqual([3, '']);
      expect(stderr).toMatch(/^[A-Z][^\n]*\.\n$/);
      expect(stderr).not.toContain('Error');
    },
  );

  test('an artwork that cannot be read leaves no folder behind', async () => {
    const out = path.join(scratch, 'nothing');
    const { status } = await runLine(
      'prepare',
      sample('half-a-file.png'),
      '--width-mm',
      '30',
      ...SPOT,
      '--treatment',
      'solid',
      '--out',
      out,
    );
    expect(status).toBe(3);
    expect(readdirSync(scratch)).not.toContain('nothing');
  });

  test('a folder that cannot be made: status 4 and a sentence', async () => {
    const taken = path.join(scratch, 'taken');
    writeFileSync(taken, '');
    const line = [
      '--treatment',
      'solid',
      '--pitch-mm',
      '0.5',
      '--formats',
      'png',
      '--out',
      path.join(taken, 'below'),
    ];
    const { status, stderr } = await runLine('prepare', sample('stamp.png'), ...SPOT, ...line);
    expect(status).toBe(4);
    expect(stderr).toMatch(/^This did not work: /);
  });

  test('--help: status 0', async () => {
    const { status, stdout } = await runLine('--help');
    expect(status).toBe(0);
    expect(stdout).toContain('umberline check ART');
  });
});
