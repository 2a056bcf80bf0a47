import { createHash } from 'node:crypto';
import { gzipSync } from 'node:zlib';
import { describe, expect, test } from 'vitest';
import { readSvg } from '../../../src/lib/prepare/svg/read-svg';
import { turnVector } from '../../../src/lib/prepare/svg/turn-vector';
import { readRoot } from '../../../src/lib/prepare/svg/window-svg';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const svg = (inner: string, root = 'width="40mm" height="20mm" viewBox="0 0 80 40"'): Uint8Array =>
  bytes(`<svg xmlns="http://www.w3.org/2000/svg" ${root}>${inner}</svg>`);
const textOf = (drawing: Uint8Array): string => new TextDecoder().decode(drawing);

describe('readSvg', () => {
  test('says what the file is', async () => {
    const file = svg('<rect width="9" height="9"/>');
    const artwork = await readSvg(file);
    expect(artwork.facts).toMatchObject({ format: 'svg', kind: 'vector', bytes: file.length });
    expect(artwork.facts.sha256).toBe(createHash('sha256').update(file).digest('hex'));
    expect(artwork.facts.ownWidthMm).toBeCloseTo(40, 9);
    expect(artwork.facts.ownHeightMm).toBeCloseTo(20, 9);
    expect(artwork.aspect).toBeCloseTo(2, 9);
    expect(artwork.removed).toEqual([]);
    expect(artwork.missingFonts).toEqual([]);
  });

  test('the same bytes come out each time, and packed', async () => {
    const file = svg('<style>.a{fill:red}</style><rect class="a" width="9" height="9"/>');
    const [once, twice, packed] = await Promise.all([readSvg(file), readSvg(file), readSvg(gzipSync(file))]);
    expect(textOf(twice.svg)).toBe(textOf(once.svg));
    expect(textOf(packed.svg)).toBe(textOf(once.svg));
  });

  test('a clean drawing read again changes nothing that is drawn', async () => {
    const once = await readSvg(
      svg('<g transform="scale(2)"><rect width="9" height="9" style="fill:red"/></g>'),
    );
    const again = await readSvg(once.svg);
    expect(again.removed).toEqual([]);
    expect(readRoot(again.svg).frame).toEqual(readRoot(once.svg).frame);
    expect(textOf(again.svg)).toContain(
      '<g transform="scale(2)"><rect width="9" height="9" style="fill:red"/></g>',
    );
  });

  test('UTF-16, Latin-1 and a byte order mark are read', async () => {
    const text =
      '<?xml version="1.0" encoding="UTF-16"?><svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 9 9"><text>ü</text></svg>';
    const wide = new Uint8Array([0xff, 0xfe, ...Buffer.from(text, 'utf16le')]);
    expect(textOf((await readSvg(wide)).svg)).toContain('ü');
    const latin = Buffer.from(text.replace('UTF-16', 'ISO-8859-1'), 'latin1');
    expect(textOf((await readSvg(latin)).svg)).toContain('ü');
    const marked = new Uint8Array([0xef, 0xbb, 0xbf, ...bytes(text.replace('UTF-16', 'UTF-8'))]);
    expect(textOf((await readSvg(marked)).svg)).toContain('ü');
  });

  test('elements of drawing programs and comments go without a word', async () => {
    const inner =
      '<!-- c --><metadata/><title>t</title><sodipodi:namedview xmlns:sodipodi="x"/><i:pgf xmlns:i="y">aa</i:pgf><svg:rect xmlns:svg="http://www.w3.org/2000/svg" width="9"/>';
    const artwork = await readSvg(svg(inner));
    expect(artwork.removed).toEqual([]);
    expect(textOf(artwork.svg)).toMatch(/style="overflow:visible"><rect width="9"\/><\/svg><\/svg>$/);
  });

  test('markup in text and attributes stays text', async () => {
    const artwork = await readSvg(svg('<text id="&quot;&lt;script&gt;">&lt;script&gt;</text>'));
    expect(textOf(artwork.svg)).toContain('<text id="&quot;&lt;script&gt;">&lt;script&gt;</text>');
  });

  test('missing fonts: the first wish of visible text, each once, in order', async () => {
    const inner = `<style>.b{font:bold 12px/1.5 'Garamond', serif}</style><g font-family="Arial, Helvetica"><text>a</text><text>b</text></g>
      <text class="b">c</text><text font-family="Manrope">d</text><text font-family="Times"> </text><text>e</text>
      <text font-family="manrope, Arial">f</text><text font-family="sans-serif">g</text><g display="none"><text font-family="Q">h</text></g>
      <text font-family="Arial"><tspan font-family="'Comic Sans MS'">i</tspan></text>`;
    expect((await readSvg(svg(inner))).missingFonts).toEqual(['Arial', 'Garamond', 'Comic Sans MS']);
  });

  test('too large, cut off and not well-formed are told apart', async () => {
    await expect(readSvg(new Uint8Array(6_000_000).fill(32))).rejects.toMatchObject({ code: 'too-large' });
    await expect(readSvg(bytes('<svg viewBox="0 0 1 1"><g>'))).rejects.toMatchObject({ code: 'truncated' });
    await expect(readSvg(bytes('<svg viewBox="0 0 1 1"><g></svg>'))).rejects.toMatchObject({
      code: 'unreadable',
    });
    await expect(readSvg(bytes('<svg viewBox="0 0 1 1" a="1" a="2"/>'))).rejects.toMatchObject({
      code: 'unreadable',
    });
    await expect(readSvg(new Uint8Array([0x3c, 0x73, 0xff, 0xff]))).rejects.toMatchObject({
      code: 'unreadable',
    });
  });
});

describe('turnVector', () => {
  test('exchanges the sides for odd turns', async () => {
    const artwork = await readSvg(svg('<rect width="9" height="9"/>'));
    expect(turnVector(artwork, 0)).toBe(artwork);
    expect(turnVector(artwork, 1).aspect).toBeCloseTo(0.5, 9);
    expect(turnVector(artwork, 1).facts.ownWidthMm).toBeCloseTo(20, 9);
    expect(turnVector(artwork, 2).aspect).toBeCloseTo(2, 9);
    expect(turnVector(turnVector(artwork, 3), 3).facts.ownWidthMm).toBeCloseTo(40, 9);
  });
});
