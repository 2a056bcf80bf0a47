import { database } from '../db';
import { AppError } from '../errors';
import { findOrder } from '../orders/find-order';
import { customerSeesPreparation } from '../orders/order-view';
import { isStaff, type Person } from '../person';
import type { StorageKey } from '../storage/storage';
import { artworkByVersion, type ArtworkRow } from '../tables/artworks';
import { preparationById, preparedFile, type PreparationRow } from '../tables/preparations';

/** Something stored, with the name that it is known by. */
export interface StoredFile {
  key: StorageKey;
  fileName: string;
}

async function findArtwork(person: Person, number: string, version: number): Promise<ArtworkRow> {
  const row = await findOrder(database(), person, number);
  const artwork = await artworkByVersion(database(), row.id, version);
  if (!artwork) throw new AppError('not-found');
  return artwork;
}

export async function fetchOriginal(person: Person, number: string, version: number): Promise<StoredFile> {
  const artwork = await findArtwork(person, number, version);
  return { key: artwork.sha256, fileName: artwork.file_name };
}

export async function fetchArtworkPicture(
  person: Person,
  number: string,
  version: number,
): Promise<StoredFile> {
  const artwork = await findArtwork(person, number, version);
  if (!artwork.picture_sha256) throw new AppError('not-found');
  return { key: artwork.picture_sha256, fileName: `${number}-artwork-${version}.png` };
}

/** A preparation of this very order; a customer sees the one whose proof was sent. */
export async function findPreparation(person: Person, number: string, id: number): Promise<PreparationRow> {
  const row = await findOrder(database(), person, number);
  const preparation = await preparationById(database(), id);
  if (preparation?.order_id !== row.id) throw new AppError('not-found');
  if (!isStaff(person) && !customerSeesPreparation({ row }, id)) throw new AppError('not-found');
  return preparation;
}

export async function fetchPreparedFile(
  person: Person,
  number: string,
  id: number,
  name: string,
): Promise<StoredFile> {
  const preparation = await findPreparation(person, number, id);
  const file = await preparedFile(database(), preparation.id, name);
  if (!file) throw new AppError('not-found');
  return { key: file.sha256, fileName: file.name };
}

export async function fetchPassagePicture(
  person: Person,
  number: string,
  id: number,
  name: string,
): Promise<StoredFile> {
  const preparation = await findPreparation(person, number, id);
  const pictures = JSON.parse(preparation.pictures) as Record<string, string>;
  const key = Object.hasOwn(pictures, name) ? pictures[name] : undefined;
  if (!key) throw new AppError('not-found');
  return { key, fileName: `${number}-${id}-${name}.png` };
}
