import { useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { clamp } from './view';

interface Props {
  /** share of the plate's width that shows the first picture, 0–1 */
  share: number;
  onChange: (share: number) => void;
  leftName: string;
  rightName: string;
}

/** The line between two pictures: dragged, or moved with the arrow keys. */
export function SweepHandle({ share, onChange, leftName, rightName }: Props) {
  const dragging = useRef(false);
  const move = (event: PointerEvent<HTMLElement>) => {
    const box = event.currentTarget.parentElement?.getBoundingClientRect();
    if (dragging.current && box) onChange(clamp((event.clientX - box.left) / box.width, 0, 1));
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const by = event.key === 'ArrowLeft' ? -0.02 : event.key === 'ArrowRight' ? 0.02 : 0;
    const to = event.key === 'Home' ? 0 : event.key === 'End' ? 1 : clamp(share + by, 0, 1);
    if (to === share) return;
    event.preventDefault();
    onChange(to);
  };
  const percent = Math.round(share * 100);
  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={`Sweep from ${leftName} to ${rightName}`}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={percent}
      aria-valuetext={`${percent} % ${leftName}`}
      className="absolute inset-y-0 z-[2] flex w-[44px] -translate-x-1/2 cursor-ew-resize touch-none items-center justify-center"
      style={{ left: `${share * 100}%` }}
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        event.stopPropagation();
        event.currentTarget.setPointerCapture(event.pointerId);
        dragging.current = true;
      }}
      onPointerMove={move}
      onPointerUp={() => (dragging.current = false)}
      onPointerCancel={() => (dragging.current = false)}
    >
      <span className="absolute inset-y-0 left-1/2 w-[4px] -translate-x-1/2 border-x border-ink bg-sheet" />
      <span className="relative flex h-[28px] w-[28px] items-center justify-center rounded-full border border-ink bg-sheet text-ink">
        <svg width="16" height="10" viewBox="0 0 16 10" aria-hidden="true">
          <path d="M5 1 1 5 5 9 M11 1 15 5 11 9" fill="none" stroke="currentColor" strokeWidth="1.5" />
        </svg>
      </span>
    </div>
  );
}
