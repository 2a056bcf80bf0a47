import type { TaskView } from '@/lib/orders/views';

/** What a task is doing, as a person reads it. */
export function taskWords(task: Pick<TaskView, 'state' | 'stage'>): string {
  if (task.state === 'waiting') return 'Waiting for its turn';
  return task.stage || 'Looking at the artwork';
}
