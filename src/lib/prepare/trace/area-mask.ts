import { luminanceOfLstar } from '../../imaging/cie-lightness';
import type { MaskRaster } from '../../imaging/raster';
import { FULL_LUMINANCE } from '../../imaging/srgb';
import type { SvgNode } from '../svg/parse-xml';
import { luminanceOverWhite } from '../svg/render-vector';
import type { Style } from '../svg/resolve-styles';
import { serialiseTree } from '../svg/serialise';
import type { PipelineTools } from '../tools';
import type { TraceSettings } from './linework';
import { maskSize } from './raster-mask';

/**
 * Dark areas of a drawing by a fine render, with the strokes that are followed as lines left out.
 * @param root parsed sanitised drawing; unchanged
 * @param styles properties of its elements; unchanged
 * @param followed elements whose stroke is a line
 * @param tools only `renderSvg` is used
 * @returns 1 where the render is darker than the dividing level
 * @throws ArtworkError when it cannot be drawn within the limits
 */
export async function areaMask(
  root: SvgNode,
  styles: ReadonlyMap<SvgNode, Style>,
  followed: ReadonlySet<SvgNode>,
  settings: TraceSettings,
  tools: Pick<PipelineTools, 'renderSvg'>,
): Promise<MaskRaster> {
  const bare = new Map(styles);
  for (const element of followed) bare.set(element, { ...styles.get(element), stroke: 'none' });
  const svg = new TextEncoder().encode(serialiseTree(root, bare));
  const { width, height } = maskSize(settings, null);
  const luminance = luminanceOverWhite(await tools.renderSvg(svg, { widthPx: width, heightPx: height }));
  const divide = luminanceOfLstar(settings.dividingLstar) * FULL_LUMINANCE;
  const data = new Uint8Array(luminance.length);
  for (let index = 0; index < data.length; index += 1) if (luminance[index] < divide) data[index] = 1;
  return {
    kind: 'mask',
    width,
    height,
    pitchXMm: settings.widthMm / width,
    pitchYMm: settings.heightMm / height,
    data,
  };
}
