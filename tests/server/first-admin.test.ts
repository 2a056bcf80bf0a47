import '../setup/database';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import * as settings from '@/lib/server/config';
import { database } from '@/lib/server/db';
import { personByEmail } from '@/lib/server/tables/people';
import { introduceFirstAdmin } from '@/lib/server/usecases/introduce-first-admin';
import { GET as outbox } from '@/pages/api/outbox';
import { POST as acceptInvitation } from '@/pages/api/account/invitation';
import { call, jsonOf } from '../setup/call';
import { addPerson } from '../setup/people';

const EMAIL = 'odile@quillfold.example';
const production = (adminEmail: string | null) => {
  const real = settings.config();
  vi.spyOn(settings, 'config').mockReturnValue({
    ...real,
    isProduction: true,
    isDemo: false,
    adminEmail,
    publicAddress: new URL('https://shop.example'),
  });
};
async function printed(): Promise<string> {
  const lines: string[] = [];
  await introduceFirstAdmin((line) => lines.push(line));
  return lines.join('\n');
}
const tokenIn = (lines: string): string =>
  /https:\/\/shop\.example\/invitation\?token=([\w-]+)/.exec(lines)?.[1] ?? '';

beforeEach(async () => {
  await database()('tokens').delete();
  await database()('people').update({ role: 'customer' });
});
afterEach(() => {
  vi.restoreAllMocks();
  vi.useRealTimers();
});

describe('introduceFirstAdmin', () => {
  it('prints nothing outside production', async () => {
    expect(await printed()).toBe('');
  });

  it('asks for the address of the first admin', async () => {
    production(null);
    await expect(printed()).rejects.toThrow('Set ADMIN_EMAIL');
  });

  it('prints a link once, that makes an admin once', async () => {
    production(EMAIL);
    const lines = await printed();
    expect(lines).toContain(EMAIL);
    expect(await printed()).toBe('');
    const body = { token: tokenIn(lines), name: 'Odile Marsh', password: 'keys-of-the-shop' };
    const headers = { origin: 'https://shop.example' };
    expect((await call(acceptInvitation, { body, headers })).status).toBe(200);
    expect(await personByEmail(database(), EMAIL)).toMatchObject({ role: 'admin', name: 'Odile Marsh' });
    expect((await call(acceptInvitation, { body, headers })).status).toBe(422);
    expect(await printed()).toBe('');
    expect((await database()('record').where({ event: 'invite' }).first()).words).toBe(
      `${EMAIL} as the first admin`,
    );
  });

  it('prints another when the first grew too old unused', async () => {
    production('late@quillfold.example');
    const first = tokenIn(await printed());
    vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 8 * 24 * 3_600_000 });
    const second = tokenIn(await printed());
    expect(second).not.toBe('');
    expect(second).not.toBe(first);
  });

  it('prints nothing while there is an admin', async () => {
    await addPerson('admin');
    production(EMAIL);
    expect(await printed()).toBe('');
  });

  it('makes nobody an admin who is known as something else', async () => {
    const customer = await addPerson('customer');
    production(customer.email);
    await expect(printed()).rejects.toThrow('belongs to somebody who is no admin');
  });
});

describe('the outbox', () => {
  it('does not exist in production', async () => {
    expect(await jsonOf(await call(outbox))).toEqual({ mails: [] });
    production(EMAIL);
    expect((await call(outbox)).status).toBe(404);
  });
});
