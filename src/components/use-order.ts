import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { EventBody, OrderView } from '@/lib/orders/views';
import type { OrderPatch } from '@/lib/orders/order';
import { call } from './api';

export const orderKey = (number: string) => ['order', number] as const;

const POLL_MS = 5_000;

function isWorkedOn({ artworks, preparations }: OrderView): boolean {
  return [...artworks, ...preparations].some(
    ({ task }) => task.state === 'waiting' || task.state === 'running',
  );
}

/** One order, from the server's first answer on; an empty number asks for none. */
export function useOrder(number: string, initial?: OrderView) {
  return useQuery({
    queryKey: orderKey(number),
    queryFn: async ({ signal }) =>
      (await call('GET /api/orders/:number', { params: { number }, signal })).order,
    initialData: initial,
    enabled: number !== '',
    staleTime: 0,
    // Should an event be missed, a task under way is still seen to end.
    refetchInterval: ({ state }) => (state.data && isWorkedOn(state.data) ? POLL_MS : false),
    refetchOnMount: initial === undefined,
  });
}

/** `Omit` that keeps a union a union. */
type WithoutVersion<T> = T extends { version: number } ? Omit<T, 'version'> : never;
export type EventInput = WithoutVersion<EventBody>;

/** Moves an order along its life; the version that was seen goes with it. */
export function useOrderEvent(order: Pick<OrderView, 'number' | 'version'>) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: async (event: EventInput) =>
      (
        await call('POST /api/orders/:number/events', {
          params: { number: order.number },
          body: { ...event, version: order.version } as EventBody,
        })
      ).order,
    onSuccess: (next) => queries.setQueryData(orderKey(order.number), next),
    // Someone else was faster, or a rule holds it: show how things stand now.
    onError: () => queries.invalidateQueries({ queryKey: orderKey(order.number) }),
  });
}

/** Changes an order's fields; the version that was seen goes with it. */
export function useOrderFields(order: Pick<OrderView, 'number' | 'version'>) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: async (fields: OrderPatch) =>
      (
        await call('PATCH /api/orders/:number', {
          params: { number: order.number },
          body: { version: order.version, fields },
        })
      ).order,
    onSuccess: (next) => queries.setQueryData(orderKey(order.number), next),
    onError: () => queries.invalidateQueries({ queryKey: orderKey(order.number) }),
  });
}
