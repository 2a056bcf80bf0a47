import '../../setup/database';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { database, withWrite } from '@/lib/server/db';
import { deliverDue, deliveryIdle } from '@/lib/server/mail/deliver';
import { confirmMail } from '@/lib/server/mail/messages/confirm';
import * as mailServer from '@/lib/server/mail/mail-server';
import { queueMail } from '@/lib/server/mail/queue-mail';
import type { MailRow } from '@/lib/server/tables/mails';
import { readOutbox } from '@/lib/server/tables/outbox';

const TOKEN = 'a-token-of-more-than-twenty-characters';
const mail = () => confirmMail({ name: 'Mira Öst', token: TOKEN });
const mails = () => database()<MailRow>('mails').orderBy('id');

beforeEach(async () => {
  await deliveryIdle();
  vi.restoreAllMocks();
  await database()('mails').delete();
  await database()('outbox').delete();
});

describe('queueMail', () => {
  it('sends once the transaction is kept, and empties the row of its secret link', async () => {
    await withWrite((trx) => queueMail(trx, 'mira@shop.example', mail()));
    await deliveryIdle();
    const [received, ...others] = await readOutbox(database());
    expect(others).toEqual([]);
    expect(received).toMatchObject({
      recipient: 'mira@shop.example',
      subject: mail().subject,
      text: mail().text,
      html: mail().html,
    });
    const [row] = await mails();
    expect(row).toMatchObject({ text: '', html: '', attempts: 1, problem: '', failed_at: null });
    expect(row.sent_at).not.toBeNull();
  });

  it('sends nothing when the transaction is rolled back', async () => {
    await expect(
      withWrite(async (trx) => {
        await queueMail(trx, 'mira@shop.example', mail());
        throw new Error('the use case failed');
      }),
    ).rejects.toThrow('the use case failed');
    await deliveryIdle();
    expect(await mails()).toEqual([]);
    expect(await readOutbox(database())).toEqual([]);
  });
});

describe('deliverDue', () => {
  it('keeps a mail that the server refused, with the reason, and tries again later', async () => {
    vi.spyOn(mailServer, 'sendByMailServer').mockRejectedValueOnce(new Error('no such host'));
    await withWrite((trx) => queueMail(trx, 'mira@shop.example', mail()));
    await deliveryIdle();
    const [refused] = await mails();
    expect(refused).toMatchObject({ attempts: 1, problem: 'no such host', sent_at: null, failed_at: null });
    expect(Date.parse(refused.due_at)).toBeGreaterThan(Date.now() + 20_000);
    await deliverDue();
    expect(await readOutbox(database())).toHaveLength(0);
    await database()('mails').update({ due_at: new Date().toISOString() });
    await deliverDue();
    expect(await readOutbox(database())).toHaveLength(1);
    expect((await mails())[0].attempts).toBe(2);
  });

  it('gives a mail up after nine attempts', async () => {
    vi.spyOn(mailServer, 'sendByMailServer').mockRejectedValue(new Error('refused'));
    await withWrite((trx) => queueMail(trx, 'mira@shop.example', mail()));
    await deliveryIdle();
    for (let attempt = 2; attempt <= 10; attempt += 1) {
      await database()('mails').update({ due_at: new Date().toISOString() });
      await deliverDue();
    }
    const [row] = await mails();
    expect(row.attempts).toBe(9);
    expect(row.failed_at).not.toBeNull();
  });

  it('takes up a mail that a process left behind when it died between taking and sending', async () => {
    await withWrite((trx) => queueMail(trx, 'mira@shop.example', mail()));
    await deliveryIdle();
    await database()('outbox').delete();
    const past = new Date(Date.now() - 1000).toISOString();
    await database()('mails').update({
      sent_at: null,
      attempts: 1,
      due_at: past,
      text: 'Text',
      html: '<p>Text</p>',
    });
    await deliverDue();
    expect(await readOutbox(database())).toHaveLength(1);
  });

  it('is received once although it was sent twice', async () => {
    await withWrite((trx) => queueMail(trx, 'mira@shop.example', mail()));
    await deliveryIdle();
    const past = new Date(Date.now() - 1000).toISOString();
    await database()('mails').update({ sent_at: null, due_at: past, text: 'Again', html: '<p>Again</p>' });
    await deliverDue();
    expect(await readOutbox(database())).toHaveLength(1);
  });

  it('sends each of many once while several deliveries run', async () => {
    const sent: string[] = [];
    vi.spyOn(mailServer, 'sendByMailServer').mockImplementation(async ({ message_id }) => {
      sent.push(message_id);
    });
    await Promise.all(
      Array.from({ length: 20 }, (_, index) =>
        withWrite((trx) => queueMail(trx, `person${index}@shop.example`, mail())),
      ),
    );
    await Promise.all([deliverDue(), deliverDue(), deliverDue()]);
    await deliveryIdle();
    expect(sent).toHaveLength(20);
    expect(new Set(sent).size).toBe(20);
  });
});
