import type { Manifest } from '../../prepare/manifest';
import type { PassagePicture, Report } from '../../prepare/report';
import type { Settings } from '../../prepare/settings';
import type { Design } from '../../orders/views';
import type { Db } from '../db';

export interface PreparationRow {
  id: number;
  order_id: number;
  artwork_id: number;
  key: string;
  design: string;
  settings: string;
  started_by: number;
  started_at: string;
  finished_at: string | null;
  manifest: string | null;
  manifest_sha256: string | null;
  report: string | null;
  pictures: string;
  timings: string;
  total_seconds: number | null;
}

export interface PreparedFileRow {
  preparation_id: number;
  name: string;
  role: 'raster' | 'linework';
  media_type: string;
  bytes: number;
  sha256: string;
}

export async function insertPreparation(
  db: Db,
  made: {
    orderId: number;
    artworkId: number;
    key: string;
    design: Design;
    settings: Settings;
    startedBy: number;
  },
): Promise<number> {
  const [row] = await db('preparations')
    .insert({
      order_id: made.orderId,
      artwork_id: made.artworkId,
      key: made.key,
      design: JSON.stringify(made.design),
      settings: JSON.stringify(made.settings),
      started_by: made.startedBy,
      started_at: new Date().toISOString(),
    })
    .returning<{ id: number }[]>('id');
  return row.id;
}

export async function preparationByKey(
  db: Db,
  orderId: number,
  key: string,
): Promise<PreparationRow | undefined> {
  return db<PreparationRow>('preparations').where({ order_id: orderId, key }).first();
}

export async function preparationById(db: Db, id: number): Promise<PreparationRow | undefined> {
  return db<PreparationRow>('preparations').where({ id }).first();
}

export interface ListedPreparation extends PreparationRow {
  starter: string;
  artwork_version: number;
}

/** Preparations of an order, newest first. */
export async function preparationsOfOrder(db: Db, orderId: number): Promise<ListedPreparation[]> {
  return db('preparations as p')
    .join('people as s', 's.id', 'p.started_by')
    .join('artworks as a', 'a.id', 'p.artwork_id')
    .where('p.order_id', orderId)
    .orderBy('p.id', 'desc')
    .select('p.*', { starter: 's.name', artwork_version: 'a.version' });
}

export async function preparedFilesOfOrder(db: Db, orderId: number): Promise<PreparedFileRow[]> {
  return db('prepared_files as f')
    .join('preparations as p', 'p.id', 'f.preparation_id')
    .where('p.order_id', orderId)
    .orderBy('f.name')
    .select('f.*');
}

export async function preparedFile(
  db: Db,
  preparationId: number,
  name: string,
): Promise<PreparedFileRow | undefined> {
  return db<PreparedFileRow>('prepared_files').where({ preparation_id: preparationId, name }).first();
}

export interface Finished {
  manifest: Manifest;
  manifestSha256: string;
  report: Report;
  pictures: Partial<Record<PassagePicture, string>>;
  timings: Record<string, number>;
}

/** Writes the result once; a finished preparation is never overwritten. */
export async function finishPreparation(db: Db, id: number, result: Finished): Promise<void> {
  const finished = await db('preparations')
    .where({ id })
    .whereNull('finished_at')
    .update({
      finished_at: new Date().toISOString(),
      manifest: JSON.stringify(result.manifest),
      manifest_sha256: result.manifestSha256,
      report: JSON.stringify(result.report),
      pictures: JSON.stringify(result.pictures),
      timings: JSON.stringify(result.timings),
      total_seconds: result.report.totalSeconds,
    });
  if (finished !== 1) return;
  const files = result.manifest.files.map(({ name, role, mediaType, bytes, sha256 }) => ({
    preparation_id: id,
    name,
    role,
    media_type: mediaType,
    bytes,
    sha256,
  }));
  await db('prepared_files').insert(files);
}
