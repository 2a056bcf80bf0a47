import type { Artwork } from '../artwork';
import { decodeBmp } from '../ingest/bmp';
import { fileType } from '../ingest/file-type';
import { sharp } from '../sharp';
import { turnVector } from '../svg/turn-vector';
import { LIMITS, type PipelineTools } from '../tools';

type Turns = 0 | 1 | 2 | 3;

async function openPicture(bytes: Uint8Array) {
  if (fileType(bytes) !== 'bmp')
    return sharp(bytes, { limitInputPixels: LIMITS.maxPixels, failOn: 'error' }).autoOrient();
  const { width, height, data } = await decodeBmp(bytes);
  return sharp(data, { raw: { width, height, channels: 4 } });
}

async function openTurned(
  bytes: Uint8Array,
  artwork: Artwork,
  turns: Turns,
  width: number,
  height: number,
  tools: Pick<PipelineTools, 'renderSvg'>,
) {
  if (artwork.kind === 'raster') return (await openPicture(bytes)).rotate(turns * 90);
  const { svg } = turnVector(artwork, turns);
  const rgba = await tools.renderSvg(svg, { widthPx: width, heightPx: height });
  return sharp(rgba, { raw: { width, height, channels: 4 } });
}

/**
 * The artwork in its own colours over white, turned as it is placed, as a PNG of the asked pixels.
 * @param bytes the file that `artwork` was read from; unchanged
 * @param artwork what ingest gave, not turned; unchanged
 * @param turns quarter turns clockwise
 * @param width columns of the picture, 1 or more
 * @param height rows of the picture, 1 or more
 * @returns the bytes of a PNG
 * @throws ArtworkError what rendering a drawing throws
 */
export async function colourPicture(
  bytes: Uint8Array,
  artwork: Artwork,
  turns: Turns,
  width: number,
  height: number,
  tools: Pick<PipelineTools, 'renderSvg'>,
): Promise<Uint8Array> {
  const png = await (
    await openTurned(bytes, artwork, turns, width, height, tools)
  )
    .resize(width, height, { fit: 'fill', kernel: 'mitchell' })
    .flatten({ background: '#ffffff' })
    .toColourspace('srgb')
    .png({ compressionLevel: 4 })
    .toBuffer();
  return new Uint8Array(png.buffer, png.byteOffset, png.byteLength);
}
