import type { MaskRaster } from '../../imaging/raster';

/**
 * Rows of a mask as bits, eight pixels a byte from the highest bit; 0 is burned, as in every file we write.
 * @param mask 1 burned, 0 untouched; unchanged
 * @param strideBytes bytes a row, at least width ÷ 8; what is beyond the last pixel is 1, untouched
 * @param leadBytes bytes left free at the start of every row
 * @returns height × (leadBytes + strideBytes) bytes
 * @example packBits(a row # . # ., 1, 0) // 0b01011111
 */
export function packBits(
  { width, height, data }: MaskRaster,
  strideBytes: number,
  leadBytes: number,
): Uint8Array {
  const rowBytes = leadBytes + strideBytes;
  const packed = new Uint8Array(height * rowBytes);
  const whole = width >> 3;
  for (let row = 0, at = 0; row < height; row++) {
    let to = row * rowBytes + leadBytes;
    for (let i = 0; i < whole; i++, at += 8) {
      packed[to++] = ~(
        (data[at] << 7) |
        (data[at + 1] << 6) |
        (data[at + 2] << 5) |
        (data[at + 3] << 4) |
        (data[at + 4] << 3) |
        (data[at + 5] << 2) |
        (data[at + 6] << 1) |
        data[at + 7]
      );
    }
    const rest = width & 7;
    let last = 0xff;
    for (let bit = 0; bit < rest; bit++) last ^= data[at++] << (7 - bit);
    if (rest > 0) packed[to++] = last;
    packed.fill(0xff, to, (row + 1) * rowBytes);
  }
  return packed;
}
