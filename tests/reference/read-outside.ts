import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { DEBIAN_PYTHON } from '../setup/reference-tool';

/** Hands bytes as a file of their own to a program and gives what it printed; fails when the program does. */
export function printed(command: string, args: readonly string[], bytes: Uint8Array, name: string): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'umberline-outside-'));
  try {
    const file = path.join(folder, name);
    writeFileSync(file, bytes);
    const outcome = spawnSync(command, [...args, file], { encoding: 'utf8', maxBuffer: 2 ** 28 });
    if (outcome.status !== 0)
      throw new Error(`${command} refused ${name}: ${outcome.stdout}${outcome.stderr}`);
    return outcome.stdout;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** The first group of a pattern in a text, as a number. */
export function figure(text: string, pattern: RegExp): number {
  const found = pattern.exec(text);
  if (!found) throw new Error(`expected ${pattern} in: ${text}`);
  return Number(found[1]);
}

export interface GreyPicture {
  width: number;
  height: number;
  /** 0 black to 255 white, row-major */
  grey: number[];
}

const PILLOW = `
import sys, json
from PIL import Image
picture = Image.open(sys.argv[1]).convert('L')
print(json.dumps({'width': picture.width, 'height': picture.height, 'grey': list(picture.getdata())}))
`;

/** A picture as Pillow sees it. */
export const asPillowSees = (bytes: Uint8Array, name: string): GreyPicture =>
  JSON.parse(printed(DEBIAN_PYTHON, ['-c', PILLOW], bytes, name)) as GreyPicture;
