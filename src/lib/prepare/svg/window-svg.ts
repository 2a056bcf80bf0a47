import type { SvgRenderRequest } from '../tools';

const ROOT_TAG =
  /^<svg xmlns="http:\/\/www\.w3\.org\/2000\/svg" xmlns:xlink="http:\/\/www\.w3\.org\/1999\/xlink" width="([^"]+)" height="([^"]+)" viewBox="([^"]+)" preserveAspectRatio="none">/;

/**
 * Start tag of a sanitised drawing: its frame in user units, stretched over width × height.
 * @param widthPx width in px, above 0
 * @param heightPx height in px, above 0
 * @param frame left, top, width, height in user units
 */
export function rootTag(widthPx: number, heightPx: number, frame: readonly number[]): string {
  return (
    '<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" ' +
    `width="${widthPx}" height="${heightPx}" viewBox="${frame.join(' ')}" preserveAspectRatio="none">`
  );
}

/** Start tag of a sanitised drawing as it was written by `rootTag`, and the frame it states. */
export interface Root {
  /** length of the start tag in characters; it is plain ASCII, so also in bytes */
  tagLength: number;
  widthPx: number;
  heightPx: number;
  /** left, top, width, height in user units */
  frame: [number, number, number, number];
}

/**
 * Reads the start tag that the sanitiser wrote.
 * @param svg UTF-8 bytes of a sanitised SVG; unchanged
 * @throws TypeError when the bytes do not begin as the sanitiser writes them
 */
export function readRoot(svg: Uint8Array): Root {
  const head = new TextDecoder('latin1').decode(svg.subarray(0, 600));
  const match = ROOT_TAG.exec(head);
  if (!match) throw new TypeError('expected an SVG that the sanitiser wrote');
  const frame = match[3].split(' ').map(Number) as [number, number, number, number];
  return { tagLength: match[0].length, widthPx: Number(match[1]), heightPx: Number(match[2]), frame };
}

/**
 * A sanitised SVG whose root shows one part of the drawing at exactly the asked pixels.
 * Only the root's start tag changes: the size in px and the frame in user units.
 * @param svg UTF-8 bytes of a sanitised SVG; unchanged
 * @param request pixels, and the part in fractions of the drawing; the whole drawing when absent
 * @throws TypeError when the bytes do not begin as the sanitiser writes them
 * @throws RangeError when pixels are not whole numbers above 0 or the part is empty
 */
export function windowSvg(svg: Uint8Array, request: SvgRenderRequest): Uint8Array {
  const { widthPx, heightPx, part = { left: 0, top: 0, width: 1, height: 1 } } = request;
  if (!Number.isInteger(widthPx) || !Number.isInteger(heightPx) || widthPx < 1 || heightPx < 1) {
    throw new RangeError(`expected whole pixels above 0, got ${widthPx} x ${heightPx}`);
  }
  if (!(part.width > 0) || !(part.height > 0)) {
    throw new RangeError(`expected a part with sides above 0, got ${part.width} x ${part.height}`);
  }
  const { tagLength, frame } = readRoot(svg);
  const [left, top, width, height] = frame;
  const shown = [left + part.left * width, top + part.top * height, part.width * width, part.height * height];
  const tag = new TextEncoder().encode(rootTag(widthPx, heightPx, shown));
  const windowed = new Uint8Array(tag.length + svg.length - tagLength);
  windowed.set(tag);
  windowed.set(svg.subarray(tagLength), tag.length);
  return windowed;
}
