import type { OrderView } from '../../orders/views';
import { changesRequestedMail } from '../mail/messages/changes-requested';
import { queueMail } from '../mail/queue-mail';
import { aboutOrder } from '../orders/mail-about';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';
import { peopleInRole, personById } from '../tables/people';

/** Sends a proof back with words; the pass is void, and whoever passed it is told. */
export async function askForChanges(
  person: Person,
  number: string,
  version: number,
  words: string,
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'ask-for-changes', version }, () => ({
    words,
    also: async (trx, order) => {
      const passer = order.row.passed_by === null ? null : await personById(trx, order.row.passed_by);
      const readers = passer && passer.disabled_at === null ? [passer] : await peopleInRole(trx, 'designer');
      for (const reader of readers) {
        await queueMail(
          trx,
          reader.email,
          changesRequestedMail({ ...aboutOrder(order, reader), customer: order.customer.name, words }),
        );
      }
    },
  }));
}
