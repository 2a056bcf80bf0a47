import { describe, expect, test } from 'vitest';
import { flashOf } from '@/layouts/flash';
import { nextPage, signInFor } from '@/layouts/next-page';
import { isOpen, NOUNS } from '@/layouts/nouns';

const at = (path: string) => new URL(path, 'http://shop.example');

describe('nextPage', () => {
  test('a page of this site is followed', () => {
    expect(nextPage(at('/sign-in?next=/orders/U-1001'), '/start')).toBe('/orders/U-1001');
  });

  test.each(['https://evil.example', '//evil.example', '/\\evil.example', 'orders', '/%0d%0aset-cookie:a'])(
    '%s is not',
    (next) => {
      expect(nextPage(at(`/sign-in?next=${next}`), '/start')).toBe('/start');
    },
  );

  test('comes back from signing in with its search', () => {
    const there = signInFor(at('/orders?q=fern&page=2'));
    expect(nextPage(at(there), '/start')).toBe('/orders?q=fern&page=2');
  });
});

test('a flash prints only sentences of our own', () => {
  expect(flashOf(at('/orders?said=confirmed'))).toBe('Your address is confirmed.');
  expect(flashOf(at('/orders?said=<b>hello</b>'))).toBeNull();
  expect(flashOf(at('/orders?said=toString'))).toBeNull();
  expect(flashOf(at('/orders'))).toBeNull();
});

test('one noun is open, the nearest', () => {
  const open = (path: string) =>
    NOUNS.customer.filter((noun) => isOpen(noun, NOUNS.customer, path)).map(({ name }) => name);
  expect(open('/orders')).toEqual(['Orders']);
  expect(open('/orders/U-1001')).toEqual(['Orders']);
  expect(open('/orders/new')).toEqual(['New order']);
  expect(open('/account')).toEqual([]);
});

test('no role has more than four nouns', () => {
  for (const nouns of Object.values(NOUNS)) expect(nouns.length).toBeLessThanOrEqual(4);
});
