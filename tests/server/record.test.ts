import '../setup/database';
import { beforeAll, describe, expect, it } from 'vitest';
import { audit } from '@/lib/server/audit';
import { database, withWrite } from '@/lib/server/db';
import type { Person } from '@/lib/server/person';
import { recordOf } from '@/lib/server/tables/record';
import { GET as readRecord } from '@/pages/api/record';
import { call, jsonOf } from '../setup/call';
import { addPerson } from '../setup/people';

interface Page {
  entries: { by: string; event: string; subject: string; words: string }[];
  total: number;
  page: number;
  perPage: number;
}
let odile: Person;
const page = async (query: string) =>
  jsonOf<Page>(await call(readRecord, { path: `/api/record?${query}`, person: odile }));

beforeAll(async () => {
  odile = await addPerson('admin', { name: 'Odile Marsh' });
  await withWrite(async (trx) => {
    for (let index = 1; index <= 60; index += 1)
      await audit(trx, {
        by: odile,
        event: 'take',
        subject: `U-${1000 + index}`,
        words: `entry ${index} at 100 %`,
      });
    await audit(trx, {
      by: null,
      event: 'approve',
      subject: 'U-1001',
      from: 'proof-sent',
      to: 'approved',
      words: 'in person',
    });
  });
});

describe('the record', () => {
  it('is read newest first, fifty a page', async () => {
    const first = await page('');
    expect(first).toMatchObject({ total: 61, page: 1, perPage: 50 });
    expect(first.entries[0]).toMatchObject({
      by: 'Umberline',
      event: 'approve',
      subject: 'U-1001',
      words: 'in person',
    });
    expect((await page('page=2')).entries).toHaveLength(11);
    expect((await page('page=3')).entries).toEqual([]);
  });

  it('is searched by who, what, on what and in which words, with signs taken for what they are', async () => {
    expect((await page('q=U-1001')).total).toBe(2);
    expect((await page('q=odile')).total).toBe(60);
    expect((await page('q=entry+7+at')).total).toBe(1);
    expect((await page('q=100+%25')).total).toBe(60);
    expect((await page('q=e_try')).total).toBe(0);
  });

  it('keeps from and to of an order’s life', async () => {
    const rows = await recordOf(database(), 'U-1001');
    expect(rows.map(({ event, from_state, to_state }) => [event, from_state, to_state])).toEqual([
      ['take', null, null],
      ['approve', 'proof-sent', 'approved'],
    ]);
  });

  it('can be neither changed nor shortened', async () => {
    await expect(database()('record').update({ words: 'other' })).rejects.toThrow(
      'the record is only ever added to',
    );
    await expect(database()('record').delete()).rejects.toThrow('the record is only ever added to');
  });

  it('loses its entry with the change that it tells of', async () => {
    await expect(
      withWrite(async (trx) => {
        await audit(trx, { by: odile, event: 'take', subject: 'U-9999' });
        throw new Error('rolled back');
      }),
    ).rejects.toThrow('rolled back');
    expect(await recordOf(database(), 'U-9999')).toEqual([]);
  });
});
