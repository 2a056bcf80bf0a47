import { join } from 'node:path';
import { windowSvg } from '../lib/prepare/svg/window-svg';
import { ArtworkError, LIMITS, type SvgRenderRequest } from '../lib/prepare/tools';
import { ChildStopped, LimitedChild } from './limited-child';
import { shippedFontsConf } from './shipped-fonts';

/** A child that has nothing to draw for this long is ended. */
const IDLE_MS = 1_000;
/** A drawing taken in many windows may use this much more time per pixel on top of the first allowance. */
const EXTRA_MS_PER_MPX = 500;

interface Ward {
  child: Promise<LimitedChild> | null;
  queue: Promise<unknown>;
  idle: NodeJS.Timeout | null;
  spentMs: number;
  drawnPx: number;
}

const TOO_SLOW =
  'This drawing takes too long to draw: it holds an effect, a pattern or repeated parts that multiply. ' +
  'Expand effects and patterns into plain shapes, or export it as a PNG at the size you want.';
const TOO_COMPLEX =
  'This drawing needs more memory than we allow for one drawing. ' +
  'Simplify it, remove effects, or export it as a PNG at the size you want.';
const UNREADABLE = 'This SVG cannot be drawn. Open it in a drawing program and save it as a plain SVG again.';

/**
 * Draws sanitised SVGs, each in a child of its own that serves several windows of the same drawing and is killed when it
 * overruns the wall clock, the processor time or the memory. Windows of one drawing queue up; drawings do not share a child.
 */
export class SvgRenderer {
  private wards = new WeakMap<Uint8Array, Ward>();
  private fonts: Promise<string> | null = null;

  constructor(private readonly root: string) {}

  render(svg: Uint8Array, request: SvgRenderRequest): Promise<Uint8Array> {
    const pixels = request.widthPx * request.heightPx;
    if (!(pixels <= LIMITS.maxPixels)) {
      return Promise.reject(new RangeError(`expected at most ${LIMITS.maxPixels} pixels, got ${pixels}`));
    }
    const ward = this.wardOf(svg);
    const turn = ward.queue.then(() => this.draw(ward, svg, request));
    ward.queue = turn.catch(() => undefined);
    return turn;
  }

  private wardOf(svg: Uint8Array): Ward {
    let ward = this.wards.get(svg);
    if (!ward) {
      ward = { child: null, queue: Promise.resolve(), idle: null, spentMs: 0, drawnPx: 0 };
      this.wards.set(svg, ward);
    }
    return ward;
  }

  private async startChild(): Promise<LimitedChild> {
    this.fonts ??= shippedFontsConf(this.root);
    const env = { FONTCONFIG_FILE: await this.fonts };
    const ceilings = { cpuS: LIMITS.renderCpuS, dataBytes: LIMITS.renderDataBytes };
    return LimitedChild.start(join(this.root, 'src', 'rendering', 'render-child.mjs'), ceilings, env);
  }

  private async draw(ward: Ward, svg: Uint8Array, request: SvgRenderRequest): Promise<Uint8Array> {
    const pixels = request.widthPx * request.heightPx;
    ward.drawnPx += pixels;
    if (ward.spentMs > LIMITS.renderMs + (ward.drawnPx / 1e6) * EXTRA_MS_PER_MPX) {
      throw new ArtworkError('too-slow', TOO_SLOW);
    }
    if (ward.idle) clearTimeout(ward.idle);
    const body = windowSvg(svg, request);
    const head = Buffer.alloc(12);
    [request.widthPx, request.heightPx, body.length].forEach((value, index) =>
      head.writeUInt32BE(value, index * 4),
    );
    const started = performance.now();
    try {
      return await this.ask(ward, [head, body]);
    } finally {
      ward.spentMs += performance.now() - started;
      ward.idle = setTimeout(() => void this.dismiss(ward), IDLE_MS);
      ward.idle.unref();
    }
  }

  private async ask(ward: Ward, parts: Uint8Array[]): Promise<Uint8Array> {
    ward.child ??= this.startChild();
    const child = await ward.child;
    const before = child.answered;
    try {
      const { status, payload } = await child.ask(parts, LIMITS.renderMs);
      if (status !== 0) throw this.refusal(payload.toString('utf8'));
      return payload;
    } catch (error) {
      if (!(error instanceof ChildStopped)) throw error;
      ward.child = null;
      // Processor time is counted over a child's life: a window that found it used up gets a fresh one.
      if (error.reason !== 'wall-clock' && before > 0) return this.ask(ward, parts);
      const code = error.reason === 'died' ? 'too-complex' : 'too-slow';
      throw new ArtworkError(code, code === 'too-slow' ? TOO_SLOW : TOO_COMPLEX, { cause: error });
    }
  }

  private refusal(reason: string): ArtworkError {
    if (/memory|exceeds pixel limit/i.test(reason)) {
      return new ArtworkError('too-complex', TOO_COMPLEX, { cause: new Error(reason) });
    }
    return new ArtworkError('unreadable', UNREADABLE, { cause: new Error(reason) });
  }

  private async dismiss(ward: Ward): Promise<void> {
    const { child } = ward;
    ward.child = null;
    ward.idle = null;
    if (child) (await child).end();
  }
}
