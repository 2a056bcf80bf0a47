import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';

interface Command {
  type: 'M' | 'L' | 'C' | 'Q' | 'Z';
  x: number;
  y: number;
  x1: number;
  y1: number;
  x2: number;
  y2: number;
}
interface Font {
  getPath(
    words: string,
    x: number,
    y: number,
    size: number,
    options: { letterSpacing: number },
  ): { commands: Command[] };
}
// opentype.js ships no types: what is called of it is named here.
const { parse }: { parse: (bytes: ArrayBufferLike) => Font } = createRequire(import.meta.url)('opentype.js');

const FILES = path.resolve(import.meta.dirname, '../node_modules/@fontsource/manrope/files');

function manrope(weight: 400 | 700): Font {
  const bytes = readFileSync(path.join(FILES, `manrope-latin-${weight}-normal.woff`));
  return parse(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength));
}

const n = (value: number): string => String(Number(value.toFixed(3)));

export interface TextPlace {
  xMm: number;
  /** base line */
  yMm: number;
  /** size of the type, not of its capitals */
  sizeMm: number;
  weight: 400 | 700;
  /** extra space between letters, in parts of the size */
  spacing?: number;
}

/** Words as path data in Manrope's outlines (SIL Open Font License 1.1), one path for all letters. */
export function outlined(words: string, { xMm, yMm, sizeMm, weight, spacing = 0 }: TextPlace): string {
  const drawn = manrope(weight).getPath(words, xMm, yMm, sizeMm, { letterSpacing: spacing });
  return drawn.commands
    .map((c) => {
      if (c.type === 'C') return `C${n(c.x1)} ${n(c.y1)} ${n(c.x2)} ${n(c.y2)} ${n(c.x)} ${n(c.y)}`;
      if (c.type === 'Q') return `Q${n(c.x1)} ${n(c.y1)} ${n(c.x)} ${n(c.y)}`;
      return c.type === 'Z' ? 'Z' : `${c.type}${n(c.x)} ${n(c.y)}`;
    })
    .join('');
}
