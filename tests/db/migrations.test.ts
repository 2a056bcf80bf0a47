import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openDatabase } from '@/lib/server/db';

const folder = mkdtempSync(path.join(tmpdir(), 'umberline-migrations-'));
const files = readdirSync('db/migrations').sort();
let db: Knex;

beforeAll(() => {
  db = openDatabase(path.join(folder, 'shop.sqlite'));
});
afterAll(async () => {
  await db.destroy();
  rmSync(folder, { recursive: true, force: true });
});

/** Every table, index and trigger as the database itself describes it. */
const layout = (): Promise<unknown> =>
  db('sqlite_schema')
    .select('type', 'name', 'sql')
    .whereNot('name', 'like', 'knex_%')
    .whereNot('name', 'like', 'sqlite_%')
    .orderBy('name');

describe('migrations', () => {
  it('go up, down to nothing, and up to the same layout again', async () => {
    await db.migrate.latest();
    const first = await layout();
    expect(first).not.toEqual([]);
    await db.migrate.rollback(undefined, true);
    expect(await layout()).toEqual([]);
    await db.migrate.latest();
    expect(await layout()).toEqual(first);
  });

  it('go down and up one by one', async () => {
    for (const file of [...files].reverse()) {
      const before = await layout();
      await db.migrate.down();
      expect(await layout(), `${file} down`).not.toEqual(before);
    }
    for (const file of files) {
      const before = await layout();
      await db.migrate.up();
      expect(await layout(), `${file} up`).not.toEqual(before);
    }
  });

  it('have numbers of their own', () => {
    const numbers = files.map((file) => file.slice(0, 3));
    expect(new Set(numbers).size).toBe(files.length);
    expect(numbers.every((number) => /^\d{3}$/.test(number))).toBe(true);
  });

  it('leave foreign keys on, the journal in WAL and every commit on disk', async () => {
    const value = async (pragma: string): Promise<unknown> =>
      Object.values((await db.raw(`pragma ${pragma}`))[0])[0];
    expect(await value('foreign_keys')).toBe(1);
    expect(await value('journal_mode')).toBe('wal');
    expect(await value('synchronous')).toBe(2);
    expect(await db.raw('pragma foreign_key_check')).toEqual([]);
  });

  it.each(files)('%s imports nothing of the program', (file) => {
    expect(readFileSync(path.join('db/migrations', file), 'utf8')).not.toMatch(
      /\bimport\b(?!\()[^*]*\bfrom\b/,
    );
  });
});
