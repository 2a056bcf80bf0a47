import { checklistRefusal } from '../../orders/rules';
import type { OrderView } from '../../orders/views';
import { moveOrder, requireNothingWaits } from '../orders/move-order';
import type { Person } from '../person';

/** Records that an order is on the machine, with its checklist ticked. It drives nothing. */
export async function putOnMachine(
  person: Person,
  number: string,
  version: number,
  checklist: readonly string[],
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'on-the-machine', version }, () => {
    requireNothingWaits(checklistRefusal(checklist));
    return { words: `ticked: ${checklist.join(', ')}` };
  });
}
