import type { OrderView } from '../../orders/views';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** A designer signs a preparation off: name, time and manifest are kept. */
export async function passOrder(
  person: Person,
  number: string,
  version: number,
  preparationId: number,
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'pass', version, preparationId }, (_, { preparation }) => ({
    change: {
      passed_at: new Date().toISOString(),
      passed_by: person.id,
      passed_preparation_id: preparationId,
      passed_manifest_sha256: preparation?.manifestSha256 ?? null,
    },
    words: `manifest ${preparation?.manifestSha256 ?? ''}`,
  }));
}
