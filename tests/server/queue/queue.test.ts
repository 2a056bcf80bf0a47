import '../../setup/database';
import { afterEach, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { database, withWrite } from '@/lib/server/db';
import { AppError } from '@/lib/server/errors';
import { askAnew, askOnce } from '@/lib/server/queue/enqueue';
import { taskHandler, type TaskContext, type TaskHandler } from '@/lib/server/queue/handler';
import type { LaneTimes } from '@/lib/server/queue/lane';
import { queueRuns, startQueue, stopQueue } from '@/lib/server/queue/queue';
import { claimTask, endTask, extendLease, returnTask, type TaskRow } from '@/lib/server/tables/tasks';
import { ArtworkError } from '@/lib/prepare/tools';

const QUICK: LaneTimes = { leaseMs: 300, pollMs: 15, retryMs: 1, progressMs: 5 };
const payload = z.object({ n: z.number() });
const nothing = async (): Promise<void> => undefined;

interface Done {
  committed: number[];
  attempts: number;
}

/** A queue whose checks are done by `work`; preparations do nothing. */
function queueOf(
  work: (n: number, context: TaskContext, done: Done) => Promise<void>,
  timeLimitMs = 5_000,
): { handlers: TaskHandler[]; done: Done } {
  const done: Done = { committed: [], attempts: 0 };
  const check = taskHandler({
    name: 'check-artwork',
    payload,
    timeLimitMs,
    async run({ n }, context) {
      done.attempts += 1;
      await work(n, context, done);
      return async () => void done.committed.push(n);
    },
  });
  const prepare = taskHandler({ name: 'prepare-order', payload, timeLimitMs, run: async () => nothing });
  return { handlers: [check, prepare], done };
}

let subjects = 0;
const newSubject = (): string => `artwork ${(subjects += 1)}`;
async function ask(subject: string, n: unknown, how = askOnce): Promise<void> {
  await withWrite((trx) => how(trx, { name: 'check-artwork', subject, orderId: null, payload: { n } }));
}
const rowsOf = (subject: string): Promise<TaskRow[]> =>
  database()<TaskRow>('tasks').where({ subject }).orderBy('id');
async function until(subject: string, state: TaskRow['state']): Promise<TaskRow> {
  for (let tries = 0; tries < 600; tries += 1) {
    const row = (await rowsOf(subject)).at(-1);
    if (row?.state === state) return row;
    await new Promise((next) => setTimeout(next, 5));
  }
  throw new Error(`the task did not come to be ${state}: ${JSON.stringify(await rowsOf(subject))}`);
}
/** A promise and what settles it. */
function gate(): { opened: Promise<void>; open(): void } {
  let open: () => void = () => undefined;
  const opened = new Promise<void>((done) => (open = done));
  return { opened, open: () => open() };
}

afterEach(stopQueue);

describe('the queue', () => {
  it('refuses to start without exactly one handler per name', () => {
    const [check, prepare] = queueOf(nothing).handlers;
    expect(() => startQueue([check])).toThrow('exactly one handler for the task prepare-order, got 0');
    expect(() => startQueue([check, prepare, check])).toThrow(
      'exactly one handler for the task check-artwork, got 2',
    );
    expect(queueRuns()).toBe(false);
  });

  it('does what is asked, once, and writes the result with the end of the task', async () => {
    const { handlers, done } = queueOf(nothing);
    startQueue(handlers, QUICK);
    startQueue(handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 7);
    expect(await until(subject, 'done')).toMatchObject({ attempt: 1, failures: 0, progress: 1, problem: '' });
    expect(done).toEqual({ committed: [7], attempts: 1 });
  });

  it('does a task once that is asked for twice, also at once', async () => {
    const { handlers, done } = queueOf(nothing);
    const subject = newSubject();
    await Promise.all([ask(subject, 1), ask(subject, 1), ask(subject, 1)]);
    startQueue(handlers, QUICK);
    await until(subject, 'done');
    expect(await rowsOf(subject)).toHaveLength(1);
    expect(done.committed).toEqual([1]);
  });

  it('tells how far it is, coalesced', async () => {
    const { opened, open } = gate();
    const { handlers } = queueOf(async (_, context) => {
      for (let step = 0; step <= 1000; step += 1) context.progress('Measuring', step / 2000);
      await opened;
    });
    startQueue(handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 1);
    for (let tries = 0; tries < 200 && (await rowsOf(subject))[0].progress === 0; tries += 1)
      await new Promise((next) => setTimeout(next, 5));
    expect((await rowsOf(subject))[0]).toMatchObject({ state: 'running', stage: 'Measuring', progress: 0.5 });
    open();
    await until(subject, 'done');
  });

  it('tries three times, then fails with a reason that says what to do', async () => {
    const { handlers, done } = queueOf(async () => {
      throw new Error('socket 17 hung up');
    });
    startQueue(handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 1);
    const row = await until(subject, 'failed');
    expect(done.attempts).toBe(3);
    expect(row.problem).toMatch(/Start it again/);
    expect(row.problem).not.toMatch(/socket/);
  });

  it('succeeds on a later attempt', async () => {
    const { handlers, done } = queueOf(async (_, __, { attempts }) => {
      if (attempts < 3) throw new Error('not yet');
    });
    startQueue(handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 3);
    expect(await until(subject, 'done')).toMatchObject({ failures: 2 });
    expect(done.committed).toEqual([3]);
  });

  it.each([
    [
      'trouble with the artwork',
      new ArtworkError('truncated', 'The file ends too early. Save it again.'),
      'The file ends too early. Save it again.',
    ],
    ['a refusal', new AppError('no-room'), 'The shop’s disk is nearly full.'],
  ])('does not try again after %s', async (_, error, words) => {
    const { handlers, done } = queueOf(async () => {
      throw error;
    });
    startQueue(handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 1);
    expect((await until(subject, 'failed')).problem).toContain(words);
    expect(done.attempts).toBe(1);
  });

  it('fails a task whose payload does not fit its schema, without calling the handler', async () => {
    const { handlers, done } = queueOf(nothing);
    startQueue(handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 'seven');
    await until(subject, 'failed');
    expect(done.attempts).toBe(0);
  });

  it('says that the disk is full, and can be started again when there is room', async () => {
    let full = true;
    const { handlers } = queueOf(async () => {
      if (full)
        throw new Error('could not store', { cause: Object.assign(new Error('write'), { code: 'ENOSPC' }) });
    });
    startQueue(handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 1);
    expect((await until(subject, 'failed')).problem).toMatch(/disk is full/);
    full = false;
    await ask(subject, 1);
    await until(subject, 'done');
  });

  it('ends a task that takes too long, and goes on with the next', async () => {
    const { handlers, done } = queueOf(async (n) => {
      if (n === 1) await new Promise(() => undefined);
    }, 60);
    startQueue(handlers, QUICK);
    const [slow, next] = [newSubject(), newSubject()];
    await ask(slow, 1);
    await ask(next, 2);
    expect((await until(slow, 'failed')).problem).toMatch(/longer than/);
    await until(next, 'done');
    expect(done.committed).toEqual([2]);
  });

  it('lets a newer request take the place of a running one, whose result is never written', async () => {
    const { opened, open } = gate();
    let aborted = false;
    const { handlers, done } = queueOf(async (n, { signal }) => {
      if (n === 1) {
        signal.addEventListener('abort', () => (aborted = true));
        await opened;
      }
    });
    startQueue(handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 1);
    await until(subject, 'running');
    await ask(subject, 2, askAnew);
    await until(subject, 'done');
    open();
    await new Promise((next) => setTimeout(next, 30));
    expect(aborted).toBe(true);
    expect(done.committed).toEqual([2]);
    expect((await rowsOf(subject)).map(({ state }) => state)).toEqual(['superseded', 'done']);
  });

  it('lets go of what it does when it stops, without counting a failure, and takes it up again', async () => {
    const first = queueOf(() => new Promise(() => undefined));
    startQueue(first.handlers, QUICK);
    const subject = newSubject();
    await ask(subject, 5);
    await until(subject, 'running');
    await stopQueue();
    expect((await rowsOf(subject))[0]).toMatchObject({ state: 'waiting', failures: 0, attempt: 1 });
    const second = queueOf(nothing);
    startQueue(second.handlers, QUICK);
    expect(await until(subject, 'done')).toMatchObject({ attempt: 2, failures: 0 });
    expect(first.done.committed).toEqual([]);
    expect(second.done.committed).toEqual([5]);
  });

  it('rolls the end of a task back with a result that could not be written', async () => {
    let tries = 0;
    const check = taskHandler({
      name: 'check-artwork',
      payload,
      timeLimitMs: 1000,
      run: async () => async (trx) => {
        tries += 1;
        await trx('mails').insert({ nonsense: true });
      },
    });
    startQueue([check, queueOf(nothing).handlers[1]], QUICK);
    const subject = newSubject();
    await ask(subject, 1);
    await until(subject, 'failed');
    expect(tries).toBe(3);
  });
});

describe('a claim', () => {
  const claim = (now: number, leaseMs = 1000): Promise<TaskRow | null> =>
    claimTask(database(), 'check-artwork', now, leaseMs, 3);

  it('is given to one worker only', async () => {
    await database()('tasks').delete();
    await ask(newSubject(), 1);
    const claims = await Promise.all(Array.from({ length: 8 }, () => claim(Date.now() + 10)));
    expect(claims.filter(Boolean)).toHaveLength(1);
  });

  it('passes on when its lease ran out, and the old holder is fenced off', async () => {
    await database()('tasks').delete();
    await ask(newSubject(), 1);
    const now = Date.now() + 10;
    const first = await claim(now);
    expect(await claim(now + 999)).toBeNull();
    const second = await claim(now + 1000);
    if (!first || !second) throw new Error('expected two claims');
    expect(second).toMatchObject({ id: first.id, attempt: first.attempt + 1, failures: 1 });
    expect(await extendLease(database(), first, now + 5000)).toBe(false);
    expect(await endTask(database(), first, 'done')).toBe(false);
    await returnTask(database(), first, now, true);
    expect(await extendLease(database(), second, now + 5000)).toBe(true);
    expect(await endTask(database(), second, 'done')).toBe(true);
    expect(await endTask(database(), second, 'done')).toBe(false);
  });

  it('never gives an attempt number twice, whatever became of the earlier ones', async () => {
    await database()('tasks').delete();
    await ask(newSubject(), 1);
    const seen: number[] = [];
    let now = Date.now() + 10;
    for (let turn = 0; turn < 4; turn += 1) {
      const row = await claim(now);
      if (!row) throw new Error('no claim');
      seen.push(row.attempt);
      await returnTask(database(), row, now, false);
      now += 10;
    }
    expect(seen).toEqual([1, 2, 3, 4]);
  });

  it('is not given a fourth time when workers are lost again and again: the task fails with a reason', async () => {
    await database()('tasks').delete();
    const subject = newSubject();
    await ask(subject, 1);
    await database()('tasks').update({
      state: 'running',
      failures: 2,
      attempt: 3,
      lease_until_ms: Date.now() - 1,
    });
    expect(await claim(Date.now())).toBeNull();
    startQueue(queueOf(nothing).handlers, QUICK);
    expect((await until(subject, 'failed')).problem).toMatch(/broke off three times/);
  });

  it('takes what is due first, and nothing before it is due', async () => {
    await database()('tasks').delete();
    const [later, sooner] = [newSubject(), newSubject()];
    await ask(later, 1);
    await ask(sooner, 2);
    const now = Date.now();
    await database()('tasks')
      .where({ subject: later })
      .update({ due_ms: now + 500 });
    await database()('tasks')
      .where({ subject: sooner })
      .update({ due_ms: now + 100 });
    expect(await claim(now + 99)).toBeNull();
    expect(await claim(now + 600)).toMatchObject({ subject: sooner });
    expect(await claim(now + 600)).toMatchObject({ subject: later });
  });
});
