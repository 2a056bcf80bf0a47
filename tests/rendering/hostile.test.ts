import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { nodeTools } from '../../src/rendering/node-tools';
import { hasCeilings } from '../../src/rendering/limited-child';
import { readSvg } from '../../src/lib/prepare/svg/read-svg';
import { renderVector } from '../../src/lib/prepare/svg/render-vector';
import { ArtworkError } from '../../src/lib/prepare/tools';

// Every drawing here tries to reach out, to last or to grow. Each is refused with a sentence or drawn without harm, within
// ten seconds and half a gigabyte, and the server on loopback that it tries to call hears nothing.
const tools = nodeTools();
const calls: string[] = [];
let canary: Server;
let address = '';
let folder = '';

beforeAll(async () => {
  canary = createServer((request, response) => {
    calls.push(request.url ?? '');
    response.end();
  });
  await new Promise<void>((resolve) => canary.listen(0, '127.0.0.1', resolve));
  address = `http://127.0.0.1:${(canary.address() as AddressInfo).port}`;
  folder = mkdtempSync(join(tmpdir(), 'umberline-marker-'));
  const black = await sharp({ create: { width: 8, height: 8, channels: 3, background: 'black' } })
    .png()
    .toBuffer();
  writeFileSync(join(folder, 'marker.png'), black);
});
afterAll(async () => {
  rmSync(folder, { recursive: true });
  await new Promise((resolve) => canary.close(resolve));
});

const svg = (inner: string, root = 'width="40" height="40" viewBox="0 0 40 40"', before = ''): Uint8Array =>
  new TextEncoder().encode(
    `${before}<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" ${root}>${inner}</svg>`,
  );

interface Outcome {
  refused: string | null;
  code: string | null;
  removed: string[];
  /** share of the picture that is ink */
  ink: number;
}

async function handle(bytes: Uint8Array, sidePx = 400): Promise<Outcome> {
  const started = performance.now();
  const outcome: Outcome = { refused: null, code: null, removed: [], ink: 0 };
  try {
    const artwork = await readSvg(bytes);
    outcome.removed = artwork.removed;
    const light = await renderVector(artwork, { widthPx: sidePx, heightPx: sidePx }, tools);
    outcome.ink = light.reduce((sum, value) => sum + (value < 32768 ? 1 : 0), 0) / light.length;
  } catch (error) {
    if (!(error instanceof ArtworkError)) throw error;
    outcome.refused = error.message;
    outcome.code = error.code;
  }
  expect(performance.now() - started).toBeLessThan(10_000);
  expect(process.memoryUsage().rss).toBeLessThan(512 * 1024 * 1024);
  expect(calls).toEqual([]);
  if (outcome.refused !== null) expect(outcome.refused).toMatch(/^This .+\.$/);
  return outcome;
}

