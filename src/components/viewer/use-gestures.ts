import { useEffect, useRef, type PointerEvent, type RefObject } from 'react';
import { pan, zoomAt } from './view';
import type { ViewControl } from './use-view';

interface Point {
  x: number;
  y: number;
}

const distance = (a: Point, b: Point): number => Math.hypot(a.x - b.x, a.y - b.y);

/** Drag pans, two fingers zoom, the wheel zooms once the plate has the focus (or with Ctrl), else it scrolls the page. */
export function useGestures(plate: RefObject<HTMLElement | null>, control: ViewControl) {
  const pointers = useRef(new Map<number, Point>());
  const { change, zoom, limits } = control;

  useEffect(() => {
    const element = plate.current;
    if (!element) return;
    const onWheel = (event: WheelEvent) => {
      if (!event.ctrlKey && !element.contains(document.activeElement)) return;
      event.preventDefault();
      const box = element.getBoundingClientRect();
      zoom(2 ** (-event.deltaY / 240), { xPx: event.clientX - box.left, yPx: event.clientY - box.top });
    };
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  }, [plate, zoom]);

  const release = (event: PointerEvent) => pointers.current.delete(event.pointerId);
  return {
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      if (event.button !== 0) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      pointers.current.set(event.pointerId, { x: event.clientX, y: event.clientY });
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      const before = pointers.current.get(event.pointerId);
      if (!before) return;
      const now = { x: event.clientX, y: event.clientY };
      const other = [...pointers.current].find(([id]) => id !== event.pointerId)?.[1];
      pointers.current.set(event.pointerId, now);
      if (!other) return change((view) => pan(view, now.x - before.x, now.y - before.y));
      const box = event.currentTarget.getBoundingClientRect();
      const middle = { xPx: (now.x + other.x) / 2 - box.left, yPx: (now.y + other.y) / 2 - box.top };
      const factor = distance(now, other) / Math.max(1, distance(before, other));
      change((view, frame) => {
        const moved = pan(view, (now.x - before.x) / 2, (now.y - before.y) / 2);
        return zoomAt(moved, frame, middle, factor, limits);
      });
    },
    onPointerUp: release,
    onPointerCancel: release,
  };
}
