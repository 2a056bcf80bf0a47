import type { Grey, RowReader } from './upright';
import type { ScanFrame } from './scan-frame';

export interface SkewSource {
  /** the placed artwork, upright, at about the frame's pitch or finer */
  grey: Grey;
  widthMm: number;
  heightMm: number;
}

/**
 * Reads a placed artwork in a turned scan frame.
 * Each pixel's centre is carried back into the artwork and read between its four neighbours.
 * @param source the placed artwork, upright; unchanged
 * @param frame the scan frame; unchanged
 * @param angleDeg angle to read at: the frame's own, or its negative for a mirrored file
 * @param outside sample given beyond the artwork's edge, 0–65535
 * @returns a reader that gives the next rows
 * @example a white artwork read at 30° with outside 65535 is white everywhere
 */
export function skewReader(
  source: SkewSource,
  frame: ScanFrame,
  angleDeg: number,
  outside: number,
): RowReader {
  const { grey, widthMm, heightMm } = source;
  const angle = (angleDeg * Math.PI) / 180;
  const perMmX = grey.width / widthMm;
  const perMmY = grey.height / heightMm;
  // One step along a line, and one from line to line, in the artwork's pixels.
  const along = {
    x: Math.cos(angle) * frame.pitchXMm * perMmX,
    y: Math.sin(angle) * frame.pitchXMm * perMmY,
  };
  const across = {
    x: -Math.sin(angle) * frame.pitchYMm * perMmX,
    y: Math.cos(angle) * frame.pitchYMm * perMmY,
  };
  const start = {
    x: grey.width / 2 - (along.x * (frame.columns - 1)) / 2 - (across.x * (frame.rows - 1)) / 2 - 0.5,
    y: grey.height / 2 - (along.y * (frame.columns - 1)) / 2 - (across.y * (frame.rows - 1)) / 2 - 0.5,
  };
  let row = 0;
  let band = new Uint16Array(0);
  return (count) => {
    const taken = Math.min(count, frame.rows - row);
    if (band.length < taken * frame.columns) band = new Uint16Array(taken * frame.columns);
    for (let at = 0; at < taken * frame.columns; row++) {
      let x = start.x + across.x * row;
      let y = start.y + across.y * row;
      for (let column = 0; column < frame.columns; column++, x += along.x, y += along.y) {
        band[at++] = readBetween(grey, x, y, outside);
      }
    }
    return band.subarray(0, taken * frame.columns);
  };
}

/** Sample at a place between pixel centres; the artwork ends half a pixel beyond its outer centres. */
function readBetween({ width, height, data }: Grey, x: number, y: number, outside: number): number {
  if (x < -0.5 || y < -0.5 || x > width - 0.5 || y > height - 0.5) return outside;
  const x0 = x < 0 ? 0 : Math.floor(x);
  const y0 = y < 0 ? 0 : Math.floor(y);
  const x1 = x0 + 1 < width ? x0 + 1 : x0;
  const y1 = y0 + 1 < height ? y0 + 1 : y0;
  const fx = x < 0 ? 0 : x - x0;
  const fy = y < 0 ? 0 : y - y0;
  const top = data[y0 * width + x0] * (1 - fx) + data[y0 * width + x1] * fx;
  const bottom = data[y1 * width + x0] * (1 - fx) + data[y1 * width + x1] * fx;
  return top * (1 - fy) + bottom * fy + 0.5;
}
