import type { TaskView } from '@/lib/orders/views';

export const isUnderWay = (task: TaskView | null): boolean =>
  task?.state === 'waiting' || task?.state === 'running';

/** What a task is doing, as a person reads it: "Screening, 40 %". */
export function stageWords(task: TaskView, otherwise: string): string {
  if (task.state === 'waiting') return 'Waiting for its turn';
  const stage = task.stage.replace(/-/g, ' ');
  const name = stage ? stage.charAt(0).toUpperCase() + stage.slice(1) : otherwise;
  return `${name}, ${Math.round(task.progress * 100)} %`;
}
