import '../setup/database';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import * as passwords from '@/lib/server/auth/password';
import { database } from '@/lib/server/db';
import { forgetAttempts } from '@/lib/server/limits';
import type { Person } from '@/lib/server/person';
import { personByEmail, type PersonRow } from '@/lib/server/tables/people';
import { recordOf } from '@/lib/server/tables/record';
import { findSessionPerson } from '@/lib/server/usecases/find-session-person';
import { signIn } from '@/lib/server/usecases/sign-in';
import { GET as readAccount, PATCH as changeAccount } from '@/pages/api/account';
import { POST as confirm } from '@/pages/api/account/confirm';
import { POST as confirmation } from '@/pages/api/account/confirmation';
import { POST as forgotten } from '@/pages/api/account/forgotten';
import { POST as register } from '@/pages/api/account/register';
import { POST as reset } from '@/pages/api/account/reset';
import { POST as signOutEverywhere } from '@/pages/api/account/sign-out-everywhere';
import { call, jsonOf } from '../setup/call';
import { mailedToken, mailsTo } from '../setup/outbox';
import { addPerson } from '../setup/people';

const HOUR_MS = 3_600_000;
let made = 0;
const freshEmail = (): string => `mira${(made += 1)}@shop.example`;
const fields = (email: string) => ({ name: 'Mira Oster', email, password: 'rye-and-ember' });
const row = async (email: string): Promise<PersonRow> => {
  const found = await personByEmail(database(), email);
  if (!found) throw new Error(`expected ${email} to be known`);
  return found;
};
async function later<T>(ms: number, work: () => Promise<T>): Promise<T> {
  vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + ms });
  try {
    return await work();
  } finally {
    vi.useRealTimers();
  }
}

beforeEach(forgetAttempts);

describe('registering', () => {
  it('enters a customer whose address is not confirmed yet, and mails the link', async () => {
    const email = freshEmail();
    expect(await jsonOf(await call(register, { body: fields(email) }))).toEqual({ ok: true });
    const person = await row(email);
    expect(person).toMatchObject({
      name: 'Mira Oster',
      role: 'customer',
      confirmed_at: null,
      disabled_at: null,
    });
    expect(await passwords.passwordMatches('rye-and-ember', person.password_hash ?? '')).toBe(true);
    expect((await mailsTo(email)).map(({ subject }) => subject)).toEqual([
      'Confirm your address for Quillfold Engraving',
    ]);
    expect((await recordOf(database(), `person ${person.id}`)).map(({ event }) => event)).toEqual([
      'register',
    ]);
  });

  it('keeps no token that could be read out of the database', async () => {
    const email = freshEmail();
    await call(register, { body: fields(email) });
    const token = await mailedToken(email);
    for (const table of ['tokens', 'mails', 'people', 'record'])
      expect(JSON.stringify(await database()(table))).not.toContain(token);
  });

  it('reveals nothing about a known address: same answer, nothing changed, its owner told', async () => {
    const email = freshEmail();
    const first = await call(register, { body: fields(email) });
    const before = await row(email);
    const second = await call(register, {
      body: { name: 'Nosy Neighbour', email: email.toUpperCase(), password: 'another-password' },
    });
    expect([second.status, await second.text()]).toEqual([first.status, await first.text()]);
    expect(await row(email)).toEqual(before);
    const mails = await mailsTo(email);
    expect(mails.map(({ subject }) => subject)).toEqual([
      'You already have an account at Quillfold Engraving',
      'Confirm your address for Quillfold Engraving',
    ]);
    expect(mails[0].text).not.toContain('Nosy');
    expect(mails[0].text).not.toContain('token=');
  });

  it('does the slow work for a known address as for a new one', async () => {
    const email = freshEmail();
    const slow = vi.spyOn(passwords, 'hashPassword');
    for (const times of [1, 2]) {
      await call(register, { body: fields(email) });
      expect(slow).toHaveBeenCalledTimes(times);
    }
    slow.mockRestore();
  });

  it.each([
    ['name', { name: '  ' }],
    ['email', { email: 'mira' }],
    ['password', { password: 'short' }],
  ])('says what is wrong with the %s', async (field, change) => {
    const problem = await jsonOf(await call(register, { body: { ...fields(freshEmail()), ...change } }), 422);
    expect(Object.keys(problem.fields as object)).toEqual([field]);
  });

  it('takes nobody’s word for a role', async () => {
    const email = freshEmail();
    await call(register, { body: { ...fields(email), role: 'admin' } });
    expect((await row(email)).role).toBe('customer');
  });
});

describe('confirming', () => {
  let email: string;
  beforeEach(async () => {
    email = freshEmail();
    await call(register, { body: fields(email) });
  });

  it('works once', async () => {
    const token = await mailedToken(email);
    expect((await call(confirm, { body: { token } })).status).toBe(200);
    expect((await row(email)).confirmed_at).not.toBeNull();
    expect(await jsonOf(await call(confirm, { body: { token } }), 422)).toMatchObject({ code: 'link-spent' });
  });

  it('works for seven days', async () => {
    const token = await mailedToken(email);
    expect((await later(7 * 24 * HOUR_MS + 1000, () => call(confirm, { body: { token } }))).status).toBe(422);
    expect((await later(7 * 24 * HOUR_MS - 60_000, () => call(confirm, { body: { token } }))).status).toBe(
      200,
    );
  });

  it('is asked for again with a new link, and the old one stops working', async () => {
    const { id, name, role } = await row(email);
    const person: Person = { id, name, email, role, confirmed: false };
    const old = await mailedToken(email);
    await call(confirmation, { body: {}, person });
    const token = await mailedToken(email);
    expect(token).not.toBe(old);
    expect((await call(confirm, { body: { token: old } })).status).toBe(422);
    expect((await call(confirm, { body: { token } })).status).toBe(200);
    await call(confirmation, { body: {}, person });
    expect(await mailsTo(email)).toHaveLength(2);
  });

  it('takes no token of another kind', async () => {
    await call(forgotten, { body: { email } });
    const token = await mailedToken(email);
    expect((await call(confirm, { body: { token } })).status).toBe(422);
    expect((await call(reset, { body: { token, password: 'a-new-password' } })).status).toBe(200);
  });
});

