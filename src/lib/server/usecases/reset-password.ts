import { audit } from '../audit';
import { hashPassword } from '../auth/password';
import { makeToken, useToken } from '../auth/token';
import { withWrite } from '../db';
import { resetMail } from '../mail/messages/reset';
import { queueMail } from '../mail/queue-mail';
import { confirmPerson, personByEmail, personById, setPassword } from '../tables/people';
import { deleteSessionsOf } from '../tables/sessions';

/** Mails a link that sets a new password; an unknown or disabled address gets nothing, and nobody is told. */
export async function askForReset(email: string): Promise<void> {
  await withWrite(async (trx) => {
    const person = await personByEmail(trx, email);
    if (!person || person.disabled_at !== null) return;
    // Staff who were invited choose their name with the invitation; a reset must not take its place.
    if (person.password_hash === null && person.role !== 'customer') return;
    await queueMail(
      trx,
      person.email,
      resetMail({ name: person.name, token: await makeToken(trx, person.id, 'reset') }),
    );
  });
}

/** Sets a new password with a mailed token. Whoever reads the mail owns the address, so it is confirmed as well. */
export async function resetPassword(token: string, password: string): Promise<void> {
  const passwordHash = await hashPassword(password);
  await withWrite(async (trx) => {
    const id = await useToken(trx, 'reset', token);
    await setPassword(trx, id, passwordHash);
    await deleteSessionsOf(trx, id);
    await confirmPerson(trx, id, new Date().toISOString());
    const person = await personById(trx, id);
    await audit(trx, { by: person, event: 'reset-password', subject: `person ${id}` });
  });
}
