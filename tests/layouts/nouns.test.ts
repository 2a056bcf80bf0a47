import { describe, expect, it } from 'vitest';
import { isOpen, NOUNS } from '@/layouts/nouns';
import { roleSchema } from '@/lib/orders/state';

describe('the nouns of the top line', () => {
  it.each(roleSchema.options)('are four at most for a %s', (role) => {
    expect(NOUNS[role].length).toBeLessThanOrEqual(4);
  });

  it.each(['customer', 'designer', 'operator'] as const)('lead a %s to a new order', (role) => {
    const open = NOUNS[role].filter((noun) => isOpen(noun, NOUNS[role], '/orders/new'));
    expect(open.map(({ name }) => name)).toEqual(['New order']);
  });
});
