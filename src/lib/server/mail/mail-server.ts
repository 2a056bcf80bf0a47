import { createTransport, type Transporter } from 'nodemailer';
import { config } from '../config';
import type { MailRow } from '../tables/mails';
import { startFakeMailServer } from './fake-mail-server';

const slot = globalThis as typeof globalThis & { umberlineMailServer?: Promise<Transporter> };

async function connect(): Promise<Transporter> {
  const { smtpUrl } = config();
  if (smtpUrl) return createTransport(smtpUrl);
  const { port } = await startFakeMailServer();
  return createTransport({ host: '127.0.0.1', port, secure: false, ignoreTLS: true });
}

/** Hands a mail to the shop's mail server, or to the in-process one where none is set. */
export async function sendByMailServer(
  mail: Pick<MailRow, 'message_id' | 'recipient' | 'subject' | 'text' | 'html'>,
): Promise<void> {
  const transport = await (slot.umberlineMailServer ??= connect());
  await transport.sendMail({
    messageId: mail.message_id,
    from: { name: config().shopName, address: config().mailFrom },
    to: mail.recipient,
    subject: mail.subject,
    text: mail.text,
    html: mail.html,
  });
}
