// The whole suite in order, with one closing summary: lint, types, unit and reference tests, browser tests.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

const root = path.resolve(import.meta.dirname, '../..');
const bin = (name, file) => path.join(root, 'node_modules', name, file);
const scratch = mkdtempSync(path.join(tmpdir(), 'umberline-test-'));
const tally = path.join(scratch, 'tally');
const absent = path.join(scratch, 'absent');
const env = {
  ...process.env,
  ASTRO_TELEMETRY_DISABLED: '1',
  TEST_TALLY: tally,
  TEST_ABSENT: absent,
};

const steps = [
  ['lint', [bin('eslint', 'bin/eslint.js'), '.']],
  ['types', [bin('astro', 'astro.js'), 'check', '--minimumFailingSeverity', 'error']],
  ['unit and reference tests', [bin('vitest', 'vitest.mjs'), 'run']],
  ['build for the browser tests', [path.join(root, 'src/tooling/bootstrap.mjs'), '--build']],
  ['browser tests', [bin('vitest', 'vitest.mjs'), 'run', '--config', 'vitest.e2e.config.ts']],
];

const outcome = [];
for (const [name, args] of steps) {
  console.log(`\n— ${name}`);
  const began = performance.now();
  const result = spawnSync(process.execPath, args, { cwd: root, stdio: 'inherit', env });
  outcome.push({ name, ok: result.status === 0, seconds: (performance.now() - began) / 1000 });
}

const counts = { passed: 0, failed: 0, skipped: 0 };
const lines = existsSync(tally) ? readFileSync(tally, 'utf8').trim().split('\n').filter(Boolean) : [];
for (const line of lines) for (const [key, value] of Object.entries(JSON.parse(line))) counts[key] += value;
const absentTools = existsSync(absent)
  ? [...new Set(readFileSync(absent, 'utf8').trim().split('\n').filter(Boolean))].sort()
  : [];
rmSync(scratch, { recursive: true, force: true });

console.log('\nSummary');
for (const { name, ok, seconds } of outcome) {
  console.log(`  ${ok ? 'ok    ' : 'FAILED'} ${name.padEnd(30)} ${seconds.toFixed(0).padStart(4)} s`);
  // A step that fails outside a test, such as lint, counts as one failure.
  if (!ok && !name.includes('tests')) counts.failed += 1;
}
const brokenSuites = outcome.filter((step) => !step.ok && step.name.includes('tests')).length;
if (brokenSuites > 0 && counts.failed === 0) counts.failed = brokenSuites;
if (absentTools.length > 0)
  console.log(`  absent reference programs, their checks not run: ${absentTools.join(', ')}`);
console.log(`\n${counts.passed} passed, ${counts.failed} failed, ${counts.skipped} skipped`);
process.exit(counts.failed > 0 || outcome.some((step) => !step.ok) ? 1 : 0);
