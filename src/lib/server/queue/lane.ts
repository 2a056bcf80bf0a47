import { database, withWrite } from '../db';
import { log } from '../log';
import {
  claimTask,
  endTask,
  extendLease,
  failLostTasks,
  noteProgress,
  returnTask,
  type Claim,
  type TaskRow,
} from '../tables/tasks';
import { failureOf, LetGoError, LOST_WORDS, TimeLimitError } from './failure';
import type { Commit, TaskContext, TaskHandler } from './handler';

export interface LaneTimes {
  leaseMs: number;
  /** how often an idle lane looks for work that nobody woke it for */
  pollMs: number;
  /** wait before another attempt, times the number of failures */
  retryMs: number;
  progressMs: number;
}

export const MOST_FAILURES = 3;

/** Takes the tasks of one handler, one after the other. */
export class Lane {
  readonly #handler: TaskHandler;
  readonly #times: LaneTimes;
  #stopped = false;
  #running: { claim: Claim; abort: AbortController } | null = null;
  #wake: () => void = () => undefined;
  #woken = false;
  #loop: Promise<void> = Promise.resolve();

  constructor(handler: TaskHandler, times: LaneTimes) {
    this.#handler = handler;
    this.#times = times;
  }

  start(): void {
    this.#loop = this.#run();
  }

  /** There may be work, or the running task may have been superseded. */
  wake(): void {
    this.#woken = true;
    this.#wake();
    void this.#beat().catch((error: unknown) => log.warn({ err: error }, 'a lease could not be looked at'));
  }

  /** Lets go of the running task, so that the next start takes it up at once. */
  async stop(): Promise<void> {
    this.#stopped = true;
    this.#wake();
    this.#running?.abort.abort(new LetGoError('the queue stops'));
    await this.#loop;
  }

  async #run(): Promise<void> {
    while (!this.#stopped) {
      try {
        const task = await this.#claim();
        if (task) await this.#work(task);
        else await this.#idle();
      } catch (error) {
        log.error({ err: error, task: this.#handler.name }, 'the queue stumbled and goes on');
        await this.#idle();
      }
    }
  }

  async #claim(): Promise<TaskRow | null> {
    const { name } = this.#handler;
    const lost = await failLostTasks(database(), name, Date.now(), MOST_FAILURES, LOST_WORDS);
    if (lost > 0) log.warn({ task: name, lost }, 'tasks were lost with their workers');
    return claimTask(database(), name, Date.now(), this.#times.leaseMs, MOST_FAILURES);
  }

  async #idle(): Promise<void> {
    if (this.#woken || this.#stopped) {
      this.#woken = false;
      return;
    }
    await new Promise<void>((done) => {
      const timer = setTimeout(done, this.#times.pollMs);
      this.#wake = () => {
        clearTimeout(timer);
        done();
      };
    });
    this.#woken = false;
  }

  async #beat(): Promise<void> {
    const running = this.#running;
    if (!running) return;
    const good = await extendLease(database(), running.claim, Date.now() + this.#times.leaseMs);
    if (!good) running.abort.abort(new LetGoError('the claim is no longer good'));
  }

  async #work(task: TaskRow): Promise<void> {
    const claim = { id: task.id, attempt: task.attempt };
    const abort = new AbortController();
    this.#running = { claim, abort };
    const { timeLimitMs } = this.#handler;
    const limit = setTimeout(() => abort.abort(new TimeLimitError(timeLimitMs)), timeLimitMs);
    const beat = setInterval(
      () => void this.#beat().catch((error: unknown) => log.warn({ err: error }, 'a lease was not extended')),
      this.#times.leaseMs / 3,
    );
    const progress = this.#progressOf(claim);
    try {
      const commit = await this.#attempt(task, { signal: abort.signal, progress: progress.note });
      await progress.end();
      await this.#complete(claim, commit);
    } catch (error) {
      await progress.end();
      await this.#settle(task, claim, abort.signal.aborted ? abort.signal.reason : error);
    } finally {
      clearTimeout(limit);
      clearInterval(beat);
      this.#running = null;
    }
  }

  /** Ends when the handler does, or at once when the claim is lost, whatever the handler makes of it. */
  async #attempt(task: TaskRow, context: TaskContext): Promise<Commit> {
    const aborted = new Promise<never>((_, reject) => {
      context.signal.addEventListener('abort', () => reject(context.signal.reason), { once: true });
    });
    aborted.catch(() => undefined);
    return Promise.race([this.#handler.run(JSON.parse(task.payload), context), aborted]);
  }

  async #complete(claim: Claim, commit: Commit): Promise<void> {
    await withWrite(async (trx) => {
      if (await endTask(trx, claim, 'done')) await commit(trx);
    });
  }

  async #settle(task: TaskRow, claim: Claim, error: unknown): Promise<void> {
    if (error instanceof LetGoError) return returnTask(database(), claim, Date.now(), false);
    const { words, again } = failureOf(error);
    log.warn(
      { err: error, task: task.name, subject: task.subject, failures: task.failures + 1 },
      'a task failed',
    );
    if (again && task.failures + 1 < MOST_FAILURES) {
      return returnTask(database(), claim, Date.now() + this.#times.retryMs * (task.failures + 1), true);
    }
    await endTask(database(), claim, 'failed', words);
  }

  /** Writes the latest progress at most once per stretch of time. */
  #progressOf(claim: Claim): { note: TaskContext['progress']; end(): Promise<void> } {
    let latest: [string, number] | null = null;
    let timer: NodeJS.Timeout | null = null;
    let writing: Promise<void> = Promise.resolve();
    const flush = (): void => {
      timer = null;
      if (!latest) return;
      const [stage, progress] = latest;
      latest = null;
      writing = noteProgress(database(), claim, stage, Math.min(1, Math.max(0, progress))).catch(
        (error: unknown) => {
          log.warn({ err: error }, 'progress was not written');
        },
      );
    };
    return {
      note: (stage, progress) => {
        latest = [stage, progress];
        timer ??= setTimeout(flush, this.#times.progressMs);
      },
      end: async () => {
        if (timer) clearTimeout(timer);
        latest = null;
        await writing;
      },
    };
  }
}
