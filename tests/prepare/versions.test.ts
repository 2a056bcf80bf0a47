import { expect, test } from 'vitest';
import { versions } from '../../src/lib/prepare/versions';

test('every program that decides bytes is named with its version', () => {
  const found = versions();
  for (const name of [
    'pipeline',
    'sharp',
    'sharp/vips',
    'sharp/rsvg',
    'svgo',
    'potrace',
    'pdfkit',
    'zlib',
    'v8',
  ]) {
    expect(found[name], name).toMatch(/^\d/);
  }
  expect(versions()).toEqual(found);
  expect(JSON.parse(JSON.stringify(found))).toEqual(found);
});
