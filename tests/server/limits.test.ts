import '../setup/database';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { ALLOWANCES, countAttempt, forgetAttempts, forgive, isLimited } from '@/lib/server/limits';
import { ROUTES } from '@/lib/server/routes';

beforeEach(forgetAttempts);

const attempts = async (times: number, address: (index: number) => string, account: string | null) => {
  for (let index = 0; index < times; index += 1) await countAttempt('sign-in', address(index), account);
};

describe('countAttempt', () => {
  it('stops an account however many addresses are used, without regard to capitals', async () => {
    await attempts(ALLOWANCES['sign-in'].perAccount, (index) => `192.0.2.${index}`, 'Mira@shop.example');
    await expect(countAttempt('sign-in', '192.0.2.200', ' mira@SHOP.example')).rejects.toMatchObject({
      code: 'too-many',
      status: 429,
    });
    await countAttempt('sign-in', '192.0.2.200', 'other@shop.example');
  });

  it('stops an address however many accounts are tried', async () => {
    for (let index = 0; index < ALLOWANCES['sign-in'].perAddress; index += 1)
      await countAttempt('sign-in', '192.0.2.1', `p${index}@shop.example`);
    await expect(countAttempt('sign-in', '192.0.2.1', 'fresh@shop.example')).rejects.toMatchObject({
      code: 'too-many',
    });
    await countAttempt('sign-in', '192.0.2.2', 'fresh@shop.example');
  });

  it('counts seconds as seconds: the wait is over when it says so', async () => {
    vi.useFakeTimers();
    try {
      await attempts(10, () => '192.0.2.1', 'mira@shop.example');
      const refused = await countAttempt('sign-in', '192.0.2.1', 'mira@shop.example').catch((error) => error);
      expect(refused.problem.action).toBe('Wait 15 minutes and try again.');
      vi.advanceTimersByTime(899_000);
      await expect(countAttempt('sign-in', '192.0.2.1', 'mira@shop.example')).rejects.toMatchObject({
        code: 'too-many',
      });
      vi.advanceTimersByTime(2_000);
      await countAttempt('sign-in', '192.0.2.1', 'mira@shop.example');
    } finally {
      vi.useRealTimers();
    }
  });

  it('keeps one thing counted apart from another', async () => {
    await attempts(10, () => '192.0.2.1', 'mira@shop.example');
    await countAttempt('POST /api/account/forgotten', '192.0.2.1', 'mira@shop.example');
  });
});

describe('forgive', () => {
  it('lets somebody who signs in rightly do so as often as they like', async () => {
    for (let index = 0; index < 150; index += 1) {
      await countAttempt('sign-in', '192.0.2.1', 'mira@shop.example');
      await forgive('sign-in', '192.0.2.1', 'mira@shop.example');
    }
  });
});

it('limits every route that anyone may change something by', () => {
  const open = ROUTES.filter((route) => route.access === 'anyone' && route.method !== 'GET').map(
    (route) => `${route.method} ${route.path}`,
  );
  expect(open.filter((key) => !isLimited(key))).toEqual([]);
});
