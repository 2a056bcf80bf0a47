import { useState, type KeyboardEvent } from 'react';
import { pan } from './view';
import type { ViewControl } from './use-view';

const STEP_PX = 48;
const ARROWS: Record<string, readonly [number, number]> = {
  ArrowLeft: [1, 0],
  ArrowRight: [-1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
};

/** Arrows pan, + and − zoom, 0 shows the whole, space holds, f goes to the next finding. */
export function useKeys(control: ViewControl, onNextFinding: () => void) {
  const [held, setHeld] = useState(false);
  const act = (event: KeyboardEvent): boolean => {
    const arrow = ARROWS[event.key];
    if (arrow) {
      const step = event.shiftKey ? STEP_PX * 4 : STEP_PX;
      control.change((view) => pan(view, arrow[0] * step, arrow[1] * step));
    } else if (event.key === '+' || event.key === '=') control.zoom(1.5);
    else if (event.key === '-' || event.key === '−') control.zoom(1 / 1.5);
    else if (event.key === '0') control.fit();
    else if (event.key === ' ') setHeld(true);
    else if (event.key === 'f') onNextFinding();
    else return false;
    return true;
  };
  return {
    held,
    setHeld,
    keys: {
      onKeyDown: (event: KeyboardEvent) => {
        if (event.ctrlKey || event.metaKey || event.altKey || event.target !== event.currentTarget) return;
        if (act(event)) event.preventDefault();
      },
      onKeyUp: (event: KeyboardEvent) => event.key === ' ' && setHeld(false),
      onBlur: () => setHeld(false),
    },
  };
}
