import { useSyncExternalStore } from 'react';

const QUERY = '(max-width: 767px)';

function subscribe(changed: () => void): () => void {
  const media = window.matchMedia(QUERY);
  media.addEventListener('change', changed);
  return () => media.removeEventListener('change', changed);
}

/** Whether the window is phone-wide; false while rendered on the server. */
export function useNarrow(): boolean {
  return useSyncExternalStore(
    subscribe,
    () => window.matchMedia(QUERY).matches,
    () => false,
  );
}
