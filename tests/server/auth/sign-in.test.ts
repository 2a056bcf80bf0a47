import '../../setup/database';
import { Auth } from '@auth/core';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { authConfig } from '@/lib/server/auth/auth-config';
import { needsNewHash } from '@/lib/server/auth/password';
import { database } from '@/lib/server/db';
import { markSocketAddress } from '@/lib/server/http/socket-address';
import { ALLOWANCES, forgetAttempts } from '@/lib/server/limits';
import type { Person } from '@/lib/server/person';
import { personById, raiseTokenVersion } from '@/lib/server/tables/people';
import { changePerson } from '@/lib/server/usecases/change-person';
import { findSessionPerson } from '@/lib/server/usecases/find-session-person';
import { SESSION_SECONDS, signIn, type Opened } from '@/lib/server/usecases/sign-in';
import { signOutEverywhere } from '@/lib/server/usecases/sign-out';
import { addPerson } from '../../setup/people';

const SECRET = 'a secret of this test, longer than 32 letters';
const BASE = 'http://localhost:4380';

/** A browser as far as Auth.js can tell: it keeps cookies and fills in the form of the sign-in page. */
class Visitor {
  readonly cookies = new Map<string, string>();
  constructor(readonly address = '192.0.2.1') {}

  async send(path: string, form?: Record<string, string>): Promise<Response> {
    const headers = new Headers({
      cookie: [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; '),
    });
    if (form) headers.set('content-type', 'application/x-www-form-urlencoded');
    headers.set('x-auth-return-redirect', '1');
    markSocketAddress(headers, this.address);
    const request = new Request(`${BASE}/api/auth/${path}`, {
      method: form ? 'POST' : 'GET',
      headers,
      body: form && new URLSearchParams(form),
    });
    const response = await Auth(request, authConfig(SECRET));
    for (const cookie of response.headers.getSetCookie()) {
      const [pair] = cookie.split(';');
      const at = pair.indexOf('=');
      if (pair.slice(at + 1) === '') this.cookies.delete(pair.slice(0, at));
      else this.cookies.set(pair.slice(0, at), pair.slice(at + 1));
    }
    return response;
  }

  async submit(path: string, fields: Record<string, string> = {}): Promise<string> {
    const { csrfToken } = await (await this.send('csrf')).json();
    return (await (await this.send(path, { ...fields, csrfToken, callbackUrl: `${BASE}/orders` })).json())
      .url;
  }

  signIn = (email: string, password: string) => this.submit('callback/credentials', { email, password });

  async person(): Promise<Person | null> {
    const session = (await (await this.send('session')).json()) as { opened?: Opened } | null;
    return session?.opened ? findSessionPerson(session.opened) : null;
  }
}

let mira: Person;
let visitor: Visitor;
beforeEach(async () => {
  forgetAttempts();
  mira = await addPerson('customer', { password: 'rye-and-ember' });
  visitor = new Visitor();
});

describe('signing in', () => {
  it('opens a session for the right password, whatever capitals the address has', async () => {
    expect(await visitor.signIn(mira.email.toUpperCase(), 'rye-and-ember')).toBe(`${BASE}/orders`);
    expect(await visitor.person()).toEqual(mira);
  });

  it('answers alike to a wrong password, an unknown address, a disabled account and one without a password', async () => {
    const disabled = await addPerson('customer', { password: 'rye-and-ember' });
    await database()('people').where({ id: disabled.id }).update({ disabled_at: new Date().toISOString() });
    const walkIn = await addPerson('customer');
    await database()('people').where({ id: walkIn.id }).update({ password_hash: null });
    const answers = [
      await visitor.signIn(mira.email, 'wrong-password'),
      await visitor.signIn('nobody@shop.example', 'rye-and-ember'),
      await visitor.signIn(disabled.email, 'rye-and-ember'),
      await visitor.signIn(walkIn.email, ''),
      await visitor.signIn('no address', 'rye-and-ember'),
    ];
    expect(new Set(answers)).toEqual(new Set([`${BASE}/sign-in?error=CredentialsSignin&code=credentials`]));
    expect(await visitor.person()).toBeNull();
  });

  it('sends nobody to another site', async () => {
    const { csrfToken } = await (await visitor.send('csrf')).json();
    const form = {
      csrfToken,
      email: mira.email,
      password: 'rye-and-ember',
      callbackUrl: 'https://elsewhere.example/',
    };
    expect((await (await visitor.send('callback/credentials', form)).json()).url).toBe(BASE);
  });

  it('needs the token of its own form', async () => {
    const response = await visitor.send('callback/credentials', {
      email: mira.email,
      password: 'rye-and-ember',
    });
    expect((await response.json()).url).toContain('error=MissingCSRF');
    expect(await visitor.person()).toBeNull();
  });

  it('says so when an account was tried too often, even with the right password', async () => {
    for (let index = 0; index < ALLOWANCES['sign-in'].perAccount; index += 1) {
      await new Visitor(`192.0.2.${index}`).signIn(mira.email, 'wrong-password');
    }
    expect(await visitor.signIn(mira.email, 'rye-and-ember')).toBe(
      `${BASE}/sign-in?error=CredentialsSignin&code=too-many`,
    );
  });

  it('stores the password at today’s cost when it was kept at another', async () => {
    expect(needsNewHash((await personById(database(), mira.id))?.password_hash ?? '')).toBe(true);
    await visitor.signIn(mira.email, 'rye-and-ember');
    expect(needsNewHash((await personById(database(), mira.id))?.password_hash ?? '')).toBe(false);
    expect(await visitor.person()).toEqual(mira);
  });

  it('puts nothing into the cookie but who and which session', async () => {
    await visitor.signIn(mira.email, 'rye-and-ember');
    const session = await (await visitor.send('session')).json();
    expect(Object.keys(session).sort()).toEqual(['expires', 'opened']);
    expect(Object.keys(session.opened).sort()).toEqual(['personId', 'sessionId']);
  });
});

describe('a session', () => {
  beforeEach(() => visitor.signIn(mira.email, 'rye-and-ember'));
  const copy = (): Visitor => {
    const other = new Visitor();
    for (const [name, value] of visitor.cookies) other.cookies.set(name, value);
    return other;
  };

  it('has the role that the database has at this moment', async () => {
    await database()('people').where({ id: mira.id }).update({ role: 'operator' });
    expect((await visitor.person())?.role).toBe('operator');
  });

  it('ends with signing out, for a copy of the cookie too, and no other session with it', async () => {
    const elsewhere = new Visitor();
    await elsewhere.signIn(mira.email, 'rye-and-ember');
    const thief = copy();
    await visitor.submit('signout');
    expect(await visitor.person()).toBeNull();
    expect(await thief.person()).toBeNull();
    expect(await elsewhere.person()).toEqual(mira);
  });

  it('ends everywhere when its owner says so', async () => {
    const elsewhere = new Visitor();
    await elsewhere.signIn(mira.email, 'rye-and-ember');
    await signOutEverywhere(mira);
    expect([await visitor.person(), await elsewhere.person()]).toEqual([null, null]);
    await visitor.signIn(mira.email, 'rye-and-ember');
    expect(await visitor.person()).toEqual(mira);
  });

  it('ends when the account is disabled, and does not come back with it', async () => {
    const admin = await addPerson('admin');
    await changePerson(admin, mira.id, { disabled: true });
    expect(await visitor.person()).toBeNull();
    await changePerson(admin, mira.id, { disabled: false });
    expect(await visitor.person()).toBeNull();
  });

  it('ends when the token version grows', async () => {
    await raiseTokenVersion(database(), mira.id);
    expect(await visitor.person()).toBeNull();
  });

  it('ends by itself in the database', async () => {
    vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + SESSION_SECONDS * 1000 + 1000 });
    try {
      const [row] = await database()('sessions').where({ person_id: mira.id });
      expect(await findSessionPerson({ personId: mira.id, sessionId: row.id })).toBeNull();
      await signIn(mira.email, 'rye-and-ember', '192.0.2.1');
      expect(await database()('sessions').where({ id: row.id })).toEqual([]);
    } finally {
      vi.useRealTimers();
    }
  });

  it('is none when the cookie was sealed under another secret, or is no cookie of ours', async () => {
    for (const value of ['', 'nonsense', 'eyJhbGciOiJkaXIifQ..a.b.c']) {
      const other = new Visitor();
      other.cookies.set('authjs.session-token', value);
      expect(await other.person()).toBeNull();
    }
  });

  it('of one person does not speak for another', async () => {
    const other = await addPerson('admin');
    const [row] = await database()('sessions').where({ person_id: mira.id });
    expect(await findSessionPerson({ personId: other.id, sessionId: row.id })).toBeNull();
    expect(await findSessionPerson({ personId: mira.id, sessionId: 'no-such-session' })).toBeNull();
  });
});
