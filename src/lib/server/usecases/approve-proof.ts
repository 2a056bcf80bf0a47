import { approvalRefusal } from '../../orders/rules';
import type { EventBody, OrderView } from '../../orders/views';
import { AppError } from '../errors';
import { approvedMail } from '../mail/messages/approved';
import { queueMail } from '../mail/queue-mail';
import { aboutOrder } from '../orders/mail-about';
import { moveOrder } from '../orders/move-order';
import { isStaff, type Person } from '../person';

type Approval = Pick<Extract<EventBody, { event: 'approve' }>, 'manifestSha256' | 'inPerson'>;

/** Who approved and how: the customer on the page, or somebody in person, recorded by staff. */
function signatureOf(person: Person, { inPerson }: Approval): { by: string; how: string } {
  if (!isStaff(person)) return { by: person.name, how: 'on the order page' };
  if (!inPerson) throw new AppError('malformed', { fields: { inPerson: 'Say who approved and how.' } });
  return { by: inPerson.who, how: `${inPerson.how}, recorded by ${person.name}` };
}

/** Approves the very manifest that was looked at. */
export async function approveProof(
  person: Person,
  number: string,
  version: number,
  approval: Approval,
): Promise<OrderView> {
  const { by, how } = signatureOf(person, approval);
  return moveOrder(person, number, { event: 'approve', version }, (_, facts) => {
    const { manifestSha256 } = approval;
    const refusal = approvalRefusal(manifestSha256, facts.passedManifestSha256);
    if (refusal !== null) throw new AppError('conflict', { detail: refusal });
    return {
      change: {
        approved_at: new Date().toISOString(),
        approved_by: by,
        approved_how: how,
        approved_manifest_sha256: manifestSha256,
      },
      words: `${by}, ${how}; manifest ${manifestSha256}`,
      also: (trx, order) =>
        queueMail(
          trx,
          order.customer.email,
          approvedMail({ ...aboutOrder(order, order.customer), approvedBy: by, how, manifestSha256 }),
        ),
    };
  });
}
