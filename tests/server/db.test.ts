import { dataDir } from '../setup/database';
import { fork } from 'node:child_process';
import path from 'node:path';
import { beforeEach, describe, expect, it } from 'vitest';
import { afterCommit, database, openDatabase, withWrite } from '@/lib/server/db';

beforeEach(async () => {
  await database().raw('create table if not exists counters (name text primary key, value integer not null)');
  await database().raw("insert into counters values ('hits', 0) on conflict (name) do update set value = 0");
});

const hits = async (): Promise<number> =>
  (await database()('counters').where({ name: 'hits' }).first('value')).value;

describe('withWrite', () => {
  it('keeps what it did, or nothing of it', async () => {
    await withWrite((trx) => trx('counters').update({ value: 1 }));
    await expect(
      withWrite(async (trx) => {
        await trx('counters').update({ value: 2 });
        throw new Error('no');
      }),
    ).rejects.toThrow('no');
    expect(await hits()).toBe(1);
  });

  it('begins IMMEDIATE: another writer is kept out before the first statement', async () => {
    const other = openDatabase(path.join(dataDir, 'umberline.sqlite'));
    await other.raw('pragma busy_timeout = 0');
    try {
      await withWrite(async () => {
        await expect(other('counters').update({ value: 9 })).rejects.toThrow(/locked/);
      });
      await other('counters').update({ value: 9 });
      expect(await hits()).toBe(9);
    } finally {
      await other.destroy();
    }
  });

  it('refuses a query outside the transaction inside it, instead of waiting for ever', async () => {
    await withWrite(async () => {
      expect(() => database()).toThrow('expected the transaction inside withWrite');
    });
    await expect(withWrite(() => withWrite(async () => 1))).rejects.toThrow(
      'expected the transaction inside withWrite',
    );
  });

  it('lets read-then-write changes of many at once lose nothing', async () => {
    await Promise.all(
      Array.from({ length: 40 }, () =>
        withWrite(async (trx) => {
          const { value } = await trx('counters').first('value');
          await trx('counters').update({ value: value + 1 });
        }),
      ),
    );
    expect(await hits()).toBe(40);
  });

  it('loses none of the writes of several processes', async () => {
    const script = path.resolve('tests/server/count-up.mjs');
    const run = () =>
      new Promise<number | null>((resolve, reject) => {
        const child = fork(script, [path.join(dataDir, 'umberline.sqlite'), '50'], { execArgv: [] });
        child.once('error', reject);
        child.once('exit', resolve);
      });
    expect(await Promise.all([run(), run(), run()])).toEqual([0, 0, 0]);
    expect(await hits()).toBe(150);
  });
});

describe('afterCommit', () => {
  it('calls once the write is kept, with reading allowed again', async () => {
    const seen: string[] = [];
    await withWrite(async (trx) => {
      afterCommit(() => seen.push(database() ? 'after' : 'never'));
      await trx('counters').update({ value: 5 });
      seen.push('inside');
    });
    expect(seen).toEqual(['inside', 'after']);
  });

  it('never calls when the write is rolled back', async () => {
    let called = false;
    await expect(
      withWrite(async () => {
        afterCommit(() => {
          called = true;
        });
        throw new Error('no');
      }),
    ).rejects.toThrow('no');
    expect(called).toBe(false);
  });

  it('needs a write to wait for', () => {
    expect(() => afterCommit(() => undefined)).toThrow('expected to be inside withWrite');
  });
});
