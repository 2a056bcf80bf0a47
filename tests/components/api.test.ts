import { afterEach, describe, expect, test, vi } from 'vitest';
import { addressOf, call, problemOf, Refusal } from '@/components/api';

afterEach(() => vi.unstubAllGlobals());

const PROBLEM = {
  code: 'conflict',
  title: 'This changed meanwhile.',
  detail: 'Another tab was quicker.',
  action: 'Look again.',
};

function answering(status: number, body: unknown) {
  const fetched = vi.fn(
    async () => new Response(typeof body === 'string' ? body : JSON.stringify(body), { status }),
  );
  vi.stubGlobal('fetch', fetched);
  return fetched;
}

describe('addressOf', () => {
  test('fills in parameters and leaves out what is empty', () => {
    expect(addressOf('GET /api/orders/:number/preparations/:id', { number: 'U-1001', id: 3 })).toBe(
      '/api/orders/U-1001/preparations/3',
    );
    expect(addressOf('GET /api/orders', {}, { q: 'a b', state: '', page: 2, machineId: undefined })).toBe(
      '/api/orders?q=a+b&page=2',
    );
    expect(addressOf('GET /api/orders/:number', { number: '../x' })).toBe('/api/orders/..%2Fx');
  });
});

describe('call', () => {
  test('sends JSON and gives the answer', async () => {
    const fetched = answering(200, { ok: true });
    await expect(call('POST /api/account/forgotten', { body: { email: 'a@b.example' } })).resolves.toEqual({
      ok: true,
    });
    expect(fetched).toHaveBeenCalledWith(
      '/api/account/forgotten',
      expect.objectContaining({ method: 'POST', body: '{"email":"a@b.example"}' }),
    );
  });

  test('a refusal keeps its words and status', async () => {
    answering(409, PROBLEM);
    const error = await call('GET /api/stocks', {}).catch((caught: unknown) => caught);
    expect(error).toBeInstanceOf(Refusal);
    expect(error).toMatchObject({ status: 409, problem: PROBLEM });
  });

  test('an answer that is no problem of ours still says what to do', async () => {
    answering(502, '<html>bad gateway</html>');
    const error = await call('GET /api/stocks', {}).catch((caught: unknown) => caught);
    expect(problemOf(error).title).toBe('The shop does not answer.');
  });

  test('a broken connection is put into words', async () => {
    vi.stubGlobal('fetch', async () => Promise.reject(new TypeError('failed to fetch')));
    const error = await call('GET /api/stocks', {}).catch((caught: unknown) => caught);
    expect(problemOf(error).action).toContain('Try again');
  });
});
