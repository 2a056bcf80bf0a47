import { createTransport } from 'nodemailer';
import { describe, expect, it } from 'vitest';
import { readMime } from '@/lib/server/mail/read-mime';

const transport = createTransport({ streamTransport: true, buffer: true });
async function written(mail: {
  subject: string;
  text?: string;
  html?: string;
  textEncoding?: 'base64' | 'quoted-printable';
}): Promise<Buffer> {
  const { message } = await transport.sendMail({
    messageId: '<1@shop.example>',
    from: 'shop@shop.example',
    to: 'mira@shop.example',
    ...mail,
  });
  return message as Buffer;
}

const LONG = 'https://shop.example/confirm?token=' + 'aB3=_-'.repeat(30);

describe('readMime', () => {
  it.each(['base64', 'quoted-printable'] as const)(
    'reads back what the sender wrote as %s',
    async (textEncoding) => {
      const mail = {
        subject: 'Proof “Törn” – ready, and a subject that is long enough to be folded over two lines',
        text: `Grüße = ${LONG}\n\nEnde\n`,
        html: `<p style="a=b">Größe ${LONG}</p>`,
      };
      expect(readMime(await written({ ...mail, textEncoding }))).toEqual({
        messageId: '<1@shop.example>',
        ...mail,
      });
    },
  );

  it('reads a mail of one part', async () => {
    expect(readMime(await written({ subject: 'Plain', text: 'Only text.\n' }))).toMatchObject({
      subject: 'Plain',
      text: 'Only text.\n',
      html: '',
    });
  });

  it('gives empty words for what is not there', () => {
    expect(readMime(Buffer.from(''))).toEqual({ messageId: '', subject: '', text: '', html: '' });
    expect(readMime(Buffer.from('Subject: only a head'))).toMatchObject({ subject: 'only a head', text: '' });
  });

  it('joins an encoded word that was cut within a letter', () => {
    expect(
      readMime(Buffer.from('Subject: =?UTF-8?Q?Gr=C3?=\r\n =?UTF-8?Q?=BC=C3=9Fe?=\r\n\r\n')).subject,
    ).toBe('Grüße');
  });
});
