import { MM_PER_INCH } from '../../units';

/** Pixels per millimetre along X and Y of the pixels as they are stored. */
export interface Resolution {
  xPxPerMm: number;
  yPxPerMm: number;
}

const TAG_X = 282;
const TAG_Y = 283;
const TAG_UNIT = 296;
const MM_PER_UNIT: Readonly<Record<number, number>> = { 2: MM_PER_INCH, 3: 10 };

/** Reader of TIFF's two byte orders that answers undefined beyond the end. */
class Fields {
  private readonly view: DataView;

  constructor(
    bytes: Uint8Array,
    private readonly littleEndian: boolean,
  ) {
    this.view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  }

  u16(at: number): number | undefined {
    return at >= 0 && at + 2 <= this.view.byteLength ? this.view.getUint16(at, this.littleEndian) : undefined;
  }

  u32(at: number): number | undefined {
    return at >= 0 && at + 4 <= this.view.byteLength ? this.view.getUint32(at, this.littleEndian) : undefined;
  }

  rational(at: number): number | undefined {
    const above = this.u32(at);
    const below = this.u32(at + 4);
    return above !== undefined && below ? above / below : undefined;
  }
}

/**
 * The resolution that the first directory of a TIFF file or an EXIF block states.
 * Reads tags 282, 283 and 296 of a classic TIFF directory in either byte order.
 * @param bytes a TIFF file, or EXIF data beginning at its byte order mark; unchanged
 * @returns pixels per millimetre, or null where none is stated, the unit is none, or the directory cannot be read
 * @example a file with XResolution 508/1 and ResolutionUnit 2 gives { xPxPerMm: 20, … }
 * @see TIFF 6.0, section 2 and pages 38–39; Exif 2.32, 4.6.4
 */
export function tiffResolution(bytes: Uint8Array): Resolution | null {
  const order = String.fromCharCode(bytes[0] ?? 0, bytes[1] ?? 0);
  if (order !== 'II' && order !== 'MM') return null;
  const fields = new Fields(bytes, order === 'II');
  if (fields.u16(2) !== 42) return null;
  const directory = fields.u32(4);
  const count = directory === undefined ? undefined : fields.u16(directory);
  if (directory === undefined || count === undefined) return null;
  let x: number | undefined;
  let y: number | undefined;
  let unit = 2;
  for (let i = 0; i < count; i++) {
    const at = directory + 2 + 12 * i;
    const tag = fields.u16(at);
    if (tag === TAG_UNIT) unit = fields.u16(at + 8) ?? 1;
    const value = tag === TAG_X || tag === TAG_Y ? fields.u32(at + 8) : undefined;
    if (tag === TAG_X && value !== undefined) x = fields.rational(value);
    if (tag === TAG_Y && value !== undefined) y = fields.rational(value);
  }
  const mmPerUnit = MM_PER_UNIT[unit];
  if (!mmPerUnit || !x) return null;
  return { xPxPerMm: x / mmPerUnit, yPxPerMm: (y || x) / mmPerUnit };
}
