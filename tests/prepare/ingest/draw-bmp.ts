/**
 * A BMP drawn as rows of `#` black and `.` white, written for these tests alone.
 * @param perMetre pixels per metre in the header
 */
export function bmp(rows: string[], bits: 1 | 8 | 24 | 32, perMetre: number): Uint8Array {
  const [width, height] = [rows[0].length, rows.length];
  const stride = Math.ceil((width * bits) / 32) * 4;
  const colours = bits <= 8 ? 2 : 0;
  const start = 54 + 4 * colours;
  const file = new Uint8Array(start + stride * height);
  const view = new DataView(file.buffer);
  file.set([0x42, 0x4d]);
  view.setUint32(2, file.length, true);
  view.setUint32(10, start, true);
  view.setUint32(14, 40, true);
  view.setInt32(18, width, true);
  view.setInt32(22, height, true);
  view.setUint16(26, 1, true);
  view.setUint16(28, bits, true);
  view.setInt32(38, perMetre, true);
  view.setInt32(42, perMetre, true);
  view.setUint32(46, colours, true);
  if (colours) file.set([0, 0, 0, 0, 255, 255, 255, 0], 54);
  rows.forEach((row, y) => {
    const at = start + (height - 1 - y) * stride;
    [...row].forEach((cell, x) => {
      const white = cell === '.' ? 1 : 0;
      if (bits === 1) file[at + (x >> 3)] |= white << (7 - (x & 7));
      else if (bits === 8) file[at + x] = white;
      else file.fill(255 * white, at + (x * bits) / 8, at + ((x + 1) * bits) / 8);
    });
  });
  return file;
}
