import type { VectorArtwork } from '../artwork';
import { ArtworkError, LIMITS } from '../tools';
import { missingFonts } from './fonts';
import { parseXml, type SvgNode } from './parse-xml';
import { physicalSize } from './physical-size';
import { readText } from './read-text';
import { assertReferences } from './references';
import { removedInWords } from './removed';
import { sanitise } from './sanitise';
import { serialise } from './serialise';

/** Pixels of all embedded pictures together are held down by their bytes: no picture may be larger than the drawing's cap. */
const MAX_PICTURES = 50;

async function sha256(bytes: Uint8Array): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', bytes as Uint8Array<ArrayBuffer>);
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}

/** Characters of text below an element. */
function textLength(node: SvgNode): number {
  let length = 0;
  for (const child of node.children) length += typeof child === 'string' ? child.length : textLength(child);
  return length;
}

function assertContents(root: SvgNode): void {
  let pictures = 0;
  const visit = (node: SvgNode): void => {
    if (node.name === 'text' && textLength(node) > LIMITS.maxSvgTextLength) {
      const message =
        `This drawing has a block of text of more than ${LIMITS.maxSvgTextLength.toLocaleString('en-GB')} characters. ` +
        'Turn the text into outlines, or split it into lines.';
      throw new ArtworkError('too-complex', message);
    }
    if (node.name === 'image') pictures += 1;
    for (const child of node.children) if (typeof child !== 'string') visit(child);
  };
  visit(root);
  if (pictures > MAX_PICTURES) {
    throw new ArtworkError(
      'too-complex',
      `This drawing holds more than ${MAX_PICTURES} pictures. Merge them into one.`,
    );
  }
}

/**
 * A drawing that is safe to render, from the bytes of an SVG or SVGZ file.
 * Unpacked under a cap, parsed without entities, rebuilt from an allow-list; its size by our own reading of its root.
 * @param bytes the file; unchanged
 * @returns the sanitised drawing, fonts that are missing and what was taken out, in words
 * @throws ArtworkError too-large, truncated, unreadable, too-complex or unknown-size
 */
export async function readSvg(bytes: Uint8Array): Promise<VectorArtwork> {
  const parsed = parseXml(await readText(bytes));
  const page = physicalSize(parsed.root.attributes);
  const clean = sanitise(parsed.root);
  if (parsed.hasEntities) clean.removed.add('entities');
  assertContents(clean.root);
  assertReferences(clean.root, clean.styles);
  return {
    kind: 'vector',
    facts: {
      sha256: await sha256(bytes),
      bytes: bytes.length,
      format: 'svg',
      kind: 'vector',
      widthPx: page.widthPx,
      heightPx: page.heightPx,
      ownWidthMm: page.ownWidthMm,
      ownHeightMm: page.ownHeightMm,
      remarks: page.ownWidthMm === null ? ['The drawing states its proportions but no size.'] : [],
    },
    svg: new TextEncoder().encode(serialise(clean.root, clean.styles, page)),
    aspect: page.widthPx / page.heightPx,
    missingFonts: missingFonts(clean.root, clean.styles),
    removed: removedInWords(clean.removed),
  };
}
