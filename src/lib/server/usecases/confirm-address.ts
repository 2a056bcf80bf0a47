import { audit } from '../audit';
import { makeToken, useToken } from '../auth/token';
import { withWrite } from '../db';
import { confirmMail } from '../mail/messages/confirm';
import { queueMail } from '../mail/queue-mail';
import type { Person } from '../person';
import { confirmPerson, personById } from '../tables/people';

/** Confirms the address that a mailed token was sent to. */
export async function confirmAddress(token: string): Promise<void> {
  await withWrite(async (trx) => {
    const id = await useToken(trx, 'confirm', token);
    await confirmPerson(trx, id, new Date().toISOString());
    const person = await personById(trx, id);
    await audit(trx, { by: person, event: 'confirm-address', subject: `person ${id}` });
  });
}

/** Sends the confirming mail again, with a new link; a confirmed address gets none. */
export async function resendConfirmation(by: Person): Promise<void> {
  await withWrite(async (trx) => {
    const person = await personById(trx, by.id);
    if (!person || person.confirmed_at !== null) return;
    await queueMail(
      trx,
      person.email,
      confirmMail({ name: person.name, token: await makeToken(trx, person.id, 'confirm') }),
    );
  });
}