describe('reaching out', () => {
  const square = '<rect width="20" height="40"/>';

  test('a remote picture is left out and said', async () => {
    const outcome = await handle(
      svg(`${square}<image width="40" height="40" xlink:href="${address}/a.png"/>`),
    );
    expect(outcome.removed).toEqual(['References to files or addresses outside the drawing were taken out.']);
    expect(outcome.ink).toBeCloseTo(0.5, 2);
  });

  test.each(['marker.png', './marker.png', 'file:///marker.png', '../marker.png'])(
    'a picture beside the working folder is not drawn: %s',
    async (name) => {
      const href = name.startsWith('file') ? `file://${folder}/marker.png` : name;
      const before = process.cwd();
      process.chdir(folder);
      try {
        const outcome = await handle(svg(`<image width="40" height="40" href="${href}"/>`));
        expect(outcome.ink).toBe(0);
      } finally {
        process.chdir(before);
      }
    },
  );

  test('script, handler, web content and animation are taken out and said', async () => {
    const inner = `<script>fetch("${address}")</script><script href="${address}/s.js"/>
      <foreignObject width="40" height="40"><body xmlns="http://www.w3.org/1999/xhtml"><img src="${address}/i.png"/></body></foreignObject>
      <rect width="20" height="40" onload="fetch('${address}')"><animate attributeName="width" to="40" dur="1s"/></rect>`;
    const outcome = await handle(svg(inner));
    expect(outcome.removed).toEqual([
      'Scripts were taken out.',
      'Event handlers were taken out.',
      'Embedded web content (foreignObject) was taken out.',
      'Animations were taken out; the drawing stands as it is before they start.',
    ]);
    expect(outcome.ink).toBeCloseTo(0.5, 2);
  });

  test('style sheets load nothing', async () => {
    const inner = `<style>@import url(${address}/a.css); @font-face{font-family:x;src:url(${address}/x.woff)}
      rect{fill:url(${address}/p.svg#p) black;filter:url('${address}/f.svg#f')} text{font-family:x}</style>
      <rect width="20" height="40"/><text y="30" style="background:url(${address}/b.png)">x</text>`;
    const outcome = await handle(
      svg(inner, undefined, `<?xml-stylesheet href="${address}/p.css" type="text/css"?>`),
    );
    expect(outcome.removed).toContain('Imported style sheets were taken out.');
    expect(outcome.removed).toContain(
      'Fonts carried inside the drawing are not read; turn such text into outlines.',
    );
  });

  test('an address hidden by escapes or comments is taken out', async () => {
    const artwork = await readSvg(
      svg(
        `<rect width="9" height="9" style="fill:u\\72l(${address}/a);stroke:url(/**/${address}/b);mask:URL( '${address}/c' )"/>`,
      ),
    );
    const text = new TextDecoder().decode(artwork.svg);
    expect(text).not.toContain('127.0.0.1');
    expect(text).not.toContain('\\');
  });

  test('use, gradients, filters and feImage of another document are not followed', async () => {
    const inner = `<use href="${address}/a.svg#a"/><linearGradient id="g" href="${address}/g.svg#g"/>
      <filter id="f"><feImage href="${address}/b.png"/></filter><rect width="20" height="40" fill="url(#g)" filter="url(#f)"/>`;
    const artwork = await readSvg(svg(inner));
    expect(new TextDecoder().decode(artwork.svg)).not.toContain('127.0.0.1');
    await handle(svg(inner));
  });

  test('a picture that is a drawing in turn is left out', async () => {
    const within = Buffer.from(svg(`<image width="9" height="9" href="${address}/x.png"/>`)).toString(
      'base64',
    );
    const outcome = await handle(
      svg(`<image width="40" height="40" href="data:image/svg+xml;base64,${within}"/>`),
    );
    expect(outcome.removed).toEqual([
      'Embedded pictures of a kind that we do not read (only PNG and JPEG) were taken out.',
    ]);
  });

  test('a picture carried inside is drawn', async () => {
    const black = await sharp({ create: { width: 8, height: 8, channels: 3, background: 'black' } })
      .png()
      .toBuffer();
    const outcome = await handle(
      svg(`<image width="20" height="20" href="data:image/png;base64,${black.toString('base64')}"/>`),
    );
    expect(outcome.removed).toEqual([]);
    expect(outcome.ink).toBeCloseTo(0.25, 2);
  });
});

