import { audit } from '../audit';
import { makeToken } from '../auth/token';
import { config } from '../config';
import { database, withWrite } from '../db';
import { siteUrl } from '../mail/address';
import { hasAdmin, insertPerson, personByEmail } from '../tables/people';
import { hasOpenToken } from '../tables/tokens';

async function makeInvitation(email: string): Promise<string | null> {
  return withWrite(async (trx) => {
    const at = new Date().toISOString();
    const known = await personByEmail(trx, email);
    if (known && (await hasOpenToken(trx, known.id, 'invitation', at))) return null;
    if (known && (known.role !== 'admin' || known.disabled_at !== null)) {
      throw new Error(
        `ADMIN_EMAIL is ${email}, which belongs to somebody who is no admin. Name another address.`,
      );
    }
    const id =
      known?.id ??
      (await insertPerson(trx, {
        email,
        name: email,
        role: 'admin',
        password_hash: null,
        confirmed_at: null,
        created_at: at,
      }));
    await audit(trx, {
      by: null,
      event: 'invite',
      subject: `person ${id}`,
      words: `${email} as the first admin`,
    });
    return makeToken(trx, id, 'invitation');
  });
}

/**
 * In production, while nobody can sign in as an admin, prints a link that makes the first one. It works once; it is printed
 * once, and again only when it grew too old unused.
 */
export async function introduceFirstAdmin(print: (line: string) => void = console.log): Promise<void> {
  if (!config().isProduction || (await hasAdmin(database()))) return;
  const email = config().adminEmail;
  if (email === null)
    throw new Error(
      'There is no admin yet. Set ADMIN_EMAIL to the address of the first one and start again.',
    );
  const token = await makeInvitation(email);
  if (token)
    print(
      `\nThe first admin, ${email}, chooses a name and a password here (once, within seven days):\n${siteUrl('/invitation', { token })}\n`,
    );
}
