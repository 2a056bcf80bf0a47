import { database } from '@/lib/server/db';
import { deliveryIdle } from '@/lib/server/mail/deliver';
import { readOutbox, type OutboxRow } from '@/lib/server/tables/outbox';

/** Mails that an address was sent so far, newest first. */
export async function mailsTo(address: string): Promise<OutboxRow[]> {
  await deliveryIdle();
  return (await readOutbox(database())).filter(
    ({ recipient }) => recipient.toLowerCase() === address.toLowerCase(),
  );
}

/** The token in the link of the newest mail to an address. */
export async function mailedToken(address: string): Promise<string> {
  const [newest] = await mailsTo(address);
  const token = /[?&]token=([\w-]+)/.exec(newest?.text ?? '')?.[1];
  if (!token) throw new Error(`expected a mail with a link to ${address}, got ${newest?.subject ?? 'none'}`);
  return token;
}
