import { ArtworkError, LIMITS } from '../tools';
import { sharp } from '../sharp';
import { bmpHeader } from './bmp';
import { brokenPicture } from './broken-picture';
import type { ReadableType } from './file-type';
import type { PictureHeader } from './pixels';

const millions = (count: number): string => (count / 1e6).toFixed(1);

// AVIF's decoder holds a picture several times over.
const MAX_AVIF_PX = 20_000_000;

/** Refuses a picture by the pixels that its header states. */
function assertPixelCap({ type, widthPx, heightPx }: PictureHeader): void {
  if (!(widthPx >= 1) || !(heightPx >= 1)) throw new ArtworkError('unreadable', 'The picture has no pixels.');
  const most = type === 'avif' ? MAX_AVIF_PX : LIMITS.maxPixels;
  if (widthPx * heightPx <= most) return;
  throw new ArtworkError(
    'too-large',
    `The picture has ${widthPx} × ${heightPx} pixels, ${millions(widthPx * heightPx)} million; ` +
      `we read up to ${millions(most)} million${type === 'avif' ? ' of AVIF' : ''}. Send it at a smaller size.`,
  );
}

/** An animated PNG says so before its first picture data; libpng shows the picture for readers that do not animate. */
function isAnimatedPng(bytes: Uint8Array): boolean {
  const head = new TextDecoder('latin1').decode(bytes.subarray(0, 65_536));
  const control = head.indexOf('acTL');
  return control > 0 && (head.indexOf('IDAT') < 0 || control < head.indexOf('IDAT'));
}

// Above this, 16 bits a channel would not fit the memory that one picture may take.
const MAX_16_BIT_PX = 20_000_000;

async function decodedHeader(type: PictureHeader['type'], bytes: Uint8Array): Promise<PictureHeader> {
  const meta = await sharp(bytes, { limitInputPixels: false, failOn: 'error' }).metadata();
  const remarks: string[] = [];
  const frames = type === 'png' ? (isAnimatedPng(bytes) ? 2 : 1) : (meta.pages ?? 1);
  if (frames > 1) {
    remarks.push(
      type === 'tiff'
        ? `First page of ${frames}; the others are left out.`
        : 'First frame of an animation; the others are left out.',
    );
  }
  if (meta.space === 'cmyk') remarks.push('Printing inks (CMYK) converted to sRGB; colours may shift.');
  else if (meta.hasProfile) remarks.push('Colour profile converted to sRGB.');
  if (meta.hasAlpha) remarks.push('Transparent parts are not engraved.');
  if (meta.orientation && meta.orientation > 1) remarks.push('Turned upright as the camera noted.');
  const deep = meta.depth !== 'uchar' && meta.depth !== 'char' && meta.width * meta.height <= MAX_16_BIT_PX;
  return {
    type,
    widthPx: meta.width,
    heightPx: meta.height,
    swapsSides: (meta.orientation ?? 1) >= 5,
    frames,
    depth: deep && meta.space !== 'cmyk' ? 16 : 8,
    exif: meta.exif,
    remarks,
  };
}

/**
 * What a picture's header says; nothing is decoded, and the cap on pixels is held against it.
 * @param type what the bytes are, a raster type
 * @param bytes the whole file; unchanged
 * @throws ArtworkError `too-large` above the cap on pixels; `truncated` or `unreadable` when the header cannot be read
 */
export async function readHeader(
  type: Exclude<ReadableType, 'svg' | 'svgz'>,
  bytes: Uint8Array,
): Promise<PictureHeader> {
  let header: PictureHeader;
  try {
    header = type === 'bmp' ? bmpHeader(bytes) : await decodedHeader(type, bytes);
  } catch (cause) {
    throw brokenPicture(type, cause);
  }
  assertPixelCap(header);
  return header;
}
