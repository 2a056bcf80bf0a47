import type { AddressInfo } from 'node:net';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import { config } from '../config';
import { withWrite } from '../db';
import { keepInOutbox } from '../tables/outbox';
import { readMime } from './read-mime';

/** Mails that the outbox page can show. */
export const OUTBOX_LENGTH = 200;

async function receive(stream: SMTPServerDataStream, session: SMTPServerSession): Promise<void> {
  const parts: Buffer[] = [];
  for await (const part of stream) parts.push(part as Buffer);
  const { messageId, subject, text, html } = readMime(Buffer.concat(parts));
  const { mailFrom, rcptTo } = session.envelope;
  const row = {
    message_id: messageId,
    received_at: new Date().toISOString(),
    sender: mailFrom ? mailFrom.address : '',
    recipient: rcptTo.map(({ address }) => address).join(', '),
    subject,
    text,
    html,
  };
  await withWrite((trx) => keepInOutbox(trx, row, OUTBOX_LENGTH));
}

/** A real SMTP server within the process, on this machine only, that keeps mails instead of passing them on. */
export async function startFakeMailServer(): Promise<{ port: number; close(): Promise<void> }> {
  if (!config().isDemo) throw new Error('expected a mail server in production, got none: set SMTP_URL');
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    onData(stream, session, done) {
      receive(stream, session).then(() => done(), done);
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  server.server.unref();
  return {
    port: (server.server.address() as AddressInfo).port,
    close: () => new Promise((resolve) => server.close(resolve)),
  };
}
