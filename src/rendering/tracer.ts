import { join } from 'node:path';
import { ArtworkError, type TraceOptions } from '../lib/prepare/tools';
import { ChildStopped, LimitedChild } from './limited-child';

/** Ceilings of one trace: a page of text takes about one second, a dithered megapixel eight. */
export const TRACE_LIMITS = { wallMs: 60_000, cpuS: 120, dataBytes: 1536 * 1024 * 1024 } as const;
const IDLE_MS = 1_000;
/** Young objects are many and short-lived here: more room for them saves a third of the time. */
const NODE_FLAGS = ['--max-semi-space-size=32'];

const TOO_LONG =
  'Tracing this picture takes too long: it is made of very many small pieces. ' +
  'Choose halftone for a photograph, or send the drawing itself as an SVG.';
const FAILED = 'The outlines of this picture could not be traced. Send the drawing itself as an SVG.';

/** Traces luminance pictures one after the other in a child, which is ended when it overruns or has rested. */
export class Tracer {
  private child: Promise<LimitedChild> | null = null;
  private queue: Promise<unknown> = Promise.resolve();
  private idle: NodeJS.Timeout | null = null;

  constructor(private readonly root: string) {}

  trace(grey: Uint8Array, width: number, height: number, options: TraceOptions): Promise<string> {
    if (grey.length !== width * height) {
      return Promise.reject(new RangeError(`expected ${width * height} samples of grey, got ${grey.length}`));
    }
    const turn = this.queue.then(() => this.run(grey, width, height, options));
    this.queue = turn.catch(() => undefined);
    return turn;
  }

  private async run(grey: Uint8Array, width: number, height: number, options: TraceOptions): Promise<string> {
    if (this.idle) clearTimeout(this.idle);
    const head = Buffer.alloc(32);
    head.writeUInt32BE(width, 0);
    head.writeUInt32BE(height, 4);
    head.writeUInt32BE(Math.max(0, Math.round(options.smallestIslandPx)), 8);
    head.writeDoubleBE(options.cornerThreshold, 12);
    head.writeDoubleBE(options.curveTolerancePx, 20);
    head.writeUInt32BE(grey.length, 28);
    try {
      return await this.ask([head, grey]);
    } finally {
      this.idle = setTimeout(() => void this.dismiss(), IDLE_MS);
      this.idle.unref();
    }
  }

  private async ask(parts: Uint8Array[]): Promise<string> {
    this.child ??= LimitedChild.start(
      join(this.root, 'src', 'tracing', 'trace-child.mjs'),
      TRACE_LIMITS,
      {},
      NODE_FLAGS,
    );
    const child = await this.child;
    const before = child.answered;
    try {
      const { status, payload } = await child.ask(parts, TRACE_LIMITS.wallMs);
      const text = payload.toString('utf8');
      if (status !== 0) throw new ArtworkError('unreadable', FAILED, { cause: new Error(text) });
      return text;
    } catch (error) {
      if (!(error instanceof ChildStopped)) throw error;
      this.child = null;
      // Processor time is counted over a child's life: a picture that found it used up gets a fresh one.
      if (error.reason !== 'wall-clock' && before > 0) return this.ask(parts);
      throw new ArtworkError('too-slow', TOO_LONG, { cause: error });
    }
  }

  private async dismiss(): Promise<void> {
    const { child } = this;
    this.child = null;
    this.idle = null;
    if (child) (await child).end();
  }
}
