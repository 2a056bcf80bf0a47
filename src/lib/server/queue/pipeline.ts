import type { Checked, CheckSettings, Prepared } from '../../prepare/pipeline';
import type { ArtworkFacts } from '../../prepare/report';
import type { Settings } from '../../prepare/settings';
import type { TaskContext } from './handler';

export type ArtworkFormat = ArtworkFacts['format'];

/**
 * The pipeline as the server uses it: in a thread of its own, so that the site stays quick. Large bytes move to that thread
 * and are gone for the caller.
 */
export interface Pipeline {
  /** Reads artwork to see whether it can be used at all. @throws ArtworkError */
  read(bytes: Uint8Array): Promise<{ format: ArtworkFormat }>;
  /** @throws ArtworkError */
  check(bytes: Uint8Array, settings: CheckSettings, context: TaskContext): Promise<Checked>;
  /** @throws ArtworkError */
  prepare(
    bytes: Uint8Array,
    request: { settings: Settings; artworkVersion: number },
    context: TaskContext,
  ): Promise<Prepared>;
  /** Key of the preparation that such a request gives: the same request, the same key. */
  keyOf(artworkSha256: string, request: { settings: Settings; artworkVersion: number }): Promise<string>;
}

const slot = globalThis as typeof globalThis & { umberlinePipeline?: Promise<Pipeline> };

/** The shop's pipeline, started on first use. */
export function pipeline(): Promise<Pipeline> {
  return (slot.umberlinePipeline ??= import('./threads').then(({ pipelineInThreads }) =>
    pipelineInThreads(),
  ));
}

/** Puts another pipeline in its place; for tests. */
export function usePipeline(other: Pipeline | null): void {
  slot.umberlinePipeline = other ? Promise.resolve(other) : undefined;
}
