import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Mail } from '@/lib/server/mail/letter';
import { approvedMail } from '@/lib/server/mail/messages/approved';
import { changesRequestedMail } from '@/lib/server/mail/messages/changes-requested';
import { confirmMail } from '@/lib/server/mail/messages/confirm';
import { finishedMail } from '@/lib/server/mail/messages/finished';
import { invitationMail } from '@/lib/server/mail/messages/invitation';
import { knownAddressMail } from '@/lib/server/mail/messages/known-address';
import { onHoldMail } from '@/lib/server/mail/messages/on-hold';
import { proofReadyMail } from '@/lib/server/mail/messages/proof-ready';
import { resetMail } from '@/lib/server/mail/messages/reset';

const SITE = 'http://localhost:4380';
const token = 'a-token-of-more-than-twenty';
const order = { name: 'Mira', orderNumber: 'U-1042', title: 'Bakery sign' };

interface Expected {
  mail: Mail;
  subject: string;
  /** said in the plain part and in the HTML alike */
  says: string[];
  link: string;
}

/** Every mail of the shop, by its file. */
const MAILS: Record<string, Expected> = {
  confirm: {
    mail: confirmMail({ name: 'Mira', token }),
    subject: 'Confirm your address for Quillfold Engraving',
    says: ['Mira,', 'Confirm this address', 'seven days', 'If you did not register'],
    link: `${SITE}/confirm?token=${token}`,
  },
  'known-address': {
    mail: knownAddressMail({ name: 'Mira' }),
    subject: 'You already have an account at Quillfold Engraving',
    says: ['already has an account', 'Nothing was changed', 'told nothing'],
    link: `${SITE}/forgotten`,
  },
  invitation: {
    mail: invitationMail({ role: 'designer', invitedBy: 'Odile Marsh', token }),
    subject: 'Quillfold Engraving invites you to its workshop',
    says: ['Odile Marsh invites you to work with Quillfold Engraving as designer.', 'seven days'],
    link: `${SITE}/invitation?token=${token}`,
  },
  reset: {
    mail: resetMail({ name: 'Mira', token }),
    subject: 'Set a new password for Quillfold Engraving',
    says: ['one hour', 'signs you out everywhere else', 'If you did not ask'],
    link: `${SITE}/reset?token=${token}`,
  },
  'proof-ready': {
    mail: proofReadyMail({ ...order, words: 'Look at the rim, please.' }),
    subject: 'Proof ready: order U-1042',
    says: ['U-1042 Bakery sign', 'approve it or ask for changes', 'Look at the rim, please.'],
    link: `${SITE}/orders/U-1042`,
  },
  'changes-requested': {
    mail: changesRequestedMail({ ...order, customer: 'Ines Farrow', words: 'Bigger, please.' }),
    subject: 'Changes asked for: order U-1042',
    says: ['Ines Farrow asks for changes.', 'Bigger, please.', 'pass no longer holds'],
    link: `${SITE}/queue/U-1042`,
  },
  approved: {
    mail: approvedMail({
      ...order,
      approvedBy: 'Ines Farrow',
      how: 'at the counter',
      manifestSha256: '0123456789abcdef'.repeat(4),
    }),
    subject: 'Approved: order U-1042',
    says: ['Ines Farrow has approved the proof (at the counter)', '0123456789abcdef.'],
    link: `${SITE}/orders/U-1042`,
  },
  'on-hold': {
    mail: onHoldMail({ ...order, reason: 'The blank is cracked.' }),
    subject: 'On hold: order U-1042',
    says: ['waits for now', 'The blank is cracked.'],
    link: `${SITE}/orders/U-1042`,
  },
  finished: {
    mail: finishedMail({ ...order, quantity: 12 }),
    subject: 'Finished: order U-1042',
    says: ['Your 12 pieces are engraved', 'collected or sent'],
    link: `${SITE}/orders/U-1042`,
  },
};

it('no mail is without a test', () => {
  const files = readdirSync('src/lib/server/mail/messages').map((name) => name.replace('.ts', ''));
  expect(Object.keys(MAILS).sort()).toEqual(files.filter((name) => name !== 'about-order').sort());
});

describe.each(Object.entries(MAILS))('%s', (kind, { mail, subject, says, link }) => {
  it('says what it is for, in both parts', () => {
    expect(mail).toMatchObject({ kind, subject });
    for (const words of says) {
      expect(mail.text).toContain(words);
      expect(mail.html).toContain(words);
    }
  });

  it('has a plain part with the same link as the button', () => {
    expect(mail.text).toContain(`\n${link}\n`);
    expect(mail.html).toContain(`href="${link}"`);
    expect(mail.text).not.toMatch(/[<>]|&#/);
  });
});

describe('words that depend on the order', () => {
  it('name an order without a title by its number, and leave out what nobody wrote', () => {
    const { text } = proofReadyMail({ name: '', orderNumber: 'U-1042', title: '', words: '' });
    expect(text).toMatch(/^U-1042\nProof\n/);
    expect(text).not.toMatch(/\n{3}/);
  });

  it('speak of one piece as one', () => {
    expect(finishedMail({ ...order, quantity: 1 }).text).toContain('Your piece is engraved');
  });

  it('say how an approval was given only where that was written down', () => {
    expect(
      approvedMail({ ...order, approvedBy: 'Ines', how: '', manifestSha256: 'a'.repeat(64) }).text,
    ).toContain('Ines has approved the proof; it goes');
  });
});
