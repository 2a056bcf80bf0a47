import { spawn, type ChildProcessWithoutNullStreams } from 'node:child_process';
import { existsSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

export interface Ceilings {
  /** time of the processor over the child's whole life, s */
  cpuS: number;
  /** private writable memory, bytes */
  dataBytes: number;
}

/** Why a child did not answer. */
export class ChildStopped extends Error {
  constructor(
    readonly reason: 'wall-clock' | 'cpu' | 'died',
    detail: string,
  ) {
    super(detail);
  }
}

interface Waiting {
  resolve(answer: { status: number; payload: Buffer }): void;
  reject(error: Error): void;
  timer: NodeJS.Timeout;
}

const PRLIMIT = ['/usr/bin/prlimit', '/bin/prlimit'].find((path) => existsSync(path));
/** Whether the system can hold a child to ceilings of processor time and memory; elsewhere the wall clock stands alone. */
export const hasCeilings = process.platform === 'linux' && PRLIMIT !== undefined;

const NODE_FLAGS = ['--disable-proto=throw'];
const HEAD_BYTES = 5;

/**
 * A child that answers requests one after the other in length-prefixed bytes, and is killed when it overruns. It sees an
 * empty working folder, a bare environment and nothing of ours but its own program.
 */
export class LimitedChild {
  private readonly process: ChildProcessWithoutNullStreams;
  private received: Buffer[] = [];
  private receivedBytes = 0;
  private complaint = '';
  private waiting: Waiting | null = null;
  /** requests answered so far */
  answered = 0;
  ended = false;

  private constructor(
    program: string,
    ceilings: Ceilings,
    env: Record<string, string>,
    nodeFlags: readonly string[],
    private readonly folder: string,
  ) {
    const node = [process.execPath, ...NODE_FLAGS, ...nodeFlags, program];
    const limits = [`--cpu=${ceilings.cpuS}`, `--data=${ceilings.dataBytes}`, '--core=0', '--'];
    const [command, ...args] = hasCeilings && PRLIMIT ? [PRLIMIT, ...limits, ...node] : node;
    const bare = {
      HOME: folder,
      TMPDIR: folder,
      LANG: 'C',
      UV_THREADPOOL_SIZE: '1',
      VIPS_CONCURRENCY: '1',
      ...env,
    };
    this.process = spawn(command, args, { cwd: folder, env: bare, stdio: 'pipe' });
    this.process.stdout.on('data', (chunk: Buffer) => this.take(chunk));
    this.process.stderr.on('data', (chunk: Buffer) => {
      if (this.complaint.length < 2000) this.complaint += chunk.toString('utf8');
    });
    // A child that dies while it is being written to is reported once, by its end.
    this.process.stdin.on('error', () => undefined);
    this.process.on('error', (error) => this.finish(new ChildStopped('died', error.message)));
    this.process.on('close', (code, signal) => this.closed(code, signal));
    this.hold(false);
  }

  static async start(
    program: string,
    ceilings: Ceilings,
    env: Record<string, string> = {},
    nodeFlags: readonly string[] = [],
  ): Promise<LimitedChild> {
    const folder = await mkdtemp(join(tmpdir(), `umberline-child-${process.pid}-`));
    return new LimitedChild(program, ceilings, env, nodeFlags, folder);
  }

  /** Sends one request and waits for its answer; rejects with `ChildStopped` when there will be none. */
  ask(parts: Uint8Array[], wallMs: number): Promise<{ status: number; payload: Buffer }> {
    if (this.ended) return Promise.reject(new ChildStopped('died', this.complaint || 'the child had ended'));
    if (this.waiting) return Promise.reject(new Error('a child answers one request at a time'));
    return new Promise((resolve, reject) => {
      const timer = setTimeout(() => {
        this.finish(new ChildStopped('wall-clock', `no answer within ${wallMs} ms`));
        this.process.kill('SIGKILL');
      }, wallMs);
      this.waiting = { resolve, reject, timer };
      this.hold(true);
      for (const part of parts) this.process.stdin.write(part);
    });
  }

  /** Ends the child; nothing is awaited of it. */
  end(): void {
    if (!this.ended) this.process.kill('SIGKILL');
  }

  /** A child at rest keeps nobody from exiting. */
  private hold(on: boolean): void {
    for (const part of [this.process, this.process.stdin, this.process.stdout, this.process.stderr]) {
      const handle = part as unknown as { ref?(): void; unref?(): void };
      if (on) handle.ref?.();
      else handle.unref?.();
    }
  }

  private take(chunk: Buffer): void {
    this.received.push(chunk);
    this.receivedBytes += chunk.length;
    if (this.receivedBytes < HEAD_BYTES) return;
    if (this.received[0].length < HEAD_BYTES) this.received = [Buffer.concat(this.received)];
    const length = this.received[0].readUInt32BE(1);
    if (this.receivedBytes < HEAD_BYTES + length) return;
    const all = Buffer.concat(this.received);
    this.received = [];
    this.receivedBytes = 0;
    this.answered += 1;
    this.settle((waiting) =>
      waiting.resolve({ status: all[0], payload: all.subarray(HEAD_BYTES, HEAD_BYTES + length) }),
    );
  }

  private closed(code: number | null, signal: string | null): void {
    const overCpu = signal === 'SIGXCPU' || code === 152;
    this.finish(new ChildStopped(overCpu ? 'cpu' : 'died', `ended by ${signal ?? code}: ${this.complaint}`));
    void rm(this.folder, { recursive: true, force: true }).catch(() => undefined);
  }

  private finish(error: Error): void {
    this.ended = true;
    this.settle((waiting) => waiting.reject(error));
  }

  private settle(act: (waiting: Waiting) => void): void {
    const { waiting } = this;
    if (!waiting) return;
    this.waiting = null;
    clearTimeout(waiting.timer);
    this.hold(false);
    act(waiting);
  }
}
