import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/** Whether the page has come alive: false on the server and until the island's code runs. */
export function useHydrated(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
