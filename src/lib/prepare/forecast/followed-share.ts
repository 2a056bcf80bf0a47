import type { Spot } from '../../machines/spot';
import type { Grey } from '../resample/upright';
import { readSvg } from '../svg/read-svg';
import type { PipelineTools } from '../tools';
import { readPathData, writePathData } from '../trace/curve';
import type { Linework } from '../trace/linework';
import type { PictureSize } from './marked-share';

/**
 * Share of each pixel of a picture that followed lines mark, 0–65535.
 * Every line is drawn with a pen of the spot's own width and height; a rectangle is drawn as the ellipse of its sides.
 * @param linework lines in mm, not mirrored; unchanged
 * @param spot mm; unchanged
 * @param picture pixels asked for
 * @param tools only `renderSvg` is used
 * @returns shares in the upright picture
 * @throws ArtworkError what rendering throws
 */
export async function followedShare(
  linework: Linework,
  spot: Spot,
  picture: PictureSize,
  tools: Pick<PipelineTools, 'renderSvg'>,
): Promise<Grey> {
  const { widthMm, heightMm, paths } = linework;
  // Drawn in a frame where the spot is round, then stretched back: the stroke becomes the spot's ellipse.
  const stretch = spot.heightMm / spot.widthMm;
  const drawn = paths.flatMap((data) => readPathData(data, [1, 0, 0, 1 / stretch, 0, 0]).map(writePathData));
  const svg =
    `<svg xmlns="http://www.w3.org/2000/svg" width="${widthMm}mm" height="${heightMm}mm" viewBox="0 0 ${widthMm} ${heightMm}">` +
    `<g transform="scale(1 ${stretch})" fill="none" stroke="#000" stroke-width="${spot.widthMm}" stroke-linecap="round" ` +
    `stroke-linejoin="round">${drawn.map((data) => `<path d="${data}"/>`).join('')}</g></svg>`;
  const { columns: widthPx, rows: heightPx } = picture;
  const drawing = await readSvg(new TextEncoder().encode(svg));
  const rgba = await tools.renderSvg(drawing.svg, { widthPx, heightPx });
  const data = new Uint16Array(widthPx * heightPx);
  for (let i = 0; i < data.length; i++) data[i] = rgba[4 * i + 3] * 257;
  return { width: widthPx, height: heightPx, data };
}
