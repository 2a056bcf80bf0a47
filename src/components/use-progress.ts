import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { ProgressEvent } from '@/lib/orders/views';
import { orderKey } from './use-order';

const POLL_MS = 2_000;
type ProgressTask = ProgressEvent['tasks'][number];

/**
 * What is being worked on for an order, by server-sent events; where those do not get through, the order itself is asked
 * for every two seconds. A grown version or an ended task fetches the order again.
 */
export function useProgress(number: string | null): ProgressTask[] {
  const queries = useQueryClient();
  const [tasks, setTasks] = useState<ProgressTask[]>([]);
  useEffect(() => {
    if (!number) return;
    const refetch = () => void queries.invalidateQueries({ queryKey: orderKey(number) });
    let seen = '';
    let timer: ReturnType<typeof setInterval> | undefined;
    const startPolling = () => {
      timer ??= setInterval(refetch, POLL_MS);
    };
    if (typeof EventSource === 'undefined') {
      startPolling();
      return () => clearInterval(timer);
    }
    const source = new EventSource(`/api/orders/${encodeURIComponent(number)}/progress`);
    const take = (event: MessageEvent<string>) => {
      clearInterval(timer);
      timer = undefined;
      const news = JSON.parse(event.data) as ProgressEvent;
      setTasks(news.tasks);
      const now = `${news.version}/${news.tasks.map((task) => `${task.kind}${task.subject}${task.state}`).join()}`;
      if (now !== seen) refetch();
      seen = now;
    };
    source.onmessage = take;
    source.addEventListener('progress', take);
    source.onerror = startPolling;
    return () => {
      source.close();
      clearInterval(timer);
    };
  }, [number, queries]);
  return tasks;
}
