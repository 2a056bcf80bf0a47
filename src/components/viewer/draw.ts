import type { DetailFrame } from './pictures';
import { toFrame, type FrameSize, type PlateSize, type View } from './view';

export interface Drawing {
  view: View;
  frame: FrameSize;
  plate: PlateSize;
  /** device pixels per CSS pixel */
  ratio: number;
}

/** Whole source pixels that the frame shows, so that a picture of 50 million pixels costs no more than a small one. */
export function visiblePart(
  startPx: number,
  scale: number,
  extentPx: number,
  framePx: number,
): { from: number; count: number } {
  const from = Math.max(0, Math.floor(-startPx / scale));
  const to = Math.min(extentPx, Math.ceil((framePx - startPx) / scale));
  return { from, count: Math.max(0, to - from) };
}

function drawUpright(
  context: CanvasRenderingContext2D,
  image: HTMLImageElement,
  box: { x: number; y: number; width: number; height: number },
  canvas: { width: number; height: number },
): void {
  const scaleX = box.width / image.naturalWidth;
  const scaleY = box.height / image.naturalHeight;
  const across = visiblePart(box.x, scaleX, image.naturalWidth, canvas.width);
  const down = visiblePart(box.y, scaleY, image.naturalHeight, canvas.height);
  if (across.count === 0 || down.count === 0) return;
  context.imageSmoothingEnabled = scaleX < 1;
  context.imageSmoothingQuality = 'high';
  context.drawImage(
    image,
    across.from,
    down.from,
    across.count,
    down.count,
    box.x + across.from * scaleX,
    box.y + down.from * scaleY,
    across.count * scaleX,
    down.count * scaleY,
  );
}

/** Draws a picture over the artwork's extent; one of another shape (a quarter turn apart) keeps its own, centred. */
export function drawPicture(
  context: CanvasRenderingContext2D,
  image: HTMLImageElement,
  drawing: Drawing,
): void {
  const { view, frame, plate, ratio } = drawing;
  const origin = toFrame(view, frame, 0, 0);
  const full = { width: plate.widthMm * view.pxPerMm * ratio, height: plate.heightMm * view.pxPerMm * ratio };
  const aspect = image.naturalWidth / image.naturalHeight;
  const same = Math.abs(aspect / (plate.widthMm / plate.heightMm) - 1) < 0.02;
  const width = same ? full.width : Math.min(full.width, full.height * aspect);
  const height = same ? full.height : width / aspect;
  const x = origin.xPx * ratio + (full.width - width) / 2;
  const y = origin.yPx * ratio + (full.height - height) / 2;
  drawUpright(context, image, { x, y, width, height }, context.canvas);
}

/** Draws the prepared raster itself: its own pixels, in its own frame. */
export function drawDetail(
  context: CanvasRenderingContext2D,
  image: HTMLImageElement,
  detail: DetailFrame,
  drawing: Drawing,
): void {
  const { view, frame, ratio } = drawing;
  const scale = view.pxPerMm * ratio;
  const width = detail.widthPx * detail.xPitchMm;
  const height = detail.heightPx * detail.yPitchMm;
  if (detail.angleDeg === 0) {
    const corner = toFrame(view, frame, detail.originXMm, detail.originYMm);
    const box = {
      x: corner.xPx * ratio,
      y: corner.yPx * ratio,
      width: width * scale,
      height: height * scale,
    };
    return drawUpright(context, image, box, context.canvas);
  }
  const origin = toFrame(view, frame, 0, 0);
  context.save();
  context.translate(origin.xPx * ratio, origin.yPx * ratio);
  context.scale(scale, scale);
  context.translate(detail.originXMm, detail.originYMm);
  context.rotate((detail.angleDeg * Math.PI) / 180);
  context.imageSmoothingEnabled = detail.xPitchMm * scale < 1;
  context.imageSmoothingQuality = 'high';
  context.drawImage(image, 0, 0, width, height);
  context.restore();
}
