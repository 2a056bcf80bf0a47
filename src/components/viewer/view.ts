/** Arithmetic of the viewer: where a point of the placed artwork (mm) lies in the frame on screen (CSS px), and back. */

export interface FrameSize {
  widthPx: number;
  heightPx: number;
}

export interface PlateSize {
  widthMm: number;
  heightMm: number;
}

/** What the frame shows: the point of the artwork at its centre, and CSS pixels per mm. */
export interface View {
  centreXMm: number;
  centreYMm: number;
  pxPerMm: number;
}

export interface ZoomLimits {
  least: number;
  most: number;
}

/** CSS pixels that one prepared pixel may fill at the closest. */
const CLOSEST_PX = 64;

/** The whole artwork in the frame, centred, with a margin all round. */
export function fitView(plate: PlateSize, frame: FrameSize, marginPx = 16): View {
  const width = Math.max(1, frame.widthPx - 2 * marginPx);
  const height = Math.max(1, frame.heightPx - 2 * marginPx);
  return {
    centreXMm: plate.widthMm / 2,
    centreYMm: plate.heightMm / 2,
    pxPerMm: Math.min(width / plate.widthMm, height / plate.heightMm),
  };
}

/** From half the fitted size to one prepared pixel filling 64 CSS pixels. */
export function zoomLimits(plate: PlateSize, frame: FrameSize, pitchMm: number): ZoomLimits {
  const fitted = fitView(plate, frame).pxPerMm;
  return { least: fitted / 2, most: Math.max(fitted, CLOSEST_PX / pitchMm) };
}

export const clamp = (value: number, least: number, most: number): number =>
  Math.min(most, Math.max(least, value));

/** Keeps the artwork from leaving the frame: no gap beside it where it is larger, centred where it is smaller. */
export function keepInFrame(view: View, plate: PlateSize, frame: FrameSize): View {
  const along = (centre: number, extentMm: number, extentPx: number): number => {
    const half = extentPx / 2 / view.pxPerMm;
    return half * 2 >= extentMm ? extentMm / 2 : clamp(centre, half, extentMm - half);
  };
  return {
    pxPerMm: view.pxPerMm,
    centreXMm: along(view.centreXMm, plate.widthMm, frame.widthPx),
    centreYMm: along(view.centreYMm, plate.heightMm, frame.heightPx),
  };
}

export function toFrame(
  view: View,
  frame: FrameSize,
  xMm: number,
  yMm: number,
): { xPx: number; yPx: number } {
  return {
    xPx: frame.widthPx / 2 + (xMm - view.centreXMm) * view.pxPerMm,
    yPx: frame.heightPx / 2 + (yMm - view.centreYMm) * view.pxPerMm,
  };
}

export function toPlate(
  view: View,
  frame: FrameSize,
  xPx: number,
  yPx: number,
): { xMm: number; yMm: number } {
  return {
    xMm: view.centreXMm + (xPx - frame.widthPx / 2) / view.pxPerMm,
    yMm: view.centreYMm + (yPx - frame.heightPx / 2) / view.pxPerMm,
  };
}

/** Moves the picture with the hand: a drag to the right by dxPx shows what lies further left. */
export function pan(view: View, dxPx: number, dyPx: number): View {
  return {
    ...view,
    centreXMm: view.centreXMm - dxPx / view.pxPerMm,
    centreYMm: view.centreYMm - dyPx / view.pxPerMm,
  };
}

/** Zooms by a factor; the point of the artwork under (xPx, yPx) stays where it is, until a limit is met. */
export function zoomAt(
  view: View,
  frame: FrameSize,
  at: { xPx: number; yPx: number },
  factor: number,
  limits: ZoomLimits,
): View {
  const pxPerMm = clamp(view.pxPerMm * factor, limits.least, limits.most);
  const held = toPlate(view, frame, at.xPx, at.yPx);
  return {
    pxPerMm,
    centreXMm: held.xMm - (at.xPx - frame.widthPx / 2) / pxPerMm,
    centreYMm: held.yMm - (at.yPx - frame.heightPx / 2) / pxPerMm,
  };
}

/**
 * Zoom at which every prepared pixel fills the same whole number of screen pixels.
 * @param screenPx screen (device) pixels per prepared pixel, a whole number
 * @param ratio device pixels per CSS pixel
 */
export function wholePixelZoom(pitchMm: number, screenPx: number, ratio: number): number {
  return screenPx / (pitchMm * ratio);
}

/** Brings a place to the centre, close enough that it fills about a sixth of the frame, never further away than now. */
export function showPlace(
  view: View,
  frame: FrameSize,
  place: { xMm: number; yMm: number; widthMm: number; heightMm: number },
  limits: ZoomLimits,
  pitchMm: number,
): View {
  const extent = Math.max(place.widthMm, place.heightMm, pitchMm * 8);
  const wanted = Math.min(frame.widthPx, frame.heightPx) / 6 / extent;
  const closest = 12 / pitchMm;
  return {
    centreXMm: place.xMm,
    centreYMm: place.yMm,
    pxPerMm: clamp(Math.max(view.pxPerMm, Math.min(wanted, closest)), limits.least, limits.most),
  };
}

/** Index of the next of `count` findings after `current`, going round; −1 or null starts at the first. */
export function nextIndex(current: number | null, count: number): number | null {
  if (count === 0) return null;
  return current === null || current < 0 ? 0 : (current + 1) % count;
}
