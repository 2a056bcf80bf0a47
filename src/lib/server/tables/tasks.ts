import type { Db } from '../db';

export interface TaskRow {
  id: number;
  name: string;
  /** what it is about, such as `artwork 12`; one task of a name is open for a subject */
  subject: string;
  order_id: number | null;
  payload: string;
  state: 'waiting' | 'running' | 'done' | 'failed' | 'superseded';
  /** grows with every claim and is never given twice: whoever holds an older one is fenced off */
  attempt: number;
  failures: number;
  due_ms: number;
  lease_until_ms: number | null;
  stage: string;
  progress: number;
  problem: string;
  created_at: string;
  finished_at: string | null;
}

/** What names one claim of a task. */
export interface Claim {
  id: number;
  attempt: number;
}

const now = (): string => new Date().toISOString();
const held = (db: Db, { id, attempt }: Claim) =>
  db<TaskRow>('tasks').where({ id, attempt, state: 'running' });

export async function insertTask(
  db: Db,
  task: Pick<TaskRow, 'name' | 'subject' | 'order_id' | 'payload' | 'due_ms'>,
): Promise<void> {
  await db('tasks').insert({ ...task, state: 'waiting', created_at: now() });
}

/** The task of a name that waits or runs for a subject. */
export async function openTask(db: Db, name: string, subject: string): Promise<TaskRow | undefined> {
  return db<TaskRow>('tasks').where({ name, subject }).whereIn('state', ['waiting', 'running']).first();
}

/** Ends an open task that a newer one replaces; whoever runs it cannot complete it any more. */
export async function supersedeTask(db: Db, name: string, subject: string): Promise<void> {
  await db('tasks')
    .where({ name, subject })
    .whereIn('state', ['waiting', 'running'])
    .update({ state: 'superseded', finished_at: now() });
}

/**
 * Takes the next due task of a name, or one whose lease ran out, in a single guarded statement.
 * A lease that ran out counts as a failure of the attempt that held it.
 */
export async function claimTask(
  db: Db,
  name: string,
  nowMs: number,
  leaseMs: number,
  mostFailures: number,
): Promise<TaskRow | null> {
  const rows: TaskRow[] = await db.raw(
    `update tasks
     set failures = failures + (state = 'running'), state = 'running', attempt = attempt + 1,
         lease_until_ms = :lease, stage = '', progress = 0
     where id = (
       select id from tasks
       where name = :name
         and ((state = 'waiting' and due_ms <= :now) or (state = 'running' and lease_until_ms <= :now))
         and failures + (state = 'running') < :most
       order by due_ms, id limit 1)
     returning *`,
    { name, now: nowMs, lease: nowMs + leaseMs, most: mostFailures },
  );
  return rows[0] ?? null;
}

/** Ends tasks whose last allowed attempt was lost with its worker. */
export async function failLostTasks(
  db: Db,
  name: string,
  nowMs: number,
  mostFailures: number,
  problem: string,
): Promise<number> {
  return db('tasks')
    .where({ name, state: 'running' })
    .where('lease_until_ms', '<=', nowMs)
    .where('failures', '>=', mostFailures - 1)
    .update({ state: 'failed', problem, finished_at: now() });
}

/** Whether the claim still holds; if so its lease is longer now. */
export async function extendLease(db: Db, claim: Claim, untilMs: number): Promise<boolean> {
  return (await held(db, claim).update({ lease_until_ms: untilMs })) === 1;
}

export async function noteProgress(db: Db, claim: Claim, stage: string, progress: number): Promise<void> {
  await held(db, claim).update({ stage, progress });
}

/** Ends a task, and says whether the claim was still good for it. */
export async function endTask(
  db: Db,
  claim: Claim,
  state: 'done' | 'failed',
  problem = '',
): Promise<boolean> {
  const ended = { state, problem, lease_until_ms: null, finished_at: now() };
  return (await held(db, claim).update(state === 'done' ? { ...ended, progress: 1 } : ended)) === 1;
}

/** Gives a task back for another attempt. */
export async function returnTask(db: Db, claim: Claim, dueMs: number, failed: boolean): Promise<void> {
  await held(db, claim)
    .update({ state: 'waiting', due_ms: dueMs, lease_until_ms: null, stage: '', progress: 0 })
    .increment('failures', failed ? 1 : 0);
}

/** Newest task of each subject of an order that is not superseded. */
export async function tasksOfOrder(db: Db, orderId: number): Promise<TaskRow[]> {
  return db.raw(
    `select * from tasks where id in (
       select max(id) from tasks where order_id = ? and state <> 'superseded' group by name, subject)
     order by id`,
    [orderId],
  );
}
