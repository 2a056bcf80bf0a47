import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { DRAWINGS } from '../../samples/drawings';
import { PICTURES } from '../../samples/pictures';
import { findingIdSchema, severitySchema } from '../../src/lib/preflight/finding';
import { reportSchema } from '../../src/lib/prepare/report';
import { treatmentSchema } from '../../src/lib/prepare/settings';
import { ROOT, runLine } from '../cli/run-line';

const FOLDER = path.join(ROOT, 'samples');
const MADE = [...Object.keys(DRAWINGS), ...Object.keys(PICTURES)].sort();

const expectedSchema = z.record(
  z.string(),
  z.strictObject({
    args: z.array(z.string()),
    status: z.union([z.literal(0), z.literal(1), z.literal(3)]),
    /** every finding and its severity; absent where the file cannot be read */
    findings: z.partialRecord(findingIdSchema, severitySchema).optional(),
    /** the suggested one, which it is then prepared by */
    treatment: treatmentSchema.optional(),
    /** placed width and height, mm */
    size: z.tuple([z.number(), z.number()]).optional(),
    /** smallest width without hairline and fill-in, mm, to one part in fifty */
    soundWidthMm: z.number().optional(),
  }),
);
const expected = expectedSchema.parse(JSON.parse(readFileSync(path.join(FOLDER, 'expected.json'), 'utf8')));

test('every sample is made, listed in the README and expected to show something', () => {
  const rest = readdirSync(FOLDER).filter((name) => !/\.(ts|md|json)$/.test(name));
  expect(rest.sort()).toEqual(MADE);
  expect(Object.keys(expected).sort()).toEqual(MADE);
  const readme = readFileSync(path.join(FOLDER, 'README.md'), 'utf8');
  for (const name of MADE)
    expect(readme, name).toMatch(new RegExp(`^\\|[^|]*\\b${name.replaceAll('.', '\\.')}\\b`, 'm'));
});

test.each(Object.keys(DRAWINGS))('%s is what its script draws', (name) => {
  expect(readFileSync(path.join(FOLDER, name), 'utf8')).toBe(DRAWINGS[name]());
});

let scratch = '';
beforeAll(() => {
  scratch = mkdtempSync(path.join(tmpdir(), 'umberline-samples-'));
});
afterAll(() => rmSync(scratch, { recursive: true, force: true }));

describe('what is found in each, and what comes out', () => {
  test.each(Object.entries(expected))(
    '%s',
    async (name, { args, status, findings, treatment = 'solid', size, soundWidthMm }) => {
      const out = path.join(scratch, name);
      // A coarse pitch makes small files; widths are held against the spot all the same.
      const line = [
        '--spot',
        '0.07x0.11',
        '--pitch-mm',
        '0.25',
        '--formats',
        'png',
        '--treatment',
        treatment,
        '--json',
        ...args,
      ];
      const outcome = await runLine('prepare', path.join(FOLDER, name), '--out', out, ...line);
      expect(outcome.status, outcome.stderr).toBe(status);
      if (status === 3) return;
      const report = reportSchema.parse(JSON.parse(outcome.stdout));
      expect(Object.fromEntries(report.findings.map(({ id, severity }) => [id, severity]))).toEqual(findings);
      expect(report.artwork.suggestedTreatment).toBe(treatment);
      const written =
        treatment === 'linework' ? ['.json', '.json', '.pdf', '.svg'] : ['.json', '.json', '.png'];
      expect(readdirSync(out).map(path.extname).sort()).toEqual(written);
      if (size) {
        expect(report.widthMm).toBeCloseTo(size[0], 2);
        expect(report.heightMm).toBeCloseTo(size[1], 2);
      }
      if (soundWidthMm)
        expect(Math.abs((report.smallestSoundWidthMm ?? 0) / soundWidthMm - 1)).toBeLessThan(0.02);
    },
  );
});
