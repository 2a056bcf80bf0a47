import type { EventBody, OrderView } from '../../orders/views';
import type { Person } from '../person';
import { approveProof } from './approve-proof';
import { approveWithoutProof } from './approve-without-proof';
import { askForChanges } from './ask-for-changes';
import { cancelOrder } from './cancel-order';
import { finishOrder } from './finish-order';
import { handOverOrder } from './hand-over-order';
import { holdOrder } from './hold-order';
import { passOrder } from './pass-order';
import { putOnMachine } from './put-on-machine';
import { recallOrder } from './recall-order';
import { recordSpoiled } from './record-spoiled';
import { releaseOrder } from './release-order';
import { resumeOrder } from './resume-order';
import { sendProof } from './send-proof';
import { submitOrder } from './submit-order';
import { takeOrder } from './take-order';

/** The use case of each event. */
export async function causeEvent(person: Person, number: string, body: EventBody): Promise<OrderView> {
  const { version } = body;
  switch (body.event) {
    case 'submit':
      return submitOrder(person, number, version);
    case 'take':
      return takeOrder(person, number, version);
    case 'pass':
      return passOrder(person, number, version, body.preparationId);
    case 'send-proof':
      return sendProof(person, number, version, body.words);
    case 'approve':
      return approveProof(person, number, version, body);
    case 'approve-without-proof':
      return approveWithoutProof(person, number, version, body.reason);
    case 'ask-for-changes':
      return askForChanges(person, number, version, body.words);
    case 'release':
      return releaseOrder(person, number, version);
    case 'recall':
      return recallOrder(person, number, version, body.reason);
    case 'on-the-machine':
      return putOnMachine(person, number, version, body.checklist);
    case 'done':
      return finishOrder(person, number, version, body);
    case 'spoiled':
      return recordSpoiled(person, number, version, body);
    case 'hand-over':
      return handOverOrder(person, number, version, body);
    case 'hold':
      return holdOrder(person, number, version, body.reason);
    case 'resume':
      return resumeOrder(person, number, version);
    case 'cancel':
      return cancelOrder(person, number, version, body.reason);
  }
}
