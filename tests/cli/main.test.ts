import { spawnSync } from 'node:child_process';
import { expect, test } from 'vitest';
import { checkReportSchema } from '../../src/lib/prepare/report';
import { ROOT } from './run-line';

const spawned = (...argv: string[]) =>
  spawnSync('npm', ['run', '-s', 'umberline', '--', ...argv], { cwd: ROOT, encoding: 'utf8' });

test('through npm: one object on standard output, status 1 for blockers', () => {
  const { status, stdout, stderr } = spawned(
    'check',
    'samples/empty.png',
    '--width-mm',
    '40',
    '--spot',
    '0.07x0.11',
    '--json',
  );
  expect([status, stderr]).toEqual([1, '']);
  expect(checkReportSchema.parse(JSON.parse(stdout)).findings[0].id).toBe('empty');
});

test('through npm: a wrong command ends with status 2 and one line', () => {
  const { status, stdout, stderr } = spawned('check', 'samples/empty.png', '--spot', '9x9');
  expect([status, stdout]).toEqual([2, '']);
  expect(stderr).toBe('--spot takes a number from 0.005 to 5 mm, got "9".\n');
});
