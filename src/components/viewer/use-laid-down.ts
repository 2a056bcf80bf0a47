import { useEffect, useState } from 'react';

const LAID_MS = 600;
const ROWS = 48;

/**
 * Share of the rows that are laid down, 0–1. A result that was there when the page opened is simply there; one that
 * arrives later is laid down once, from the top. Reduced motion: none of it.
 */
export function useLaidDown(key: string | null, ready: boolean): number {
  const [known] = useState(() => new Set([key]));
  const [share, setShare] = useState(1);
  useEffect(() => {
    if (!key || !ready || known.has(key)) return;
    known.add(key);
    if (window.matchMedia('(prefers-reduced-motion: reduce)').matches) return;
    let frame = 0;
    const start = performance.now();
    const step = (now: number) => {
      const done = Math.min(1, (now - start) / LAID_MS);
      setShare(Math.floor(done * ROWS) / ROWS);
      if (done < 1) frame = requestAnimationFrame(step);
    };
    frame = requestAnimationFrame(step);
    return () => {
      cancelAnimationFrame(frame);
      setShare(1);
    };
  }, [key, ready, known]);
  return share;
}
