import type { ProgressEvent } from '../../orders/views';
import { database } from '../db';
import { findOrder } from '../orders/find-order';
import type { Person } from '../person';
import { isStaff } from '../person';
import { orderById } from '../tables/orders';
import { tasksOfOrder } from '../tables/tasks';

const KINDS = { 'check-artwork': 'check', 'prepare-order': 'prepare' } as const;

/** A way to look, again and again, at how an order's work stands; undefined once it may not be seen any more. */
export async function watchOrder(
  person: Person,
  number: string,
): Promise<() => Promise<ProgressEvent | undefined>> {
  const { id } = await findOrder(database(), person, number);
  return async () => {
    const row = await orderById(database(), id);
    if (!row || (!isStaff(person) && row.customer_id !== person.id)) return undefined;
    const tasks = await tasksOfOrder(database(), id);
    const shown = tasks.filter(({ name }) => isStaff(person) || name === 'check-artwork');
    return {
      version: row.version,
      tasks: shown.flatMap(({ name, subject, state, stage, progress, problem }) =>
        state === 'superseded'
          ? []
          : [
              {
                kind: KINDS[name as keyof typeof KINDS],
                subject,
                state,
                stage,
                progress: Math.round(progress * 100) / 100,
                problem,
              },
            ],
      ),
    };
  };
}
