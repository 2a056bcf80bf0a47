import type { Matrix } from './curve';

const ALIGN: Record<string, number> = { min: 0, mid: 0.5, max: 1 };

/**
 * The matrix that fits a viewBox into a width and height (SVG 2, section 8.7).
 * @param box left, top, width, height in inner units
 * @param aspect text of preserveAspectRatio; empty: xMidYMid meet
 */
export function viewportMatrix(
  box: readonly number[],
  width: number,
  height: number,
  aspect: string,
): Matrix {
  const [left, top, w, h] = box;
  let [scaleX, scaleY] = [width / w, height / h];
  const [, alignX = 'mid', alignY = 'mid'] = /x(min|mid|max)y(min|mid|max)/i.exec(aspect.toLowerCase()) ?? [];
  if (!/\bnone\b/.test(aspect))
    scaleX = scaleY = /\bslice\b/.test(aspect) ? Math.max(scaleX, scaleY) : Math.min(scaleX, scaleY);
  const [dx, dy] = [(width - w * scaleX) * ALIGN[alignX], (height - h * scaleY) * ALIGN[alignY]];
  return [scaleX, 0, 0, scaleY, dx - left * scaleX, dy - top * scaleY];
}
