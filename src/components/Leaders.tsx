import { useEffect, useState, type RefObject } from 'react';

interface Props {
  /** holds both the plate (`data-place`) and the notes (`data-note`) */
  container: RefObject<HTMLElement | null>;
  lit: string | null;
  /** measured anew when this changes */
  revision: string;
}

interface Leader {
  id: string;
  d: string;
}

function measure(root: HTMLElement): Leader[] {
  const frame = root.getBoundingClientRect();
  return [...root.querySelectorAll<HTMLElement>('[data-note]')].flatMap((note) => {
    const id = note.dataset.note ?? '';
    const box = note.getBoundingClientRect();
    const x1 = box.left - frame.left - 4;
    const y1 = box.top - frame.top + 22;
    const ends = [...root.querySelectorAll(`[data-place="${id}"]`)].map((place) => {
      const ring = place.getBoundingClientRect();
      return { x: ring.right - frame.left + 2, y: ring.top + ring.height / 2 - frame.top };
    });
    if (ends.length === 0) return [];
    const distance = ({ x, y }: { x: number; y: number }) => Math.hypot(x1 - x, y1 - y);
    const { x: x2, y: y2 } = ends.reduce((nearest, end) =>
      distance(end) < distance(nearest) ? end : nearest,
    );
    // Only where the note stands in the margin beside the plate.
    return x1 > x2 ? [{ id, d: `M${x1} ${y1} H${x1 - 12} L${x2} ${y2}` }] : [];
  });
}

/** Thin lines from the notes in the margin to their places on the plate. */
export function Leaders({ container, lit, revision }: Props) {
  const [leaders, setLeaders] = useState<Leader[]>([]);
  useEffect(() => {
    const root = container.current;
    if (!root || typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(() => setLeaders(measure(root)));
    observer.observe(root);
    for (const part of root.querySelectorAll('[data-note], .plate-picture')) observer.observe(part);
    return () => observer.disconnect();
  }, [container, revision]);
  return (
    <svg className="leaders max-lg:hidden" aria-hidden="true">
      {leaders.map(({ id, d }) => (
        <path key={id} d={d} className="leader" data-lit={lit === id} />
      ))}
    </svg>
  );
}
