import { readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { dependencies } from '../../package.json';

const ROOT = path.resolve(import.meta.dirname, '../..');
const read = (name: string): string => readFileSync(path.join(ROOT, name), 'utf8');

/** Package names of the table's first column. */
const explained = [...read('DEVELOPERS.md').matchAll(/^\| ([a-z@][^|]*?) \|/gm)].flatMap(([, cell]) =>
  cell.split(', '),
);

test.each(Object.keys(dependencies))('DEVELOPERS.md says why %s is here', (name) => {
  expect(explained).toContain(name);
});

test('the README opens with the job in one paragraph, then a picture, then the two commands', () => {
  const [title, job, picture] = read('README.md').split('\n\n');
  expect(title).toBe('# Umberline');
  expect(job).toMatch(/^Umberline takes the artwork .*\.$/);
  const file = /^!\[.{20,}\]\((.+)\)$/.exec(picture)?.[1] ?? '';
  expect(readFileSync(path.join(ROOT, file)).length).toBeLessThan(200_000);
  expect(read('README.md').indexOf('npm start')).toBeLessThan(read('README.md').indexOf('npm test'));
});

test('every path that the README and DEVELOPERS.md name is there', () => {
  for (const document of ['README.md', 'DEVELOPERS.md']) {
    for (const [, target] of read(document).matchAll(/\]\(([^)#:]+)\)/g))
      expect(() => readFileSync(path.join(ROOT, target))).not.toThrow();
  }
});
