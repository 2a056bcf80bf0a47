import type { OrderView } from '../../orders/views';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** Where the customer agreed to go without a proof, the pass and a reason stand in for the approval. */
export async function approveWithoutProof(
  person: Person,
  number: string,
  version: number,
  reason: string,
): Promise<OrderView> {
  return moveOrder(
    person,
    number,
    { event: 'approve-without-proof', version },
    (_, { passedManifestSha256 }) => ({
      change: {
        approved_at: new Date().toISOString(),
        approved_by: person.name,
        approved_how: `without a proof, as the customer agreed: ${reason}`,
        approved_manifest_sha256: passedManifestSha256,
      },
      words: `${reason}; manifest ${passedManifestSha256 ?? ''}`,
    }),
  );
}
