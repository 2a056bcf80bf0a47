import { z } from 'zod';
import { checkSettingsFor } from '../../orders/settings';
import type { CheckSettings } from '../../prepare/pipeline';
import { database, type Db } from '../db';
import { taskHandler } from '../queue/handler';
import { pipeline } from '../queue/pipeline';
import { storage } from '../storage/store';
import { artworkById, keepCheck, type ArtworkRow } from '../tables/artworks';
import { allMachines } from '../tables/machines';
import { designOf, fieldsOf, orderById } from '../tables/orders';

const payload = z.object({ artworkId: z.number().int().positive() });

/** The spot of a shop that has not entered a machine yet. */
const FIRST_SPOT = { widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' } as const;

async function settingsOf(db: Db, artwork: ArtworkRow): Promise<CheckSettings> {
  const row = await orderById(db, artwork.order_id);
  if (!row) throw new Error(`expected order ${artwork.order_id}, got none`);
  const design = designOf(row);
  const machines = await allMachines(db);
  const ready = machines.filter(({ retired, spotPresets }) => !retired && spotPresets.length > 0);
  const machine = machines.find(({ id }) => id === design?.machineId) ?? ready[0] ?? null;
  const spot =
    machine?.spotPresets.find(({ id }) => id === design?.spotPresetId) ??
    machine?.spotPresets[0] ??
    FIRST_SPOT;
  return checkSettingsFor(fieldsOf(row), design, machine, spot);
}

/** Checks one version of an order's artwork at the order's size. */
export const checkArtworkTask = taskHandler({
  name: 'check-artwork',
  payload,
  timeLimitMs: 4 * 60_000,
  async run({ artworkId }, context) {
    const artwork = await artworkById(database(), artworkId);
    if (!artwork) throw new Error(`expected artwork ${artworkId}, got none`);
    const settings = await settingsOf(database(), artwork);
    const store = await storage();
    const bytes = await store.get(artwork.sha256);
    const { report, picture } = await (await pipeline()).check(bytes, settings, context);
    const pictureSha256 = await store.put(picture);
    return (trx) => keepCheck(trx, artworkId, report, pictureSha256);
  },
});
