import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import type { OrderView, Problem } from '@/lib/orders/views';
import { call, problemOf, Refusal } from '../api';
import { orderKey } from '../use-order';
import { changesSince, patchOf, type DraftForm } from './draft-form';

const KEEP_AFTER_MS = 500;

export interface Draft {
  order: OrderView | null;
  keeping: 'kept' | 'keeping' | 'not-kept';
  problem: Problem | null;
  /** the draft on the server, opened now if it is not there yet */
  open: () => Promise<OrderView>;
  /** everything entered so far is on the server; resolves to the order as it stands */
  keep: () => Promise<OrderView>;
  take: (order: OrderView) => void;
}

/** Opens a draft at the first upload or field, and keeps every change on the server, one after another. */
export function useDraft(
  form: UseFormReturn<DraftForm>,
  initial: OrderView | null,
  customerId: number | null,
): Draft {
  const queries = useQueryClient();
  const [order, setOrder] = useState(initial);
  const [keeping, setKeeping] = useState<Draft['keeping']>('kept');
  const [problem, setProblem] = useState<Problem | null>(null);
  const latest = useRef(initial);
  const chain = useRef<Promise<unknown>>(Promise.resolve());

  const take = useCallback(
    (next: OrderView) => {
      if (latest.current && next.version < latest.current.version) return;
      latest.current = next;
      queries.setQueryData(orderKey(next.number), next);
      setOrder(next);
    },
    [queries],
  );

  const save = useCallback(async (): Promise<OrderView> => {
    const patch = patchOf(form.getValues());
    if (!latest.current) {
      const answer = await call('POST /api/orders', {
        body: { ...patch, ...(customerId ? { customerId } : {}) },
      });
      take(answer.order);
      window.history.replaceState(null, '', `/orders/new?draft=${answer.order.number}`);
      return answer.order;
    }
    return patchOnce(latest.current, patch, take);
  }, [customerId, form, take]);

  const keep = useCallback((): Promise<OrderView> => {
    setKeeping('keeping');
    const turn = chain.current.then(save);
    chain.current = turn.catch(() => undefined);
    turn.then(
      () => (setKeeping('kept'), setProblem(null)),
      (error: unknown) => (setKeeping('not-kept'), setProblem(problemOf(error))),
    );
    return turn;
  }, [save]);

  const open = useCallback(async () => latest.current ?? keep(), [keep]);

  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const watching = form.watch((_, { name }) => {
      if (name === undefined) return;
      clearTimeout(timer);
      timer = setTimeout(() => void keep().catch(() => undefined), KEEP_AFTER_MS);
    });
    return () => {
      clearTimeout(timer);
      watching.unsubscribe();
    };
  }, [form, keep]);

  return { order, keeping, problem, open, keep, take };
}

/** One change with the version last seen; when something else was faster (an upload, a task), once more with the new one. */
async function patchOnce(
  seen: OrderView,
  patch: ReturnType<typeof patchOf>,
  take: (order: OrderView) => void,
): Promise<OrderView> {
  const params = { number: seen.number };
  const send = async (order: OrderView) => {
    const fields = changesSince(patch, order.fields);
    if (Object.keys(fields).length === 0) return order;
    const answer = await call('PATCH /api/orders/:number', {
      params,
      body: { version: order.version, fields },
    });
    take(answer.order);
    return answer.order;
  };
  try {
    return await send(seen);
  } catch (error) {
    if (!(error instanceof Refusal) || error.status !== 409) throw error;
    const now = (await call('GET /api/orders/:number', { params })).order;
    take(now);
    return send(now);
  }
}