describe('a forgotten password', () => {
  it('answers alike for known, unknown and disabled addresses, and writes to the known alone', async () => {
    const known = await addPerson('customer');
    const disabled = await addPerson('customer');
    await database()('people').where({ id: disabled.id }).update({ disabled_at: new Date().toISOString() });
    const answers = await Promise.all(
      [known.email, disabled.email, freshEmail()].map(async (email) =>
        (await call(forgotten, { body: { email } })).text(),
      ),
    );
    expect(new Set(answers)).toEqual(new Set(['{"ok":true}']));
    expect(await mailsTo(known.email)).toHaveLength(1);
    expect(await mailsTo(disabled.email)).toHaveLength(0);
  });

  it('is set anew once, within an hour, confirms the address and ends every session', async () => {
    const person = await addPerson('customer', { confirmed: false });
    await database()('sessions').insert({
      id: 's-of-reset',
      person_id: person.id,
      token_version: 1,
      created_at: '2026-01-01T00:00:00Z',
      expires_at: '2099-01-01T00:00:00Z',
    });
    await call(forgotten, { body: { email: person.email } });
    const token = await mailedToken(person.email);
    expect(
      (await later(HOUR_MS + 1000, () => call(reset, { body: { token, password: 'a-new-password' } })))
        .status,
    ).toBe(422);
    expect((await call(reset, { body: { token, password: 'short' } })).status).toBe(422);
    expect((await call(reset, { body: { token, password: 'a-new-password' } })).status).toBe(200);
    expect((await call(reset, { body: { token, password: 'one-more-password' } })).status).toBe(422);
    const after = await row(person.email);
    expect(await passwords.passwordMatches('a-new-password', after.password_hash ?? '')).toBe(true);
    expect(after).toMatchObject({ token_version: 2 });
    expect(after.confirmed_at).not.toBeNull();
    expect(await database()('sessions').where({ person_id: person.id })).toEqual([]);
  });

  it('is used up by one of two who are equally quick', async () => {
    const person = await addPerson('customer');
    await call(forgotten, { body: { email: person.email } });
    const token = await mailedToken(person.email);
    const both = await Promise.all(
      ['first-password', 'second-password'].map((password) => call(reset, { body: { token, password } })),
    );
    expect(both.map(({ status }) => status).sort()).toEqual([200, 422]);
  });

  it('gives a walk-in customer a first password, and an invited person none', async () => {
    const walkIn = await addPerson('customer', { confirmed: false });
    const invited = await addPerson('operator', { confirmed: false });
    await database()('people').whereIn('id', [walkIn.id, invited.id]).update({ password_hash: null });
    for (const { email } of [walkIn, invited]) await call(forgotten, { body: { email } });
    expect(await mailsTo(walkIn.email)).toHaveLength(1);
    expect(await mailsTo(invited.email)).toHaveLength(0);
  });
});

describe('the own account', () => {
  it('is null for a stranger and the person for whoever is signed in', async () => {
    expect(await jsonOf(await call(readAccount))).toEqual({ person: null });
    const person = await addPerson('designer');
    expect(await jsonOf(await call(readAccount, { person }))).toEqual({
      person: { ...person, disabled: false },
    });
  });

  it('changes its name, with a line in the record', async () => {
    const person = await addPerson('customer', { name: 'Mira' });
    await jsonOf(await call(changeAccount, { method: 'PATCH', body: { name: 'Mira Oster' }, person }));
    expect((await row(person.email)).name).toBe('Mira Oster');
    expect((await recordOf(database(), `person ${person.id}`)).map(({ words }) => words)).toEqual([
      'Mira is now Mira Oster',
    ]);
  });

  it('changes its password only with the present one, and ends every session but this one', async () => {
    const person = await addPerson('customer', { password: 'rye-and-ember' });
    const [here, elsewhere] = [
      await signIn(person.email, 'rye-and-ember', '192.0.2.1'),
      await signIn(person.email, 'rye-and-ember', '192.0.2.9'),
    ];
    if (!here || !elsewhere) throw new Error('expected two sessions');
    const change = (body: object) =>
      call(changeAccount, { method: 'PATCH', body, person, sessionId: here.sessionId });
    for (const currentPassword of [undefined, '', 'wrong-password']) {
      expect(
        await jsonOf(await change({ currentPassword, newPassword: 'a-new-password' }), 422),
      ).toMatchObject({ code: 'wrong-password' });
    }
    expect((await change({ currentPassword: 'rye-and-ember', newPassword: 'a-new-password' })).status).toBe(
      200,
    );
    const after = await row(person.email);
    expect(after.token_version).toBe(2);
    expect([await findSessionPerson(here), await findSessionPerson(elsewhere)]).toEqual([person, null]);
    expect(await passwords.passwordMatches('a-new-password', after.password_hash ?? '')).toBe(true);
  });

  it('can be signed out everywhere', async () => {
    const person = await addPerson('customer');
    expect((await call(signOutEverywhere, { body: {}, person })).status).toBe(200);
    expect((await row(person.email)).token_version).toBe(2);
  });
});