describe('entities', () => {
  test('an external entity is not read', async () => {
    const doctype = `<!DOCTYPE svg [<!ENTITY x SYSTEM "file://${folder}/marker.png"><!ENTITY y SYSTEM "${address}/e">]>`;
    expect((await handle(svg('<text>&x;&y;</text>', undefined, doctype))).code).toBe('unreadable');
    const unused = await handle(svg('<rect width="20" height="40"/>', undefined, doctype));
    expect(unused.removed).toEqual(['Entity declarations were taken out.']);
  });

  test('a parameter entity and an external subset are not read', async () => {
    const doctype = `<!DOCTYPE svg SYSTEM "${address}/svg.dtd" [<!ENTITY % p SYSTEM "${address}/p.dtd"> %p;]>`;
    await handle(svg('<rect width="20" height="40"/>', undefined, doctype));
  });

  test('a billion laughs are refused', async () => {
    const levels = Array.from({ length: 9 }, (_, n) => `<!ENTITY l${n + 1} "${`&l${n};`.repeat(10)}">`).join(
      '',
    );
    const doctype = `<!DOCTYPE svg [<!ENTITY l0 "lol">${levels}]>`;
    expect((await handle(svg('<text>&l9;</text>', undefined, doctype))).code).toBe('unreadable');
  });

  test('plain entities, as drawing programs write them for namespaces, are read', async () => {
    const text = `<!DOCTYPE svg [<!ENTITY ns_svg "http://www.w3.org/2000/svg">]>
      <svg xmlns="&ns_svg;" viewBox="0 0 40 40"><rect width="20" height="40"/></svg>`;
    expect((await handle(new TextEncoder().encode(text))).ink).toBeCloseTo(0.5, 2);
  });

  test('a plain entity repeated until it grows is refused', async () => {
    const doctype = `<!DOCTYPE svg [<!ENTITY a "${'x'.repeat(200)}">]>`;
    const outcome = await handle(svg(`<desc>${'&a;'.repeat(100_000)}</desc>`, undefined, doctype));
    expect(outcome.code).toBe('too-complex');
  });
});

describe('growing and lasting', () => {
  test('a part that repeats itself is refused', async () => {
    expect((await handle(svg('<g id="a"><use href="#a"/></g>'))).code).toBe('too-complex');
    expect((await handle(svg('<g id="a"><use href="#b"/></g><g id="b"><use href="#a"/></g>'))).code).toBe(
      'too-complex',
    );
    const pattern =
      '<pattern id="p" width="1" height="1"><rect width="9" height="9" fill="url(#p)"/></pattern><rect width="9" height="9" fill="url(#p)"/>';
    expect((await handle(svg(pattern))).code).toBe('too-complex');
  });

  test('parts that multiply are refused', async () => {
    const levels = Array.from(
      { length: 30 },
      (_, n) => `<g id="a${n + 1}">${`<use href="#a${n}"/>`.repeat(10)}</g>`,
    );
    const outcome = await handle(
      svg(`<defs><rect id="a0" width="1" height="1"/>${levels.join('')}</defs><use href="#a30"/>`),
    );
    expect(outcome.code).toBe('too-complex');
  });

  test('feMorphology with a radius of 400 is stopped or drawn in time', async () => {
    const inner =
      '<filter id="f"><feMorphology operator="dilate" radius="400"/></filter><rect width="2000" height="2000" filter="url(#f)"/>';
    await handle(svg(inner, 'width="2000" height="2000"'), 2000);
  });

  test('30 KB of text in one block are refused', async () => {
    expect((await handle(svg(`<text>${'lorem ipsum '.repeat(2500)}</text>`))).code).toBe('too-complex');
  });

  test('text just under the limit is stopped or drawn in time', async () => {
    await handle(svg(`<text font-size="3">${'x'.repeat(19_990)}</text>`));
  });

  test('turbulence over a large page is stopped or drawn in time', async () => {
    const inner =
      '<filter id="f"><feTurbulence baseFrequency="0.9" numOctaves="2000000"/></filter><rect width="40" height="40" filter="url(#f)"/>';
    await handle(svg(inner), 2000);
  });

  test('a pattern of a thousandth of a unit is stopped or drawn in time', async () => {
    const inner =
      '<pattern id="p" width="0.001" height="0.001" patternUnits="userSpaceOnUse"><circle r="1"/></pattern><rect width="40" height="40" fill="url(#p)"/>';
    await handle(svg(inner), 2000);
  });

  test('a dash of a millionth of a unit is stopped or drawn in time', async () => {
    await handle(svg('<path d="M0 20H40" stroke="#000" stroke-dasharray="0.000001"/>'), 2000);
  });

  test('a packed drawing that unpacks without end is refused', async () => {
    const bomb = gzipSync(Buffer.concat([svg('').subarray(0, 80), Buffer.alloc(60_000_000, 0x20)]));
    expect(bomb.length).toBeLessThan(100_000);
    expect((await handle(bomb)).code).toBe('too-large');
  });

  test('a packed drawing that is cut off is refused', async () => {
    const packed = gzipSync(svg('<rect width="20" height="40"/>'));
    expect((await handle(packed)).ink).toBeCloseTo(0.5, 2);
    expect((await handle(packed.subarray(0, packed.length - 20))).code).toBe('truncated');
  });

  test('more than 50,000 elements are refused, somewhat fewer are drawn', async () => {
    expect((await handle(svg('<path d="M1 1h1"/>'.repeat(50_001)))).code).toBe('too-complex');
    const lines = Array.from({ length: 49_000 }, (_, n) => `<path d="M${n % 40} 0v1"/>`).join('');
    expect((await handle(svg(lines))).refused).toBe(null);
  });

  test('groups nested too deep are refused', async () => {
    expect((await handle(svg(`${'<g>'.repeat(250)}${'</g>'.repeat(250)}`))).code).toBe('too-complex');
    expect((await handle(svg(`${'<g>'.repeat(100_000)}${'</g>'.repeat(100_000)}`))).code).toBe('too-complex');
    expect(
      (await handle(svg(`${'<g>'.repeat(190)}<rect width="40" height="40"/>${'</g>'.repeat(190)}`))).ink,
    ).toBe(1);
  });

  test('style rules that stall their reader are refused', async () => {
    const rules = Array.from({ length: 4_000 }, (_, n) => `g g g rect:nth-child(${n}){fill:red}`).join('');
    const outcome = await handle(svg(`<style>${rules}</style>${'<g><rect/></g>'.repeat(12_000)}`));
    expect(outcome.code).toBe('too-complex');
  });

  test('a picture carried inside that unpacks to a hundred megapixels is stopped or drawn in time', async () => {
    const blank = await sharp({ create: { width: 10_000, height: 10_000, channels: 3, background: 'black' } })
      .png({ palette: true, compressionLevel: 9 })
      .toBuffer();
    const image = `<image width="40" height="40" href="data:image/png;base64,${blank.toString('base64')}"/>`;
    await handle(svg(image.repeat(5)));
  });
});

