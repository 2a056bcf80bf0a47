import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { expect, test } from 'vitest';

test('thirty preparations in one process take no more memory than ten', () => {
  const root = path.resolve(import.meta.dirname, '../..');
  const script = path.join(root, 'tests/prepare/soak-run.ts');
  const run = spawnSync(process.execPath, ['--import', 'tsx', script], { cwd: root, encoding: 'utf8' });
  expect(run.stderr).toBe('');
  const memory = JSON.parse(run.stdout) as number[];
  expect(memory).toHaveLength(6);
  // A leak of one raster a preparation, some MB in all its stages, would show as 40 MB and more; collected memory comes and goes.
  expect(Math.min(...memory.slice(3)) - Math.max(...memory.slice(0, 2)), memory.join(' ')).toBeLessThan(20);
}, 180_000);
