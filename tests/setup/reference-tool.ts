import { spawnSync } from 'node:child_process';
import { appendFileSync } from 'node:fs';
import { TestRunner } from 'vitest';

interface ReferenceTool {
  /** Debian package that brings it */
  debianPackage: string;
  command: string;
  /** arguments of a call that does nothing and succeeds when the tool is there */
  probe: readonly string[];
}

/** Debian's own Python: others on the path do not see Debian's packages. */
export const DEBIAN_PYTHON = '/usr/bin/python3';

/** Every program from outside that a test holds our results against, by the name that tests use. */
export const REFERENCE_TOOLS = {
  potrace: { debianPackage: 'potrace', command: 'potrace', probe: ['--version'] },
  pngcheck: { debianPackage: 'pngcheck', command: 'pngcheck', probe: ['-h'] },
  tiffinfo: { debianPackage: 'libtiff-tools', command: 'tiffinfo', probe: ['-h'] },
  pdfinfo: { debianPackage: 'poppler-utils', command: 'pdfinfo', probe: ['-v'] },
  qpdf: { debianPackage: 'qpdf', command: 'qpdf', probe: ['--version'] },
  'rsvg-convert': { debianPackage: 'librsvg2-bin', command: 'rsvg-convert', probe: ['--version'] },
  'python3-skimage': {
    debianPackage: 'python3-skimage',
    command: DEBIAN_PYTHON,
    probe: ['-c', 'import skimage'],
  },
  'python3-pil': { debianPackage: 'python3-pil', command: DEBIAN_PYTHON, probe: ['-c', 'import PIL.Image'] },
  convert: { debianPackage: 'imagemagick', command: 'convert', probe: ['-version'] },
  vips: { debianPackage: 'libvips-tools', command: 'vips', probe: ['--version'] },
  chromium: { debianPackage: 'chromium', command: 'chromium', probe: ['--version'] },
} as const satisfies Record<string, ReferenceTool>;
export type ReferenceToolName = keyof typeof REFERENCE_TOOLS;

const present = new Map<ReferenceToolName, boolean>();

/** Whether a reference tool can be called here. */
export function hasTool(name: ReferenceToolName): boolean {
  const known = present.get(name);
  if (known !== undefined) return known;
  const { command, probe } = REFERENCE_TOOLS[name];
  const outcome = spawnSync(command, [...probe], { stdio: 'ignore' });
  // Some of these tools answer their own help with status 1: only a call that could not start means absence.
  const there = command === DEBIAN_PYTHON ? outcome.status === 0 : outcome.error === undefined;
  present.set(name, there);
  return there;
}

/** Adds a line with an absent tool's name, one for each test, to the file that TEST_ABSENT names for the run's summary. */
export function countAbsent(tool: ReferenceToolName, env: NodeJS.ProcessEnv = process.env): void {
  if (env.TEST_ABSENT) appendFileSync(env.TEST_ABSENT, `${tool}\n`);
}

/**
 * First line of a test that calls tools from outside: where one is absent the test fails under CI, and elsewhere it is
 * skipped and counted by name.
 */
export function needsTool(...names: ReferenceToolName[]): void {
  const test = TestRunner.getCurrentTest();
  if (!test) throw new Error('needsTool must be called inside a test');
  for (const name of names) {
    if (hasTool(name)) continue;
    const { debianPackage } = REFERENCE_TOOLS[name];
    if (process.env.CI)
      throw new Error(`reference tool ${name} is absent: install Debian's ${debianPackage}`);
    countAbsent(name);
    test.context.skip(`needs ${name} (Debian's ${debianPackage})`);
  }
}
