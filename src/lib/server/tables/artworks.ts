import { checkReportSchema, type CheckReport } from '../../prepare/report';
import type { Db } from '../db';

export interface ArtworkRow {
  id: number;
  order_id: number;
  version: number;
  file_name: string;
  media_type: string;
  bytes: number;
  sha256: string;
  uploaded_at: string;
  uploaded_by: number;
  check_report: string | null;
  blocker_ids: string;
  warnings: number;
  picture_sha256: string | null;
}

export const checkOf = (row: Pick<ArtworkRow, 'check_report'>): CheckReport | null =>
  row.check_report === null ? null : checkReportSchema.parse(JSON.parse(row.check_report));

export async function insertArtwork(
  db: Db,
  artwork: Pick<
    ArtworkRow,
    'order_id' | 'version' | 'file_name' | 'media_type' | 'bytes' | 'sha256' | 'uploaded_by'
  >,
): Promise<number> {
  const [row] = await db('artworks')
    .insert({ ...artwork, uploaded_at: new Date().toISOString() })
    .returning<{ id: number }[]>('id');
  return row.id;
}

export async function artworkById(db: Db, id: number): Promise<ArtworkRow | undefined> {
  return db<ArtworkRow>('artworks').where({ id }).first();
}

export async function artworkByVersion(
  db: Db,
  orderId: number,
  version: number,
): Promise<ArtworkRow | undefined> {
  return db<ArtworkRow>('artworks').where({ order_id: orderId, version }).first();
}

/** Versions of an order's artwork with the name of whoever sent them, oldest first. */
export async function artworksOfOrder(
  db: Db,
  orderId: number,
): Promise<(ArtworkRow & { uploader: string })[]> {
  return db('artworks as a')
    .join('people as p', 'p.id', 'a.uploaded_by')
    .where('a.order_id', orderId)
    .orderBy('a.version')
    .select('a.*', { uploader: 'p.name' });
}

export async function latestArtwork(db: Db, orderId: number): Promise<ArtworkRow | undefined> {
  return db<ArtworkRow>('artworks').where({ order_id: orderId }).orderBy('version', 'desc').first();
}

export async function keepCheck(
  db: Db,
  id: number,
  report: CheckReport,
  pictureSha256: string,
): Promise<void> {
  const ids = (severity: string): string[] =>
    report.findings.filter((f) => f.severity === severity).map((f) => f.id);
  await db('artworks')
    .where({ id })
    .update({
      check_report: JSON.stringify(report),
      blocker_ids: JSON.stringify(ids('blocker')),
      warnings: ids('warning').length,
      picture_sha256: pictureSha256,
    });
}
