import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { Design, OrderView } from '@/lib/orders/views';
import { call } from '../api';
import { orderKey } from '../use-order';

const KEEP_AFTER_MS = 700;

/**
 * The designer's choices: shown at once, kept on the server shortly after the last change, and before anything is
 * prepared. Where another person kept others meanwhile, theirs are shown and the refusal is said.
 */
export function useDesign(order: OrderView, first: Design | null) {
  const queries = useQueryClient();
  const [draft, setDraft] = useState<Design | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const version = useRef(order.version);
  useEffect(() => {
    version.current = order.version;
  }, [order.version]);
  useEffect(() => () => clearTimeout(timer.current), []);

  const take = (next: OrderView) => {
    version.current = next.version;
    queries.setQueryData(orderKey(order.number), next);
  };
  const params = { number: order.number };
  const keep = useMutation({
    mutationFn: (design: Design) =>
      call('PUT /api/orders/:number/design', { params, body: { version: version.current, design } }),
    onSuccess: ({ order: next }, design) => {
      take(next);
      setDraft((now) => (now === design ? null : now));
    },
    onError: () => {
      setDraft(null);
      void queries.invalidateQueries({ queryKey: orderKey(order.number) });
    },
  });
  const prepare = useMutation({
    mutationFn: async () => {
      clearTimeout(timer.current);
      const unkept = draft ?? (order.design ? null : first);
      if (unkept) await keep.mutateAsync(unkept);
      return call('POST /api/orders/:number/preparations', { params, body: { version: version.current } });
    },
    onSuccess: ({ order: next }) => take(next),
    onError: () => void queries.invalidateQueries({ queryKey: orderKey(order.number) }),
  });
  const change = (design: Design) => {
    setDraft(design);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => keep.mutate(design), KEEP_AFTER_MS);
  };
  return { design: draft ?? order.design ?? first, isKept: draft === null, change, keep, prepare };
}
