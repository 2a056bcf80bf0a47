import { useCallback, useEffect, useState } from 'react';
import { changedList, readListAddress, writeListAddress, type ListQuery } from './list-address';

/**
 * A list's state in the address. A choice adds a step to the browser's history; typing in the search field only changes
 * the step that is there.
 */
export function useListAddress(initialSearch: string, own: Partial<ListQuery>) {
  const [query, setQuery] = useState(() => readListAddress(initialSearch, own));
  useEffect(() => {
    const read = () => setQuery(readListAddress(window.location.search, own));
    window.addEventListener('popstate', read);
    return () => window.removeEventListener('popstate', read);
  }, [own]);
  const go = useCallback(
    (next: ListQuery, way: 'push' | 'replace' = 'push') => {
      const address = `${window.location.pathname}${writeListAddress(next, own)}`;
      if (way === 'push') window.history.pushState(null, '', address);
      else window.history.replaceState(null, '', address);
      setQuery(next);
    },
    [own],
  );
  const change = useCallback(
    (part: Partial<ListQuery>, way?: 'push' | 'replace') => go(changedList(query, part), way),
    [go, query],
  );
  return { query, go, change };
}
