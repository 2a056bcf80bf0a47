import {
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  truncateSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { readArtwork } from '../../src/cli/read-artwork';
import { isTakenByFile, writeFolder } from '../../src/cli/write-folder';
import { ArtworkError } from '../../src/lib/prepare/tools';

let scratch = '';
beforeEach(() => {
  scratch = mkdtempSync(path.join(tmpdir(), 'umberline-cli-'));
});
afterEach(() => rmSync(scratch, { recursive: true, force: true }));

const FILES = [
  { name: 'a.png', bytes: new Uint8Array([1, 2]) },
  { name: 'pictures/sent.png', bytes: new Uint8Array([3]) },
  { name: 'manifest.json', bytes: '{}' },
];

test('files land in the folder, also below it, and nothing else stays behind', async () => {
  const out = path.join(scratch, 'deep', 'out');
  await writeFolder(out, FILES);
  expect(readdirSync(out, { recursive: true }).sort()).toEqual([
    'a.png',
    'manifest.json',
    'pictures',
    'pictures/sent.png',
  ]);
  expect([...readFileSync(path.join(out, 'a.png'))]).toEqual([1, 2]);
  expect(readdirSync(path.dirname(out))).toEqual(['out']);
});

test('other files of the folder stay; a file of the same name is replaced', async () => {
  const out = path.join(scratch, 'out');
  mkdirSync(out);
  writeFileSync(path.join(out, 'notes.txt'), 'mine');
  writeFileSync(path.join(out, 'manifest.json'), 'old');
  await writeFolder(out, FILES);
  expect(readFileSync(path.join(out, 'notes.txt'), 'utf8')).toBe('mine');
  expect(readFileSync(path.join(out, 'manifest.json'), 'utf8')).toBe('{}');
});

test('when one file cannot be written, none is', async () => {
  const out = path.join(scratch, 'out');
  const twice = [...FILES, FILES[0]];
  await expect(writeFolder(out, twice)).rejects.toThrow('EEXIST');
  expect(readdirSync(scratch)).toEqual([]);
});

test('a file in the place of the folder is seen', async () => {
  writeFileSync(path.join(scratch, 'out'), '');
  expect(await isTakenByFile(path.join(scratch, 'out'))).toBe(true);
  expect(await isTakenByFile(scratch)).toBe(false);
  expect(await isTakenByFile(path.join(scratch, 'none'))).toBe(false);
});

test('an artwork is read as its bytes', async () => {
  const file = path.join(scratch, 'a');
  writeFileSync(file, 'abc');
  expect(Buffer.from(await readArtwork(file)).toString()).toBe('abc');
});

test('a missing file, a folder and a file beyond the limit are each named plainly', async () => {
  await expect(readArtwork(path.join(scratch, 'none.png'))).rejects.toThrow('There is no file at this path.');
  await expect(readArtwork(scratch)).rejects.toThrow('This is a folder');
  const large = path.join(scratch, 'large');
  writeFileSync(large, '');
  truncateSync(large, 64 * 1024 * 1024 + 1);
  await expect(readArtwork(large)).rejects.toThrow('larger than 64 MiB');
  await expect(readArtwork(large)).rejects.toBeInstanceOf(ArtworkError);
});
