import { useEffect, useLayoutEffect, useRef } from 'react';
import { drawDetail, drawPicture } from './draw';
import type { ViewerPicture } from './pictures';
import type { LoadedImage } from './use-images';
import type { FrameSize, PlateSize, View } from './view';

export interface PaneLayer {
  picture: ViewerPicture;
  image: LoadedImage;
  detail: LoadedImage;
  /** part of the pane's width that shows this layer, fractions from its left edge */
  from: number;
  to: number;
}

interface Props {
  layers: readonly PaneLayer[];
  view: View;
  frame: FrameSize;
  plate: PlateSize;
  /** share of the rows laid down, 0–1 */
  laid: number;
  /** where the pane measures itself; only the first one of several does */
  onSize?: (frame: FrameSize) => void;
}

/**
 * Whether the prepared raster itself is drawn: where the screen shows more than its picture holds. A turned raster's
 * picture is drawn upright, so its own pixels are drawn as soon as they can be told apart.
 */
export function needsDetail(layer: PaneLayer, view: View, plate: PlateSize, ratio: number): boolean {
  const { picture, image } = layer;
  if (!picture.detail || !image.image) return false;
  const held = image.image.naturalWidth / plate.widthMm;
  const own = 1 / picture.detail.xPitchMm;
  const shown = view.pxPerMm * ratio;
  return picture.detail.angleDeg === 0 ? held < own && shown > held : shown > own;
}

function paint(canvas: HTMLCanvasElement, { layers, view, frame, plate, laid }: Props): void {
  const ratio = window.devicePixelRatio || 1;
  canvas.width = Math.round(frame.widthPx * ratio);
  canvas.height = Math.round(frame.heightPx * ratio);
  const context = canvas.getContext('2d');
  if (!context) return;
  const drawing = { view, frame, plate, ratio };
  for (const layer of layers) {
    if (!layer.image.image || layer.to <= layer.from) continue;
    context.save();
    context.beginPath();
    context.rect(layer.from * canvas.width, 0, (layer.to - layer.from) * canvas.width, laid * canvas.height);
    context.clip();
    const { detail } = layer.picture;
    if (detail && layer.detail.image && needsDetail(layer, view, plate, ratio)) {
      drawDetail(context, layer.detail.image, detail, drawing);
    } else drawPicture(context, layer.image.image, drawing);
    context.restore();
  }
}

/** One pane of the plate: pictures drawn at the screen's own pixels, each prepared pixel a hard square above 1:1. */
export function Pane(props: Props) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const { onSize } = props;
  useLayoutEffect(() => {
    if (canvas.current && props.frame.widthPx > 0) paint(canvas.current, props);
  });
  useEffect(() => {
    const element = canvas.current?.parentElement;
    if (!element || !onSize) return;
    const measure = () => onSize({ widthPx: element.clientWidth, heightPx: element.clientHeight });
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    measure();
    return () => observer.disconnect();
  }, [onSize]);
  return <canvas ref={canvas} aria-hidden="true" className="absolute inset-0 h-full w-full" />;
}
