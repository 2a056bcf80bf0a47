import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect, test } from 'vitest';
import { countAbsent, hasTool, needsTool, REFERENCE_TOOLS, type ReferenceToolName } from './reference-tool';

const NAMES = Object.keys(REFERENCE_TOOLS) as ReferenceToolName[];

test.each(NAMES)('%s is here, or fails under CI and is counted elsewhere', (name) => {
  needsTool(name);
  expect(hasTool(name)).toBe(true);
});

test('an absent tool is added to the tally by name, one line for each test', () => {
  const folder = mkdtempSync(path.join(tmpdir(), 'umberline-tally-'));
  const tally = path.join(folder, 'absent');
  for (const tool of ['potrace', 'qpdf', 'potrace'] as const) countAbsent(tool, { TEST_ABSENT: tally });
  expect(readFileSync(tally, 'utf8')).toBe('potrace\nqpdf\npotrace\n');
  rmSync(folder, { recursive: true });
});

test('without a tally file nothing is written', () => {
  expect(() => countAbsent('vips', {})).not.toThrow();
});
