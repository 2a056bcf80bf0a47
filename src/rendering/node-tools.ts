import { createHash } from 'node:crypto';
import type { PipelineTools } from '../lib/prepare/tools';
import { SvgRenderer } from './svg-renderer';
import { Tracer } from './tracer';

/**
 * What the pipeline needs from outside itself, under Node: children for drawing and tracing, hashes, a steady clock.
 * @param options.root folder of the project, where the children's programs and the fonts lie; by default the working folder
 */
export function nodeTools({ root = process.cwd() }: { root?: string } = {}): PipelineTools {
  const renderer = new SvgRenderer(root);
  const tracer = new Tracer(root);
  return {
    renderSvg: (svg, request) => renderer.render(svg, request),
    traceGrey: (grey, width, height, options) => tracer.trace(grey, width, height, options),
    sha256: (bytes) => createHash('sha256').update(bytes).digest('hex'),
    now: () => performance.now(),
  };
}
