import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  changedList,
  readListAddress,
  sortedBy,
  writeListAddress,
  type ListQuery,
} from '../../../src/components/list/list-address';

const OWN = { state: 'submitted,in-preparation' } as const;

describe('readListAddress', () => {
  it('shows the list’s own view where the address says nothing', () => {
    expect(readListAddress('', OWN)).toEqual({
      q: '',
      state: OWN.state,
      machineId: undefined,
      sort: 'due',
      order: 'up',
      page: 1,
      perPage: 25,
    });
  });
  it('takes what the address says', () => {
    expect(
      readListAddress('?q=harbour&state=&machineId=2&sort=customer&order=down&page=3', OWN),
    ).toMatchObject({
      q: 'harbour',
      state: '',
      machineId: 2,
      sort: 'customer',
      order: 'down',
      page: 3,
    });
  });
  it('falls back field by field on what it cannot read', () => {
    expect(readListAddress('?sort=colour&page=0&perPage=9999&order=down&machineId=x', OWN)).toMatchObject({
      sort: 'due',
      page: 1,
      perPage: 25,
      order: 'down',
      machineId: undefined,
    });
  });
});

describe('writeListAddress', () => {
  it('leaves out what the list would show anyway', () => {
    expect(writeListAddress(readListAddress('', OWN), OWN)).toBe('');
    expect(writeListAddress({ ...readListAddress('', OWN), q: 'a b', page: 2 }, OWN)).toBe('?q=a+b&page=2');
  });
  it('can be read again, whatever it holds', () => {
    const query = fc.record<ListQuery>({
      q: fc.string({ maxLength: 40 }).map((s) => s.trim()),
      state: fc.constantFrom('', 'draft', 'released,running', OWN.state),
      machineId: fc.option(fc.integer({ min: 1, max: 999 }), { nil: undefined }),
      sort: fc.constantFrom('due', 'updated', 'number', 'customer', 'state'),
      order: fc.constantFrom('up', 'down'),
      page: fc.integer({ min: 1, max: 500 }),
      perPage: fc.integer({ min: 1, max: 100 }),
    });
    fc.assert(
      fc.property(query, (asked) => {
        expect(readListAddress(writeListAddress(asked, OWN), OWN)).toEqual(asked);
      }),
    );
  });
});

describe('changes of a list', () => {
  const third = readListAddress('?page=3', OWN);
  it('start again on the first page, except when a page is turned', () => {
    expect(changedList(third, { q: 'x' }).page).toBe(1);
    expect(changedList(third, { page: 4 }).page).toBe(4);
  });
  it('turn the order round when the same column is chosen again', () => {
    const once = sortedBy(third, 'customer');
    expect(once).toMatchObject({ sort: 'customer', order: 'up', page: 1 });
    expect(sortedBy(once, 'customer').order).toBe('down');
    expect(sortedBy(sortedBy(once, 'customer'), 'customer').order).toBe('up');
  });
});
