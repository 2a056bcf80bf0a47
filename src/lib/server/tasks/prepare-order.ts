import { createHash } from 'node:crypto';
import { z } from 'zod';
import type { PassagePicture } from '../../prepare/report';
import { settingsSchema } from '../../prepare/settings';
import { database } from '../db';
import { taskHandler } from '../queue/handler';
import { pipeline } from '../queue/pipeline';
import { storage } from '../storage/store';
import { artworkById } from '../tables/artworks';
import { finishPreparation, preparationById } from '../tables/preparations';

const payload = z.object({ preparationId: z.number().int().positive() });

/** Makes the prepared files of one preparation; made again, the bytes are the same. */
export const prepareOrderTask = taskHandler({
  name: 'prepare-order',
  payload,
  timeLimitMs: 5 * 60_000,
  async run({ preparationId }, context) {
    const row = await preparationById(database(), preparationId);
    const artwork = row && (await artworkById(database(), row.artwork_id));
    if (!row || !artwork) throw new Error(`expected preparation ${preparationId} with its artwork, got none`);
    const store = await storage();
    const request = {
      settings: settingsSchema.parse(JSON.parse(row.settings)),
      artworkVersion: artwork.version,
    };
    const prepared = await (await pipeline()).prepare(await store.get(artwork.sha256), request, context);
    if (prepared.key !== row.key) throw new Error(`expected the preparation ${row.key}, got ${prepared.key}`);
    for (const file of prepared.files) {
      const listed = prepared.manifest.files.find(({ name }) => name === file.name);
      const sha256 = createHash('sha256').update(file.bytes).digest('hex');
      if (listed?.sha256 !== sha256)
        throw new Error(`expected ${file.name} as the manifest lists it, got other bytes`);
      context.signal.throwIfAborted();
      await store.put(file.bytes);
    }
    const pictures: Partial<Record<PassagePicture, string>> = {};
    for (const [name, bytes] of Object.entries(prepared.pictures))
      pictures[name as PassagePicture] = await store.put(bytes);
    const { manifest, manifestSha256, report, timings } = prepared;
    return (trx) =>
      finishPreparation(trx, preparationId, { manifest, manifestSha256, report, pictures, timings });
  },
});
