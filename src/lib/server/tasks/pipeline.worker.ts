import type { MessagePort } from 'node:worker_threads';
import { ingest } from '../../prepare/ingest/ingest';
import { checkArtwork, prepareArtwork, type CheckSettings } from '../../prepare/pipeline';
import type { Settings } from '../../prepare/settings';
import { ArtworkError } from '../../prepare/tools';
import { nodeTools } from '../../../rendering/node-tools';

/** What a thread is asked. */
export type Work =
  | { kind: 'read'; bytes: Uint8Array }
  | { kind: 'check'; bytes: Uint8Array; settings: CheckSettings; port: MessagePort }
  | { kind: 'prepare'; bytes: Uint8Array; settings: Settings; artworkVersion: number; port: MessagePort };

/** An error loses its class between threads, so trouble with artwork travels as data. */
export type Answer<T> = { ok: true; value: T } | { ok: false; code: ArtworkError['code']; message: string };

const tools = nodeTools();

const stageTo =
  (port: MessagePort) =>
  (stage: string, progress: number): void =>
    port.postMessage([stage, progress]);

async function answer(work: Work): Promise<unknown> {
  switch (work.kind) {
    case 'read':
      return { format: (await ingest(work.bytes, tools)).facts.format };
    case 'check':
      return checkArtwork(work.bytes, work.settings, tools, stageTo(work.port));
    case 'prepare': {
      const request = { settings: work.settings, artworkVersion: work.artworkVersion };
      return prepareArtwork(work.bytes, request, tools, stageTo(work.port));
    }
  }
}

export default async function run(work: Work): Promise<Answer<unknown>> {
  try {
    return { ok: true, value: await answer(work) };
  } catch (error) {
    if (error instanceof ArtworkError) return { ok: false, code: error.code, message: error.message };
    throw error;
  }
}
