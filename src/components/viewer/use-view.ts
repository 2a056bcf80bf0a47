import { useCallback, useMemo, useState } from 'react';
import { fitView, keepInFrame, zoomAt, zoomLimits, type FrameSize, type PlateSize, type View } from './view';

export interface ViewControl {
  view: View;
  frame: FrameSize;
  setFrame: (frame: FrameSize) => void;
  /** any change; the result is kept inside the limits and the frame */
  change: (next: (view: View, frame: FrameSize) => View) => void;
  fit: () => void;
  zoom: (factor: number, at?: { xPx: number; yPx: number }) => void;
  isFitted: boolean;
  limits: { least: number; most: number };
}

const SAME = 1e-6;

/** What the frame shows. Null inside means "fitted", so that a change of the window keeps the whole artwork in it. */
export function useView(plate: PlateSize, pitchMm: number): ViewControl {
  const [frame, setFrameState] = useState<FrameSize>({ widthPx: 0, heightPx: 0 });
  const [chosen, setChosen] = useState<View | null>(null);
  const limits = useMemo(() => zoomLimits(plate, frame, pitchMm), [plate, frame, pitchMm]);
  const fitted = useMemo(() => fitView(plate, frame), [plate, frame]);
  const view = useMemo(
    () => (chosen ? keepInFrame(chosen, plate, frame) : fitted),
    [chosen, fitted, plate, frame],
  );

  const setFrame = useCallback((next: FrameSize) => {
    setFrameState((known) =>
      known.widthPx === next.widthPx && known.heightPx === next.heightPx ? known : next,
    );
  }, []);
  const change = useCallback(
    (next: (view: View, frame: FrameSize) => View) => {
      setChosen((known) => {
        const from = known ? keepInFrame(known, plate, frame) : fitted;
        return keepInFrame(next(from, frame), plate, frame);
      });
    },
    [fitted, frame, plate],
  );
  const fit = useCallback(() => setChosen(null), []);
  const zoom = useCallback(
    (factor: number, at?: { xPx: number; yPx: number }) =>
      change((from, size) =>
        zoomAt(from, size, at ?? { xPx: size.widthPx / 2, yPx: size.heightPx / 2 }, factor, limits),
      ),
    [change, limits],
  );
  const isFitted = Math.abs(view.pxPerMm - fitted.pxPerMm) < SAME * fitted.pxPerMm;
  return { view, frame, setFrame, change, fit, zoom, isFitted, limits };
}
