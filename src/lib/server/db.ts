import { AsyncLocalStorage } from 'node:async_hooks';
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import createKnex, { type Knex } from 'knex';
import knexConfig from '../../../knexfile.mjs';
import { config } from './config';

/** The database, or a transaction on it: what every function of `tables` takes first. */
export type Db = Knex;
export type Transaction = Knex.Transaction;

interface Beginnable {
  begin(connection: unknown): Promise<unknown>;
  query(connection: unknown, sql: string): Promise<unknown>;
}

/**
 * A Knex of one connection whose every transaction begins IMMEDIATE: a deferred one that later turns to writing fails at
 * once under contention, whatever the busy timeout.
 */
export function openDatabase(filename: string): Knex {
  if (filename !== ':memory:') mkdirSync(path.dirname(filename), { recursive: true });
  const db = createKnex({ ...knexConfig, connection: { filename } });
  const client = db.client as { transaction: (...args: unknown[]) => Beginnable };
  const transaction = client.transaction;
  client.transaction = function (...args) {
    const begun = transaction.apply(this, args);
    begun.begin = (connection) => begun.query(connection, 'BEGIN IMMEDIATE;');
    return begun;
  };
  return db;
}

// On globalThis, so that a reload of modules in development does not open the file a second time.
const slot = globalThis as typeof globalThis & { umberlineDatabase?: Knex };

interface Write {
  trx: Transaction;
  after: (() => void)[];
}
const writing = new AsyncLocalStorage<Write>();

/** The database for reading. Inside a write it throws: the pool has one connection, and the write holds it. */
export function database(): Db {
  if (writing.getStore())
    throw new Error('expected the transaction inside withWrite, got a query outside it');
  return (slot.umberlineDatabase ??= openDatabase(config().databaseFile));
}

/** Runs one write transaction; what it throws rolls everything back. It cannot be nested. */
export async function withWrite<T>(work: (trx: Transaction) => Promise<T>): Promise<T> {
  const db = database();
  const after: (() => void)[] = [];
  const result = await db.transaction((trx) => writing.run({ trx, after }, () => work(trx)));
  for (const call of after) call();
  return result;
}

/** Has something done once the present write is kept, and never when it is rolled back. */
export function afterCommit(call: () => void): void {
  const write = writing.getStore();
  if (!write) throw new Error('expected to be inside withWrite');
  write.after.push(call);
}

export async function closeDatabase(): Promise<void> {
  const open = slot.umberlineDatabase;
  slot.umberlineDatabase = undefined;
  await open?.destroy();
}
