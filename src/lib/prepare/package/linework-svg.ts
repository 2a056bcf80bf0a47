import { optimize, type Config } from 'svgo/browser';
import { readSvg } from '../svg/read-svg';
import type { PipelineTools } from '../tools';
import type { Linework } from '../trace/linework';
import { mirrored } from './mirrored';

/** Longest side of the renders that are compared. */
const COMPARED_PX = 1600;
/** Greatest difference of a sample, of 255, that is the rounding of an edge and not a change of the drawing. */
const SAME_WITHIN = 8;

// Sizes stay in mm, curves stay curves, closed lines stay closed. The types leave out that arcs can be turned off; one
// decimal more than the coordinates have keeps relative ones from drifting.
const PATHS = {
  floatPrecision: 5,
  makeArcs: false as unknown as undefined,
  straightCurves: false,
  removeUseless: false,
  convertToZ: true,
};
const SHORTER: Config = {
  multipass: true,
  floatPrecision: 4,
  plugins: [
    {
      name: 'preset-default',
      params: { overrides: { cleanupNumericValues: false, convertPathData: PATHS, mergePaths: false } },
    },
  ],
};

const write = (value: number): string => String(Math.round(value * 1e4) / 1e4);

/** The drawing as it is first written: every line a path of its own, one black, one width, no names. */
function plainSvg({ widthMm, heightMm, strokeWidthMm, paths }: Linework): string {
  const [width, height] = [write(widthMm), write(heightMm)];
  const lines = paths.map((data) => `<path d="${data}"/>`).join('');
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}mm" height="${height}mm" viewBox="0 0 ${width} ${height}">` +
    `<g fill="none" stroke="#000" stroke-width="${write(strokeWidthMm)}" stroke-linecap="round" stroke-linejoin="round">` +
    `${lines}</g></svg>`
  );
}

async function looksTheSame(
  a: Uint8Array,
  b: Uint8Array,
  linework: Linework,
  tools: Pick<PipelineTools, 'renderSvg'>,
) {
  const scale = COMPARED_PX / Math.max(linework.widthMm, linework.heightMm);
  const widthPx = Math.max(1, Math.round(linework.widthMm * scale));
  const heightPx = Math.max(1, Math.round(linework.heightMm * scale));
  const draw = async (bytes: Uint8Array): Promise<Uint8Array> =>
    tools.renderSvg((await readSvg(bytes)).svg, { widthPx, heightPx });
  const [before, after] = [await draw(a), await draw(b)];
  return before.every((value, index) => Math.abs(value - after[index]) <= SAME_WITHIN);
}

/**
 * Lines as an SVG file in mm at true size.
 * Written plainly, then shortened by svgo; the shorter one is kept only where both look the same when drawn.
 * @param linework unchanged
 * @param options.mirror left and right exchanged
 * @param tools only `renderSvg` is used
 * @returns UTF-8 bytes, the same for the same lines, and whether they are the shortened ones
 */
export async function lineworkSvg(
  linework: Linework,
  { mirror }: { mirror: boolean },
  tools: Pick<PipelineTools, 'renderSvg'>,
): Promise<{ bytes: Uint8Array; optimised: boolean }> {
  const encoder = new TextEncoder();
  const plain = encoder.encode(plainSvg(mirror ? mirrored(linework) : linework));
  const shorter = encoder.encode(optimize(new TextDecoder().decode(plain), SHORTER).data);
  if (shorter.length >= plain.length) return { bytes: plain, optimised: false };
  // Drawings beyond what may be drawn at all cannot be compared either: they stay as they are.
  const same = await looksTheSame(plain, shorter, linework, tools).catch(() => false);
  return same ? { bytes: shorter, optimised: true } : { bytes: plain, optimised: false };
}
