/**
 * What the pipeline needs from outside itself: work that runs in a process of its own. Handed in by the command line and
 * by the server, so that the pipeline stays free of files, clocks and processes.
 */
export interface PipelineTools {
  /**
   * Draws a sanitised SVG in a killable child at exactly the asked pixels.
   * @param svg UTF-8 bytes of the SVG
   * @returns RGBA, 8 bit, row-major, not premultiplied, widthPx × heightPx × 4 bytes; transparent = not engraved
   * @throws ArtworkError when it takes too long, needs too much or cannot be drawn
   */
  renderSvg(svg: Uint8Array, request: SvgRenderRequest): Promise<Uint8Array>;
  /**
   * Traces a luminance picture in a process of its own.
   * @param grey 8-bit luminance, row-major, width × height; below 128 is inside
   * @returns SVG path data in pixels, closed subpaths
   */
  traceGrey(grey: Uint8Array, width: number, height: number, options: TraceOptions): Promise<string>;
  /** Hexadecimal SHA-256 of bytes. */
  sha256(bytes: Uint8Array | string): string;
  /** Milliseconds on a steady clock; only for timings that stay outside the manifest. */
  now(): number;
}

export interface SvgRenderRequest {
  widthPx: number;
  heightPx: number;
  /** part of the drawing to render, in fractions 0–1 of its width and height; whole drawing when absent */
  part?: { left: number; top: number; width: number; height: number };
}

export interface TraceOptions {
  /** islands of up to this many pixels are dropped, potrace's turdsize */
  smallestIslandPx: number;
  /** corner threshold, 0 polygon to 1.334 no corners, potrace's alphamax */
  cornerThreshold: number;
  /** curve optimisation tolerance, px, potrace's opttolerance */
  curveTolerancePx: number;
}

/** Trouble with the artwork that a person must be told: what happened, why, what to do. */
export class ArtworkError extends Error {
  override readonly name = 'ArtworkError';
  constructor(
    readonly code:
      | 'unreadable'
      | 'truncated'
      | 'unsupported-format'
      | 'too-large'
      | 'too-complex'
      | 'too-slow'
      | 'empty-file'
      | 'unknown-size',
    /** one plain sentence or two, shown as it stands */
    message: string,
    options?: { cause?: unknown },
  ) {
    super(message, options);
  }
}

/** Limits on what is read at all, checked before decoding. */
export const LIMITS = {
  maxBytes: 64 * 1024 * 1024,
  maxPixels: 50_000_000,
  maxSvgBytes: 5 * 1024 * 1024,
  maxSvgElements: 50_000,
  maxSvgDepth: 200,
  maxSvgReferences: 2_000,
  maxSvgTextLength: 20_000,
  renderMs: 8_000,
  renderCpuS: 8,
  renderDataBytes: 512 * 1024 * 1024,
} as const;
