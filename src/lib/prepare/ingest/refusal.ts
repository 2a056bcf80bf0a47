import { ArtworkError } from '../tools';
import type { RefusedType } from './file-type';

const DRAWING = 'Export it as SVG with text turned into outlines, or as PNG, and send that.';
const PICTURE = 'Export it as PNG, TIFF or JPEG at full size and send that.';

const SENTENCES: Readonly<Record<RefusedType, string>> = {
  pdf: `This is a PDF document, which we do not read yet. ${DRAWING}`,
  ai: `This is an AI file, which we do not read. ${DRAWING}`,
  eps: `This is an EPS or PostScript file, which we do not read. ${DRAWING}`,
  heic: 'This is a HEIC photograph, which we do not read. Send it as JPEG: most telephones offer this when the picture is shared.',
  psd: `This is a PSD document, which we do not read. Flatten it, then: ${PICTURE}`,
  dxf: `This is a DXF drawing, which we do not read. ${DRAWING}`,
  dwg: `This is a DWG drawing, which we do not read. ${DRAWING}`,
  cdr: `This is a CDR file, which we do not read. ${DRAWING}`,
  'jpeg-xl': `This is a JPEG XL picture, which we do not read. ${PICTURE}`,
  'jpeg-2000': `This is a JPEG 2000 picture, which we do not read. ${PICTURE}`,
  'camera-raw': `This is a camera's raw file, which we do not read. Develop it first. ${PICTURE}`,
  icon: `This is an icon file, which we do not read. ${PICTURE}`,
  metafile: `This is a metafile, which we do not read. ${DRAWING}`,
  archive:
    'This is an archive or an office document. Unpack it, or export the picture in it as SVG or PNG, and send that.',
  'web-page': 'This is a web page, not a picture. Save the picture itself and send that.',
  unknown: 'This is no picture that we can read. Send SVG, PNG, JPEG, TIFF, WebP, AVIF, GIF or BMP.',
};

/**
 * The error that tells a person why a file of this type is refused and what to export instead.
 * @param type what the bytes are
 * @example refusal('heic').code // 'unsupported-format'
 */
export function refusal(type: RefusedType): ArtworkError {
  return new ArtworkError('unsupported-format', SENTENCES[type]);
}
