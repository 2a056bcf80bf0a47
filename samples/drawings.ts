import { outlined } from './outlines';

/** A drawing whose user units are millimetres. */
const inMm = (width: number, height: number, inside: string): string =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="${width}mm" height="${height}mm" viewBox="0 0 ${width} ${height}">\n${inside}\n</svg>\n`;

const lines = (parts: readonly string[]): string => parts.map((part) => `  ${part}`).join('\n');

const grain = (x: number, y: number, deg: number): string =>
  `<ellipse transform="translate(${x} ${y}) rotate(${deg})" cy="-1.9" rx="0.9" ry="1.9"/>`;

/** An ear of wheat: a stem, four pairs of grains and one at the top. */
function ear(x: number, y: number, deg: number): string {
  const pairs = [0, 3.4, 6.8, 10.2].flatMap((up) => [grain(-0.9, -up - 3, -30), grain(0.9, -up - 3, 30)]);
  const stem = '<path d="M0 3.4V-13.6" fill="none" stroke="#000" stroke-width="0.6" stroke-linecap="round"/>';
  return `<g transform="translate(${x} ${y}) rotate(${deg})">${stem}${pairs.join('')}${grain(0, -14.6, 0)}</g>`;
}

/** Mark of an invented customer: a loaf scored with a tilde between two ears, with the name beside it. */
function bakeryMark(): string {
  return inMm(
    96,
    30,
    lines([
      '<path d="M13.5 22.4C11.4 12.4 16.4 5.4 24 5.4S36.6 12.4 34.5 22.4Z" fill="none" stroke="#000" stroke-width="1.2" stroke-linejoin="round"/>',
      '<path d="M18.4 16.4C20 12.4 22.6 12.4 24.6 14.6S28.6 16.8 30.2 12.6" fill="none" stroke="#000" stroke-width="1.6" stroke-linecap="round"/>',
      ear(8.2, 21.6, -9),
      ear(39.8, 21.6, 9),
      '<path d="M9.6 27C18 28.8 30 28.8 38.4 27" fill="none" stroke="#000" stroke-width="0.8" stroke-linecap="round"/>',
      `<path d="${outlined('Farrow', { xMm: 49, yMm: 17.2, sizeMm: 13.2, weight: 700 })}"/>`,
      `<path d="${outlined('BAKERY', { xMm: 49.9, yMm: 26, sizeMm: 5.2, weight: 700, spacing: 0.3 })}"/>`,
    ]),
  );
}

const hairline = (): string =>
  inMm(
    60,
    20,
    lines([
      '<path d="M5 5H55" fill="none" stroke="#000" stroke-width="0.03"/>',
      '<path d="M5 10H55" fill="none" stroke="#000" stroke-width="0.08"/>',
      '<path d="M5 15H55" fill="none" stroke="#000" stroke-width="0.6"/>',
    ]),
  );

const fillIn = (): string =>
  inMm(
    30,
    20,
    lines(['<rect x="5" y="5" width="20" height="4"/>', '<rect x="5" y="9.05" width="20" height="4"/>']),
  );

const specks = (): string =>
  inMm(
    30,
    20,
    lines([
      '<rect x="4" y="4" width="10" height="12"/>',
      ...[0, 1, 2, 3].map((i) => `<circle cx="${18 + 3 * i}" cy="10" r="0.025"/>`),
    ]),
  );

const pinholes = (): string =>
  inMm(
    30,
    20,
    lines([
      `<path fill-rule="evenodd" d="M4 4H26V16H4Z${[0, 1, 2].map((i) => `M${9 + 6 * i} 10h0.05v0.05h-0.05Z`).join('')}"/>`,
    ]),
  );

const tip = (): string => inMm(30, 20, '  <path d="M3 10L17 6.25V13.75Z"/>');

const tinyType = (): string =>
  inMm(
    40,
    12,
    lines([
      `<path d="${outlined('Washed by hand, dried in the shade, kept for good', { xMm: 3, yMm: 6, sizeMm: 1.1, weight: 400 })}"/>`,
      '<rect x="3" y="8" width="34" height="1"/>',
    ]),
  );

const missingFont = (): string =>
  inMm(60, 20, '  <text x="5" y="13" font-family="Quarryman Slab" font-size="9">Quarry</text>');

const strokes = (): string =>
  inMm(
    50,
    30,
    lines([
      '<g fill="none" stroke="#000" stroke-width="0.15" stroke-linecap="round">',
      '  <circle cx="15" cy="15" r="10"/>',
      '  <path d="M15 5V25M5 15H25M8 8L22 22M22 8L8 22"/>',
      '  <path d="M30 22C34 8 38 8 40 15S44 24 46 9"/>',
      '</g>',
    ]),
  );

const letterbox = (): string =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="2in" height="36pt" viewBox="0 0 100 100">\n  <circle cx="50" cy="50" r="45"/>\n</svg>\n`;

const banner = (): string =>
  inMm(
    120,
    30,
    lines(['<path d="M2 2H118L110 15L118 28H2Z"/>', '<circle cx="12" cy="15" r="3" fill="#fff"/>']),
  );

const unsafe = (): string =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="40mm" height="20mm" viewBox="0 0 40 20" onload="alert(1)">
  <script>alert(1)</script>
  <image href="http://127.0.0.1:9/outside.png" x="0" y="0" width="10" height="10"/>
  <rect x="5" y="5" width="30" height="10"/>
</svg>
`;

/** Every drawing by its file name. */
export const DRAWINGS: Readonly<Record<string, () => string>> = {
  'bakery-mark.svg': bakeryMark,
  'hairline.svg': hairline,
  'fill-in.svg': fillIn,
  'specks.svg': specks,
  'pinholes.svg': pinholes,
  'sharp-tip.svg': tip,
  'tiny-type.svg': tinyType,
  'missing-font.svg': missingFont,
  'strokes.svg': strokes,
  'letterbox.svg': letterbox,
  'banner.svg': banner,
  'unsafe.svg': unsafe,
  'empty.svg': () => inMm(40, 20, ''),
};
