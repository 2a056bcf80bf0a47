import type { RasterArtwork, VectorArtwork } from '../../src/lib/prepare/artwork';
import { srgbToLinear } from '../../src/lib/imaging/srgb';
import type { SvgRenderRequest } from '../../src/lib/prepare/tools';
import { asBytes, coverageOf, type Polygon } from './coverage';

const facts = {
  sha256: '0'.repeat(64),
  bytes: 1,
  ownWidthMm: null,
  ownHeightMm: null,
  remarks: [],
};

/** A picture of pixels with the given coverage of black, 0–255. */
export function pictureOf(widthPx: number, heightPx: number, coverage: Uint8Array): RasterArtwork {
  const luminance = Uint16Array.from(coverage, (c) => Math.round(65_535 * srgbToLinear(1 - c / 255)));
  return {
    kind: 'raster',
    facts: { ...facts, format: 'png', kind: 'raster', widthPx, heightPx },
    widthPx,
    heightPx,
    luminance,
  };
}

/** A picture of black polygons in pixels, drawn by exact area. */
export const pictureOfPolygons = (
  widthPx: number,
  heightPx: number,
  polygons: readonly Polygon[],
): RasterArtwork => pictureOf(widthPx, heightPx, asBytes(coverageOf(widthPx, heightPx, polygons)));

export interface Drawing {
  artwork: VectorArtwork;
  tools: { renderSvg(svg: Uint8Array, request: SvgRenderRequest): Promise<Uint8Array> };
  /** pixels drawn so far */
  drawnPx(): number;
}

/**
 * A drawing of polygons in mm and what draws it, by exact area at any scale: it stands in for an SVG and its renderer.
 * `ink` is the grey of the polygons, 0 black.
 */
export function drawingOf(widthMm: number, heightMm: number, polygons: readonly Polygon[], ink = 0): Drawing {
  let drawn = 0;
  const artwork: VectorArtwork = {
    kind: 'vector',
    facts: { ...facts, format: 'svg', kind: 'vector', widthPx: widthMm, heightPx: heightMm },
    svg: new Uint8Array(),
    aspect: widthMm / heightMm,
    missingFonts: [],
    removed: [],
  };
  const renderSvg = async (_svg: Uint8Array, request: SvgRenderRequest): Promise<Uint8Array> => {
    const { widthPx, heightPx, part = { left: 0, top: 0, width: 1, height: 1 } } = request;
    drawn += widthPx * heightPx;
    const [sx, sy] = [widthPx / (part.width * widthMm), heightPx / (part.height * heightMm)];
    const moved = polygons.map((polygon) =>
      polygon.map(([x, y]) => [(x - part.left * widthMm) * sx, (y - part.top * heightMm) * sy] as const),
    );
    const rgba = new Uint8Array(widthPx * heightPx * 4).fill(ink);
    coverageOf(widthPx, heightPx, moved).forEach((c, n) => (rgba[n * 4 + 3] = Math.round(c * 255)));
    return rgba;
  };
  return { artwork, tools: { renderSvg }, drawnPx: () => drawn };
}