describe('absurd pages', () => {
  test.each([
    ['viewBox="0 0 1e12 1e12"', 'unreadable'],
    ['viewBox="0 0 0 0"', 'unreadable'],
    ['viewBox="0 0 -5 5"', 'unreadable'],
    ['viewBox="0 0 NaN 5"', 'unreadable'],
    ['viewBox="0 0 1e-9 1e-9"', 'unreadable'],
    ['viewBox="1e300 0 5 5"', 'unreadable'],
    ['width="1e9" height="1e9"', 'unreadable'],
    ['width="0" height="10"', 'unreadable'],
    ['width="-5mm" height="10mm"', 'unreadable'],
    ['width="100000" height="1" viewBox="0 0 100000 1"', 'unreadable'],
    ['', 'unknown-size'],
    ['width="100%" height="100%"', 'unknown-size'],
  ])('%s', async (root, code) => {
    expect((await handle(svg('<rect width="20" height="40"/>', root))).code).toBe(code);
  });
});

test('a drawing that is only text, empty or not a drawing is refused', async () => {
  for (const text of ['', ' ', 'hello', '<html/>', '<svg', '<svg><g></svg>', '<svg xmlns="x"/>']) {
    expect((await handle(new TextEncoder().encode(text))).refused).not.toBe(null);
  }
});

test('children leave no folder behind', async () => {
  await new Promise((resolve) => setTimeout(resolve, 1_500));
  const own = readdirSync(tmpdir()).filter((name) => name.startsWith(`umberline-child-${process.pid}-`));
  expect(own).toEqual([]);
  expect(hasCeilings).toBe(process.platform === 'linux');
});
