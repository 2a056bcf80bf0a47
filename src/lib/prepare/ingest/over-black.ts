import type { Artwork, VectorArtwork } from '../artwork';
import { readRoot } from '../svg/window-svg';
import { decodePicture } from './decode-picture';
import { fileType } from './file-type';
import { luminanceOf } from './luminance';
import { readHeader } from './read-header';

function drawingOverBlack(artwork: VectorArtwork): VectorArtwork {
  const { tagLength, frame } = readRoot(artwork.svg);
  const [x, y, width, height] = frame;
  const text = new TextDecoder().decode(artwork.svg);
  const backdrop = `<rect x="${x}" y="${y}" width="${width}" height="${height}" fill="#000"/>`;
  const svg = new TextEncoder().encode(text.slice(0, tagLength) + backdrop + text.slice(tagLength));
  return { ...artwork, svg };
}

/**
 * The artwork laid over black instead of white: where burning lightens the stock, black is what stays untouched, so that
 * what is transparent is not engraved there either.
 * A picture with transparency is decoded once more; a drawing gets a black backdrop.
 * @param artwork what ingest gave, not turned; unchanged
 * @param bytes the file that it was read from; unchanged
 * @returns the artwork itself where nothing of it is transparent
 * @throws ArtworkError as ingest does
 * @example a wholly transparent picture has luminance 0 everywhere
 */
export async function overBlack(artwork: Artwork, bytes: Uint8Array): Promise<Artwork> {
  if (artwork.kind === 'vector') return drawingOverBlack(artwork);
  const type = fileType(bytes);
  if (type !== artwork.facts.format || type === 'svg')
    throw new TypeError(`expected the bytes of a ${artwork.facts.format}, got ${type}`);
  const pixels = await decodePicture(await readHeader(type, bytes), bytes);
  return pixels.channels === 3 ? artwork : { ...artwork, luminance: luminanceOf(pixels, 'black') };
}
