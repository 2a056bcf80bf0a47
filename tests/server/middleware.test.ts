import '../setup/database';
import type { APIContext } from 'astro';
import { getSession } from 'auth-astro/server';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { signIn } from '@/lib/server/usecases/sign-in';
import { signOut } from '@/lib/server/usecases/sign-out';
import { onRequest } from '@/middleware';
import { addPerson } from '../setup/people';

// What a cookie says is Auth.js's to read; its own tests sign in through it.
vi.mock('auth-astro/server', () => ({ getSession: vi.fn() }));
vi.mock('@/start-up', () => ({ startUp: () => Promise.resolve() }));

const ask = async (
  headers: Record<string, string> = {},
): Promise<{ locals: App.Locals; response: Response }> => {
  const locals = {} as App.Locals;
  const context = {
    request: new Request('http://localhost:4380/', { headers }),
    locals,
  } as unknown as APIContext;
  const next = () => Promise.resolve(new Response('page', { headers: { 'content-type': 'text/html' } }));
  return { locals, response: (await onRequest(context, next)) as Response };
};
const COOKIE = { cookie: 'authjs.session-token=sealed' };

beforeEach(() => {
  vi.mocked(getSession).mockReset();
});

describe('the middleware', () => {
  it('looks nothing up for a visitor without a session', async () => {
    const { locals, response } = await ask({ cookie: 'theme=dark' });
    expect(locals).toEqual({ user: null, sessionId: null });
    expect(getSession).not.toHaveBeenCalled();
    expect(response.headers.get('cache-control')).toBe('no-cache');
  });

  it('knows whoever the cookie names, as the database has them, until the session ends', async () => {
    const mira = await addPerson('designer', { password: 'rye-and-ember' });
    const opened = await signIn(mira.email, 'rye-and-ember', '192.0.2.1');
    vi.mocked(getSession).mockResolvedValue({ expires: '', opened: opened ?? undefined });
    const { locals, response } = await ask(COOKIE);
    expect(locals).toEqual({ user: mira, sessionId: opened?.sessionId });
    expect(response.headers.get('cache-control')).toBe('no-store');
    expect(response.headers.get('x-content-type-options')).toBe('nosniff');
    await signOut(opened?.sessionId ?? '');
    expect((await ask(COOKIE)).locals.user).toBeNull();
  });

  it('takes a cookie that cannot be read for none', async () => {
    vi.mocked(getSession).mockResolvedValue(null);
    expect((await ask(COOKIE)).locals).toEqual({ user: null, sessionId: null });
  });
});
