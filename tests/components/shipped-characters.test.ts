import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { parse } from 'opentype.js';
import ts from 'typescript';
import { describe, expect, test } from 'vitest';

const FONTS = 'node_modules/@fontsource/manrope/files';

function shippedCharacters(): (sign: string) => boolean {
  const fonts = ['latin', 'latin-ext', 'greek'].flatMap((subset) =>
    ['400', '600', '700'].map((weight) => {
      const bytes = readFileSync(path.join(FONTS, `manrope-${subset}-${weight}-normal.woff`));
      return {
        subset,
        font: parse(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength)),
      };
    }),
  );
  // A character has to stand in every weight of at least one subset.
  return (sign) =>
    ['latin', 'latin-ext', 'greek'].some((subset) =>
      fonts.filter((font) => font.subset === subset).every(({ font }) => font.charToGlyphIndex(sign) > 0),
    );
}

/** Texts of a program that people may read: string and template literals, and text between tags; no comments. */
function textsOfProgram(source: string, fileName: string): string[] {
  const file = ts.createSourceFile(
    fileName,
    source,
    ts.ScriptTarget.Latest,
    true,
    fileName.endsWith('.ts') ? ts.ScriptKind.TS : ts.ScriptKind.TSX,
  );
  const texts: string[] = [];
  const visit = (node: ts.Node): void => {
    if (
      ts.isStringLiteralLike(node) ||
      ts.isJsxText(node) ||
      ts.isTemplateHead(node) ||
      ts.isTemplateMiddleOrTemplateTail(node)
    )
      texts.push(node.text);
    ts.forEachChild(node, visit);
  };
  visit(file);
  return texts;
}

function textsOf(fileName: string): string[] {
  const source = readFileSync(fileName, 'utf8');
  if (!fileName.endsWith('.astro')) return textsOfProgram(source, fileName);
  const [, frontmatter = '', template = source] = /^---\n([\s\S]*?)\n---\n([\s\S]*)$/.exec(source) ?? [];
  const withoutComments = template
    .replace(/<!--[\s\S]*?-->/g, '')
    .replace(/\{\/\*[\s\S]*?\*\/\}/g, '')
    .replace(/^\s*\/\/.*$/gm, '');
  return [...textsOfProgram(frontmatter, `${fileName}.ts`), withoutComments];
}

const files = readdirSync('src', { recursive: true, encoding: 'utf8' })
  .filter((name) => /\.(ts|tsx|astro)$/.test(name))
  .map((name) => path.join('src', name))
  .sort();

describe('characters of the shipped fonts', () => {
  const isShipped = shippedCharacters();

  test('the fonts have what the pages write, and lack what must be written otherwise', () => {
    for (const sign of 'äéß×−–·°²Δ“”’') expect(isShipped(sign), sign).toBe(true);
    for (const sign of '≤≥→′″√✓') expect(isShipped(sign), sign).toBe(false);
  });

  test('no text in the program has a character that the fonts lack', () => {
    const missing = files.flatMap((fileName) => {
      const signs = new Set(
        textsOf(fileName)
          .join('')
          .replace(/[\0-~]/g, ''),
      );
      return [...signs]
        .filter((sign) => !isShipped(sign))
        .map((sign) => `${fileName}: ${sign} U+${sign.codePointAt(0)?.toString(16)}`);
    });
    expect(missing).toEqual([]);
  });

  test('texts are found in literals, templates and between tags, and not in comments', () => {
    const source = 'const a = "x≤y"; // ≥\nconst b = `p${a}→q`; const c = <p title="′">√</p>; /* ″ */';
    const found = textsOfProgram(source, 'sample.tsx').join('');
    for (const sign of '≤→′√') expect(found).toContain(sign);
    for (const sign of '≥″') expect(found).not.toContain(sign);
  });
});
