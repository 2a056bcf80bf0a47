import { mkdir, mkdtemp, open, rename, rm, stat } from 'node:fs/promises';
import path from 'node:path';

export interface FileToWrite {
  /** path below the folder, with / between its parts */
  name: string;
  bytes: Uint8Array | string;
}

async function writeThrough(file: string, bytes: Uint8Array | string): Promise<void> {
  await mkdir(path.dirname(file), { recursive: true });
  const handle = await open(file, 'wx');
  try {
    await handle.writeFile(bytes);
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Whether something other than a folder stands at a path. */
export async function isTakenByFile(target: string): Promise<boolean> {
  try {
    return !(await stat(target)).isDirectory();
  } catch {
    return false;
  }
}

/**
 * Writes files into a folder so that none is ever there by half: all of them first into a folder of their own beside it,
 * then each by one rename, in the order given. The last one may so serve as the sign that all are there.
 */
export async function writeFolder(folder: string, files: readonly FileToWrite[]): Promise<void> {
  const target = path.resolve(folder);
  await mkdir(path.dirname(target), { recursive: true });
  const partial = await mkdtemp(`${target}.partial-`);
  try {
    for (const { name, bytes } of files) await writeThrough(path.join(partial, name), bytes);
    await mkdir(target, { recursive: true });
    for (const { name } of files) {
      await mkdir(path.dirname(path.join(target, name)), { recursive: true });
      await rename(path.join(partial, name), path.join(target, name));
    }
  } finally {
    await rm(partial, { recursive: true, force: true });
  }
}
