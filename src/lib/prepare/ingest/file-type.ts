/** Kinds of artwork that are read. */
export type ReadableType = 'png' | 'jpeg' | 'webp' | 'tiff' | 'gif' | 'avif' | 'bmp' | 'svg' | 'svgz';

/** Kinds that are known by their bytes and refused with a word on what to export. */
export type RefusedType =
  | 'pdf'
  | 'ai'
  | 'eps'
  | 'heic'
  | 'psd'
  | 'dxf'
  | 'dwg'
  | 'cdr'
  | 'jpeg-xl'
  | 'jpeg-2000'
  | 'camera-raw'
  | 'icon'
  | 'metafile'
  | 'archive'
  | 'web-page'
  | 'unknown';

export type FileType = ReadableType | RefusedType;

const ascii = (bytes: Uint8Array, from: number, length: number): string =>
  String.fromCharCode(...bytes.subarray(from, from + length));

const startsWith = (bytes: Uint8Array, ...head: number[]): boolean =>
  head.every((byte, i) => bytes[i] === byte);

/** Brands that an ISO base media file says it is compatible with (ISO/IEC 14496-12, 4.3). */
function mediaBrands(bytes: Uint8Array): string[] {
  const length = Math.min(bytes.length, new DataView(bytes.buffer, bytes.byteOffset).getUint32(0));
  const brands = [ascii(bytes, 8, 4)];
  for (let at = 16; at + 4 <= length && brands.length < 64; at += 4) brands.push(ascii(bytes, at, 4));
  return brands;
}

function mediaType(bytes: Uint8Array): FileType {
  const brands = mediaBrands(bytes);
  if (brands.some((brand) => brand === 'avif' || brand === 'avis')) return 'avif';
  if (brands.some((brand) => /^(hei[cxms]|hev[cx]|mif1|msf1)$/.test(brand))) return 'heic';
  return brands[0].startsWith('crx') ? 'camera-raw' : 'unknown';
}

function riffType(bytes: Uint8Array): FileType {
  const form = ascii(bytes, 8, 4);
  if (form === 'WEBP') return 'webp';
  return form.startsWith('CDR') ? 'cdr' : 'unknown';
}

/** The first words of a file as Latin-1 text, a byte order mark and white space taken off. */
function openingWords(bytes: Uint8Array): string {
  const utf16 = startsWith(bytes, 0xff, 0xfe) || startsWith(bytes, 0xfe, 0xff);
  const label = startsWith(bytes, 0xfe, 0xff) ? 'utf-16be' : utf16 ? 'utf-16le' : 'latin1';
  const head = new TextDecoder(label).decode(bytes.subarray(0, 4096));
  return head.replace(/^(\u00ef\u00bb\u00bf|\ufeff)/, '').trimStart();
}

function textType(bytes: Uint8Array): FileType {
  const words = openingWords(bytes);
  if (/^(<\?xml|<!--|<!DOCTYPE\s+svg|<svg|<[A-Za-z_][\w.-]*:svg)/i.test(words)) {
    return /<!DOCTYPE\s+html|<html/i.test(words) ? 'web-page' : 'svg';
  }
  if (/^<(!DOCTYPE\s+html|html|head|body)/i.test(words)) return 'web-page';
  if (/%PDF-\d/.test(words.slice(0, 1024))) return 'pdf';
  if (words.startsWith('%!PS')) return /%%Creator: *Adobe Illustrator/i.test(words) ? 'ai' : 'eps';
  if (/^(0\s+SECTION\b|999\s)/.test(words) || words.startsWith('AutoCAD Binary DXF')) return 'dxf';
  return 'unknown';
}

const MAGIC: readonly { type: FileType; head: readonly number[] }[] = [
  { type: 'png', head: [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a] },
  { type: 'jpeg', head: [0xff, 0xd8, 0xff] },
  { type: 'gif', head: [0x47, 0x49, 0x46, 0x38] },
  { type: 'bmp', head: [0x42, 0x4d] },
  { type: 'svgz', head: [0x1f, 0x8b] },
  { type: 'eps', head: [0xc5, 0xd0, 0xd3, 0xc6] },
  { type: 'psd', head: [0x38, 0x42, 0x50, 0x53] },
  { type: 'dwg', head: [0x41, 0x43, 0x31, 0x30] },
  { type: 'jpeg-xl', head: [0xff, 0x0a] },
  { type: 'jpeg-xl', head: [0, 0, 0, 0x0c, 0x4a, 0x58, 0x4c, 0x20] },
  { type: 'jpeg-2000', head: [0, 0, 0, 0x0c, 0x6a, 0x50, 0x20, 0x20] },
  { type: 'icon', head: [0, 0, 1, 0] },
  { type: 'metafile', head: [0xd7, 0xcd, 0xc6, 0x9a] },
  { type: 'metafile', head: [1, 0, 0, 0] },
  { type: 'archive', head: [0x50, 0x4b, 3, 4] },
];

/**
 * What a file is, judged by its bytes alone; its name never counts.
 * Compares the signatures that the formats' standards fix, then the opening words of text.
 * @param bytes the whole file, any length; unchanged
 * @returns a readable type, a known refused one, or `unknown`; `unknown` for no bytes at all
 * @example fileType(new TextEncoder().encode('%PDF-1.7')) // 'pdf'
 * @see ISO/IEC 15948 (PNG), ITU-T T.81 (JPEG), TIFF 6.0, GIF89a, ISO/IEC 14496-12 (AVIF, HEIC)
 */
export function fileType(bytes: Uint8Array): FileType {
  if (bytes.length < 4) return 'unknown';
  const tiff = [
    [0x49, 0x49, 0x2a, 0],
    [0x4d, 0x4d, 0, 0x2a],
    [0x49, 0x49, 0x2b, 0],
    [0x4d, 0x4d, 0, 0x2b],
  ];
  if (tiff.some((head) => startsWith(bytes, ...head)))
    return ascii(bytes, 8, 2) === 'CR' ? 'camera-raw' : 'tiff';
  if (bytes.length >= 12 && ascii(bytes, 0, 4) === 'RIFF') return riffType(bytes);
  if (bytes.length >= 12 && ascii(bytes, 4, 4) === 'ftyp') return mediaType(bytes);
  return MAGIC.find(({ head }) => startsWith(bytes, ...head))?.type ?? textType(bytes);
}
