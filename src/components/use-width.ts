import { useEffect, useState, type RefObject } from 'react';

/** Width of an element in px, followed as it changes; `assumed` until it is measured and on the server. */
export function useWidth(element: RefObject<Element | null>, assumed: number): number {
  const [width, setWidth] = useState(assumed);
  useEffect(() => {
    if (!element.current || typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(([entry]) => setWidth(entry.contentRect.width));
    observer.observe(element.current);
    return () => observer.disconnect();
  }, [element]);
  return width;
}
