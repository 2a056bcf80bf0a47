import { describe, expect, it } from 'vitest';
import { orderIdOf, orderNumber } from '@/lib/orders/number';
import { orderNumberSchema } from '@/lib/orders/order';

describe('order numbers', () => {
  it('begin at U-1001 and come back to their place', () => {
    expect(orderNumber(1)).toBe('U-1001');
    for (const id of [1, 2, 8999, 9000, 123_456]) {
      expect(orderNumberSchema.safeParse(orderNumber(id)).success).toBe(true);
      expect(orderIdOf(orderNumber(id))).toBe(id);
    }
  });

  it.each([
    'U-1000',
    'U-0999',
    'U-01001',
    'u-1001',
    'U-1001 ',
    ' U-1001',
    'U-1e99',
    'U--1001',
    '1001',
    '',
    'U-',
    'U-999999999',
    'U-1001\n',
  ])('%j is none', (text) => {
    expect(orderIdOf(text)).toBeNull();
  });
});
