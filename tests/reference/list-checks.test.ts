import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { checksBelow, checksIn, freshReadme, README, replaceBetween, tableOf } from './list-checks';

const CALL = `import { referenceCheck } from './check';
referenceCheck({ what: 'a | b', basis: 'published', source: 'A book', within: '1 %' }, () => {});
referenceCheck({ what: 'c', basis: 'memory', source: 'nobody' }, () => {});`;

test('the table in the README is the one that the checks give now', () => {
  expect(readFileSync(README, 'utf8'), 'run: node --import tsx tests/reference/list-checks.ts').toBe(
    freshReadme(),
  );
});

test('every file of reference tests holds at least one listed check', () => {
  const listed = new Set(checksBelow(import.meta.dirname).map((check) => check.file));
  const files = readdirSync(import.meta.dirname, { recursive: true, encoding: 'utf8' });
  const silent = files.filter((name) => name.endsWith('.test.ts') && !listed.has(name));
  expect(silent).toEqual([path.basename(import.meta.filename)]);
});

test('checks are read from the source with all their words', () => {
  expect(checksIn(CALL, 'x.test.ts')).toEqual([
    { what: 'a | b', basis: 'published', source: 'A book', within: '1 %', file: 'x.test.ts' },
    { what: 'c', basis: 'memory', source: 'nobody', within: undefined, file: 'x.test.ts' },
  ]);
});

test('a check whose words are not written out is refused', () => {
  expect(() => checksIn('referenceCheck({ what, basis: "published", source: "s" }, f)', 'x')).toThrow(
    'written out',
  );
  expect(() => checksIn('referenceCheck({ what: "w", basis: "hearsay", source: "s" }, f)', 'x')).toThrow(
    'basis',
  );
  expect(() => checksIn('referenceCheck(shared, f)', 'x')).toThrow('written out');
});

test('the weightiest basis comes first and bars in the text stay inside their cell', () => {
  const rows = tableOf([...checksIn(CALL, 'x')].reverse())
    .split('\n')
    .slice(2);
  expect(rows).toEqual(['| a \\| b | published | A book | 1 % |', '| c | memory | nobody | exact |']);
});

test('only what stands between the marks is replaced', () => {
  expect(replaceBetween('top [ old ] end', '[', ']', 'new')).toBe('top [\nnew\n] end');
  expect(() => replaceBetween('no marks', '[', ']', 'new')).toThrow('marks');
});
