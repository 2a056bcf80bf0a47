import type { Artwork, RasterArtwork } from '../artwork';
import { readSvg } from '../svg/read-svg';
import { ArtworkError, LIMITS, type PipelineTools } from '../tools';
import { decodePicture } from './decode-picture';
import { embeddedResolution } from './embedded-resolution';
import { fileType, type ReadableType, type RefusedType } from './file-type';
import { luminanceOf } from './luminance';
import type { PictureHeader } from './pixels';
import { readHeader } from './read-header';
import { refusal } from './refusal';

const READABLE: ReadonlySet<string> = new Set<ReadableType>([
  'png',
  'jpeg',
  'webp',
  'tiff',
  'gif',
  'avif',
  'bmp',
  'svg',
  'svgz',
]);
const isReadable = (type: ReadableType | RefusedType): type is ReadableType => READABLE.has(type);

/** Size that a picture's file states, mm, after orientation. */
function ownSize(
  header: PictureHeader,
  bytes: Uint8Array,
): { ownWidthMm: number | null; ownHeightMm: number | null } {
  const resolution = embeddedResolution(header.type, bytes, header.exif);
  if (!resolution) return { ownWidthMm: null, ownHeightMm: null };
  const across = header.widthPx / resolution.xPxPerMm;
  const down = header.heightPx / resolution.yPxPerMm;
  return header.swapsSides
    ? { ownWidthMm: down, ownHeightMm: across }
    : { ownWidthMm: across, ownHeightMm: down };
}

async function ingestRaster(
  type: PictureHeader['type'],
  bytes: Uint8Array,
  sha256: string,
): Promise<RasterArtwork> {
  const header = await readHeader(type, bytes);
  const pixels = await decodePicture(header, bytes);
  return {
    kind: 'raster',
    facts: {
      sha256,
      bytes: bytes.length,
      format: type,
      kind: 'raster',
      widthPx: pixels.width,
      heightPx: pixels.height,
      ...ownSize(header, bytes),
      remarks: header.remarks,
    },
    widthPx: pixels.width,
    heightPx: pixels.height,
    luminance: luminanceOf(pixels),
  };
}

/** Refuses a file by its size alone. */
function assertByteCap(bytes: Uint8Array): void {
  if (bytes.length === 0)
    throw new ArtworkError('empty-file', 'The file is empty. Export it again and send that.');
  if (bytes.length <= LIMITS.maxBytes) return;
  const mib = (count: number): string => (count / 1024 / 1024).toFixed(0);
  throw new ArtworkError(
    'too-large',
    `The file has ${mib(bytes.length)} MiB; we read up to ${mib(LIMITS.maxBytes)} MiB. Send a smaller one.`,
  );
}

/**
 * Reads what a customer sent into an artwork: pixels as linear luminance over a white ground, or a drawing found safe.
 * The type is told by the bytes; caps on bytes and pixels are held before anything is decoded.
 * @param bytes the whole file; unchanged
 * @param tools only `sha256` is used
 * @throws ArtworkError `empty-file`, `too-large`, `too-complex`, `truncated`, `unreadable`, `unknown-size` or
 *   `unsupported-format`, each with a sentence for the sender
 * @example a PNG of 2 × 1 px, black and white, gives luminance [0, 65535]
 */
export async function ingest(bytes: Uint8Array, tools: Pick<PipelineTools, 'sha256'>): Promise<Artwork> {
  assertByteCap(bytes);
  const type = fileType(bytes);
  if (!isReadable(type)) throw refusal(type);
  const sha256 = tools.sha256(bytes);
  if (type !== 'svg' && type !== 'svgz') return ingestRaster(type, bytes, sha256);
  const drawing = await readSvg(bytes);
  return { ...drawing, facts: { ...drawing.facts, sha256, bytes: bytes.length } };
}
