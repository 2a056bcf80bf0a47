import { createHash } from 'node:crypto';
import { mkdir, mkdtemp, readdir, readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { unpackWoff } from './woff';

/** The one family that is shipped; every weight of it is offered to drawings. */
export const SHIPPED_FAMILY = 'Manrope';

const SUBSET = /^manrope-(latin|latin-ext|cyrillic|cyrillic-ext|greek|vietnamese)-\d+-normal\.woff$/;

// Each weight's file calls itself a family of its own; the scan rule gathers them, weights come from the files.
const fontsConf = (folder: string): string => `<?xml version="1.0"?>
<!DOCTYPE fontconfig SYSTEM "fonts.dtd">
<fontconfig>
  <dir>${folder}/fonts</dir>
  <cachedir>${folder}/cache</cachedir>
  <match target="scan">
    <edit name="family" mode="assign"><string>${SHIPPED_FAMILY}</string></edit>
    <edit name="fullname" mode="delete_all"/>
    <edit name="style" mode="delete_all"/>
  </match>
  <config><rescan><int>0</int></rescan></config>
</fontconfig>
`;

const escapeXml = (text: string): string => text.replace(/&/g, '&amp;').replace(/</g, '&lt;');

async function write(folder: string, source: string, names: string[]): Promise<void> {
  await mkdir(join(folder, 'fonts'), { recursive: true });
  await mkdir(join(folder, 'cache'), { recursive: true });
  for (const name of names) {
    const font = unpackWoff(await readFile(join(source, name)));
    await writeFile(join(folder, 'fonts', name.replace(/\.woff$/, '.ttf')), font);
  }
}

async function exists(path: string): Promise<boolean> {
  return stat(path).then(
    () => true,
    () => false,
  );
}

/** Beside the packages where that may be written, else in a new folder of this process's own. */
async function parentFolder(root: string): Promise<string> {
  const beside = join(root, 'node_modules', '.cache', 'umberline');
  try {
    await mkdir(beside, { recursive: true });
    const probe = await mkdtemp(join(beside, 'probe-'));
    await rm(probe, { recursive: true });
    return beside;
  } catch {
    return mkdtemp(join(tmpdir(), 'umberline-fonts-'));
  }
}

/**
 * Path of a fontconfig file that knows the shipped fonts and nothing else. The text renderer reads bare TrueType only, so
 * the packaged WOFF files are unpacked once and kept beside the packages.
 */
export async function shippedFontsConf(root: string): Promise<string> {
  const source = join(root, 'node_modules', '@fontsource', 'manrope', 'files');
  const names = (await readdir(source)).filter((name) => SUBSET.test(name)).sort();
  const parent = await parentFolder(root);
  const { version } = JSON.parse(await readFile(join(source, '..', 'package.json'), 'utf8')) as {
    version: string;
  };
  const key = createHash('sha256')
    .update([version, ...names, fontsConf(parent)].join('\n'))
    .digest('hex')
    .slice(0, 12);
  const folder = join(parent, `fonts-${key}`);
  const conf = join(folder, 'fonts.conf');
  if (await exists(conf)) return conf;
  const fresh = await mkdtemp(join(parent, 'new-'));
  await write(fresh, source, names);
  await writeFile(join(fresh, 'fonts.conf'), fontsConf(escapeXml(folder)));
  // Whoever comes first wins; the folder appears whole or not at all.
  await rename(fresh, folder).catch(async (cause: unknown) => {
    await rm(fresh, { recursive: true, force: true });
    if (!(await exists(conf))) throw new Error(`the fonts could not be laid out in ${folder}`, { cause });
  });
  return conf;
}
