import { audit } from '../audit';
import { hashPassword } from '../auth/password';
import { useToken } from '../auth/token';
import { withWrite } from '../db';
import { AppError } from '../errors';
import { confirmPerson, personById, renamePerson, setPassword } from '../tables/people';

/** Lets an invited person in under a name and a password of their own; the mailed link proves the address. */
export async function acceptInvitation(fields: {
  token: string;
  name: string;
  password: string;
}): Promise<void> {
  const passwordHash = await hashPassword(fields.password);
  await withWrite(async (trx) => {
    const id = await useToken(trx, 'invitation', fields.token);
    const person = await personById(trx, id);
    if (!person || person.disabled_at !== null) throw new AppError('link-spent');
    await renamePerson(trx, id, fields.name);
    await setPassword(trx, id, passwordHash);
    await confirmPerson(trx, id, new Date().toISOString());
    await audit(trx, {
      by: { id, name: fields.name },
      event: 'accept-invitation',
      subject: `person ${id}`,
      words: `as ${person.role}`,
    });
  });
}
