import type { VectorArtwork } from '../artwork';
import { readRoot, rootTag } from './window-svg';

/**
 * A drawing placed with quarter turns: the same drawing in a root of its own that turns it.
 * @param artwork unchanged; returned itself for 0
 * @param quarterTurns clockwise, 0 to 3
 * @returns the turned drawing with width and height exchanged for odd turns
 */
export function turnVector(artwork: VectorArtwork, quarterTurns: 0 | 1 | 2 | 3): VectorArtwork {
  if (quarterTurns === 0) return artwork;
  const { tagLength, widthPx, heightPx, frame } = readRoot(artwork.svg);
  const [left, top, width, height] = frame;
  // Units need not be square on the page, so the turn is made in px.
  const [scaleX, scaleY] = [widthPx / width, heightPx / height];
  const [e, f] = [
    [0, 0],
    [heightPx, 0],
    [widthPx, heightPx],
    [0, widthPx],
  ][quarterTurns];
  const odd = quarterTurns % 2 === 1;
  const [turnedWidth, turnedHeight] = odd ? [heightPx, widthPx] : [widthPx, heightPx];
  const group =
    `<g transform="translate(${e} ${f}) rotate(${quarterTurns * 90}) ` +
    `scale(${scaleX} ${scaleY}) translate(${-left} ${-top})">`;
  const inner = new TextDecoder().decode(artwork.svg.subarray(tagLength)).replace(/<\/svg>$/, '');
  const text = `${rootTag(turnedWidth, turnedHeight, [0, 0, turnedWidth, turnedHeight])}${group}${inner}</g></svg>`;
  const { facts } = artwork;
  return {
    ...artwork,
    svg: new TextEncoder().encode(text),
    aspect: turnedWidth / turnedHeight,
    facts: {
      ...facts,
      widthPx: turnedWidth,
      heightPx: turnedHeight,
      ownWidthMm: odd ? facts.ownHeightMm : facts.ownWidthMm,
      ownHeightMm: odd ? facts.ownWidthMm : facts.ownHeightMm,
    },
  };
}
