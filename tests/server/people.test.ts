import '../setup/database';
import { beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/lib/server/db';
import { forgetAttempts } from '@/lib/server/limits';
import type { Person } from '@/lib/server/person';
import { personByEmail, personById } from '@/lib/server/tables/people';
import { recordOf } from '@/lib/server/tables/record';
import { POST as acceptInvitation } from '@/pages/api/account/invitation';
import { GET as listPeople } from '@/pages/api/people';
import { PATCH as changePerson } from '@/pages/api/people/[id]';
import { POST as invite } from '@/pages/api/people/invitations';
import { POST as enterWalkIn } from '@/pages/api/people/walk-ins';
import { call, jsonOf } from '../setup/call';
import { mailedToken, mailsTo } from '../setup/outbox';
import { addPerson } from '../setup/people';

let odile: Person;
beforeEach(async () => {
  forgetAttempts();
  await database()('tokens').delete();
  await database()('sessions').delete();
  await database()('people').update({ role: 'customer' });
  odile = await addPerson('admin', { name: 'Odile Marsh' });
});

const change = (person: Person, id: number, body: object) =>
  call(changePerson, { method: 'PATCH', body, params: { id: String(id) }, person });
const standing = async (id: number) => {
  const row = await personById(database(), id);
  return [row?.role, row?.disabled_at === null ? 'enabled' : 'disabled'];
};

describe('the last admin', () => {
  it.each([
    ['demoted', { role: 'designer' }],
    ['disabled', { disabled: true }],
    ['both', { role: 'customer', disabled: true }],
  ])('cannot be %s', async (_, body) => {
    expect(await jsonOf(await change(odile, odile.id, body), 409)).toMatchObject({ code: 'last-admin' });
    expect(await standing(odile.id)).toEqual(['admin', 'enabled']);
    expect((await recordOf(database(), `person ${odile.id}`)).length).toBe(0);
  });

  it('may go when there is another who can sign in', async () => {
    const second = await addPerson('admin');
    expect((await change(odile, odile.id, { role: 'operator' })).status).toBe(200);
    expect((await change(second, second.id, { role: 'operator' })).status).toBe(409);
  });

  it.each([
    ['is disabled', { disabled_at: '2026-01-01T00:00:00Z' }],
    ['has not accepted the invitation', { password_hash: null }],
  ])('is the last although another one %s', async (_, state) => {
    const second = await addPerson('admin');
    await database()('people').where({ id: second.id }).update(state);
    expect((await change(odile, odile.id, { role: 'operator' })).status).toBe(409);
    expect((await change(odile, second.id, { role: 'operator' })).status).toBe(200);
  });

  it('is left when two admins demote each other at once', async () => {
    const second = await addPerson('admin');
    const both = await Promise.all([
      change(odile, second.id, { role: 'designer' }),
      change(second, odile.id, { role: 'designer' }),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('may be changed in ways that leave them admin', async () => {
    expect((await change(odile, odile.id, { role: 'admin', disabled: false })).status).toBe(200);
  });
});

describe('changing a person', () => {
  it('gives the new standing, and writes it down', async () => {
    const runa = await addPerson('operator', { name: 'Runa' });
    const { person } = await jsonOf(await change(odile, runa.id, { role: 'designer', disabled: true }));
    expect(person).toMatchObject({ id: runa.id, role: 'designer', disabled: true });
    const [entry] = await recordOf(database(), `person ${runa.id}`);
    expect(entry).toMatchObject({
      by: 'Odile Marsh',
      person_id: odile.id,
      event: 'change-person',
      words: 'Runa: now designer, disabled',
    });
  });

  it('answers 404 where there is nobody', async () => {
    expect((await change(odile, 99_999, { disabled: true })).status).toBe(404);
  });
});

describe('inviting', () => {
  const send = (body: object) => call(invite, { body, person: odile });
  const accept = (token: string, name = 'Runa Vester') =>
    call(acceptInvitation, { body: { token, name, password: 'line-after-line' } });

  it('mails a link by which name and password are chosen, once', async () => {
    const email = 'runa@quillfold.example';
    expect((await send({ email, role: 'operator' })).status).toBe(200);
    const token = await mailedToken(email);
    expect((await mailsTo(email))[0].text).toContain(
      'Odile Marsh invites you to work with Quillfold Engraving as operator.',
    );
    expect((await accept(token)).status).toBe(200);
    expect(await personByEmail(database(), email)).toMatchObject({ name: 'Runa Vester', role: 'operator' });
    expect((await personByEmail(database(), email))?.confirmed_at).not.toBeNull();
    expect((await accept(token, 'Somebody else')).status).toBe(422);
  });

  it('again changes role and link; the first link stops working', async () => {
    const email = 'teo@quillfold.example';
    await send({ email, role: 'operator' });
    const first = await mailedToken(email);
    await send({ email, role: 'designer' });
    expect((await accept(first)).status).toBe(422);
    expect((await accept(await mailedToken(email))).status).toBe(200);
    expect((await personByEmail(database(), email))?.role).toBe('designer');
    expect((await send({ email, role: 'admin' })).status).toBe(409);
  });

  it('is not for customers, nor for an address that is known', async () => {
    const known = await addPerson('customer');
    expect(await jsonOf(await send({ email: 'new@shop.example', role: 'customer' }), 422)).toMatchObject({
      code: 'customers-register',
    });
    expect(await jsonOf(await send({ email: known.email, role: 'designer' }), 409)).toMatchObject({
      code: 'address-known',
    });
    expect((await personByEmail(database(), known.email))?.role).toBe('customer');
  });

  it('comes to nothing when the invited person was disabled meanwhile', async () => {
    const email = 'late@quillfold.example';
    await send({ email, role: 'designer' });
    const token = await mailedToken(email);
    const id = (await personByEmail(database(), email))?.id ?? 0;
    await change(odile, id, { disabled: true });
    expect((await accept(token)).status).toBe(422);
    expect((await personById(database(), id))?.password_hash).toBeNull();
  });
});

describe('a walk-in customer', () => {
  const enter = (body: object, person: Person = odile) => call(enterWalkIn, { body, person });

  it('is entered once, without a password', async () => {
    const body = { name: 'Ferdinand Loy', email: 'loy@counter.example' };
    const first = await jsonOf<{ person: { id: number } }>(await enter(body));
    const second = await jsonOf<{ person: { id: number } }>(
      await enter({ name: 'F. Loy', email: 'LOY@counter.example' }),
    );
    expect(second).toEqual(first);
    expect(await personById(database(), first.person.id)).toMatchObject({
      name: 'Ferdinand Loy',
      role: 'customer',
      password_hash: null,
      confirmed_at: null,
    });
    expect(await mailsTo(body.email)).toEqual([]);
  });

  it('is never somebody of the shop', async () => {
    expect((await enter({ name: 'Odile', email: odile.email })).status).toBe(409);
  });
});

describe('the list', () => {
  const search = async (query: string) =>
    (
      await jsonOf<{ people: { name: string }[] }>(
        await call(listPeople, { path: `/api/people?${query}`, person: odile }),
      )
    ).people.map(({ name }) => name);

  it('finds by name, address and role, and takes signs for what they are', async () => {
    await addPerson('customer', { name: 'Ärmel 100 % Wolle', email: 'wolle@list.example' });
    await addPerson('customer', { name: 'Berta', email: 'berta@list.example' });
    expect(await search('q=list.example')).toEqual(['Berta', 'Ärmel 100 % Wolle']);
    expect(await search('q=100+%25')).toEqual(['Ärmel 100 % Wolle']);
    expect(await search('q=%25erta')).toEqual([]);
    expect(await search('role=admin')).toEqual(['Odile Marsh']);
    expect(await search('q=nobody')).toEqual([]);
  });

  it('never holds a hash', async () => {
    expect(await (await call(listPeople, { path: '/api/people', person: odile })).text()).not.toMatch(
      /scrypt|hash/,
    );
  });
});
