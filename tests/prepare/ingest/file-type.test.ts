import { describe, expect, test } from 'vitest';
import { fileType } from '../../../src/lib/prepare/ingest/file-type';
import { refusal } from '../../../src/lib/prepare/ingest/refusal';

const text = (words: string): Uint8Array => new TextEncoder().encode(words);
const bytes = (...values: number[]): Uint8Array =>
  Uint8Array.from([...values, ...new Array<number>(16).fill(0)]);

function media(major: string, ...compatible: string[]): Uint8Array {
  const brands = compatible.join('');
  const file = new Uint8Array(16 + brands.length);
  new DataView(file.buffer).setUint32(0, file.length);
  file.set(text(`ftyp${major}\0\0\0\0${brands}`), 4);
  return file;
}

const KNOWN: [string, Uint8Array][] = [
  ['png', bytes(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a)],
  ['jpeg', bytes(0xff, 0xd8, 0xff, 0xe0)],
  ['gif', text('GIF89a')],
  ['gif', text('GIF87a')],
  ['bmp', text('BM000000')],
  ['tiff', bytes(0x49, 0x49, 0x2a, 0)],
  ['tiff', bytes(0x4d, 0x4d, 0, 0x2a)],
  ['webp', text('RIFF0000WEBPVP8 ')],
  ['avif', media('avif', 'mif1')],
  ['avif', media('mif1', 'heic', 'avif')],
  ['svgz', bytes(0x1f, 0x8b, 8)],
  ['svg', text('<svg xmlns="http://www.w3.org/2000/svg"/>')],
  ['svg', text('\ufeff  <?xml version="1.0"?><!-- a note --><svg/>')],
  ['svg', text('<!-- drawn by hand --><svg/>')],
  ['svg', text('<s:svg xmlns:s="http://www.w3.org/2000/svg"/>')],
  ['pdf', text('%PDF-1.7')],
  ['pdf', text('junk before it\n%PDF-1.4')],
  ['eps', text('%!PS-Adobe-3.0 EPSF-3.0')],
  ['eps', bytes(0xc5, 0xd0, 0xd3, 0xc6)],
  ['ai', text('%!PS-Adobe-3.0\n%%Creator: Adobe Illustrator(R)')],
  ['heic', media('heic', 'mif1')],
  ['heic', media('mif1', 'heic')],
  ['camera-raw', media('crx ')],
  ['camera-raw', bytes(0x49, 0x49, 0x2a, 0, 16, 0, 0, 0, 0x43, 0x52)],
  ['psd', text('8BPS0000')],
  ['dxf', text('  0\nSECTION\n  2\nHEADER')],
  ['dxf', text('AutoCAD Binary DXF\r\n')],
  ['dwg', text('AC1032')],
  ['cdr', text('RIFF0000CDR9vrsn')],
  ['jpeg-xl', bytes(0xff, 0x0a)],
  ['archive', text('PK\x03\x04')],
  ['web-page', text('<!DOCTYPE html><html><body><svg/></body></html>')],
  ['unknown', text('hello')],
  ['unknown', text('')],
  ['unknown', text('RIFF0000WAVEfmt ')],
];

describe('type by the bytes', () => {
  test.each(KNOWN)('%s', (type, file) => expect(fileType(file)).toBe(type));

  test('a file of one to three bytes is unknown', () => {
    for (const length of [1, 2, 3])
      expect(fileType(bytes(0xff, 0xd8, 0xff).subarray(0, length))).toBe('unknown');
  });
});

describe('refusals', () => {
  const refused = [...new Set(KNOWN.map(([type]) => type))].filter((type) =>
    ['pdf', 'eps', 'ai', 'heic', 'camera-raw', 'psd', 'dxf', 'dwg', 'cdr', 'jpeg-xl'].includes(type),
  );
  test.each(refused)('%s says what to send instead', (type) => {
    const error = refusal(type as 'pdf');
    expect(error.code).toBe('unsupported-format');
    expect(error.message).toMatch(/SVG|PNG|JPEG/);
  });
});
