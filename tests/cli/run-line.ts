import path from 'node:path';
import { run } from '../../src/cli/run';
import type { ExitStatus } from '../../src/cli/exit-status';

export const ROOT = path.resolve(import.meta.dirname, '../..');

export interface Outcome {
  status: ExitStatus;
  stdout: string;
  stderr: string;
}

/** Runs one command line in this process. */
export async function runLine(...argv: string[]): Promise<Outcome> {
  let [stdout, stderr] = ['', ''];
  const status = await run(argv, {
    stdout: (text) => (stdout += text),
    stderr: (text) => (stderr += text),
    root: ROOT,
  });
  return { status, stdout, stderr };
}
