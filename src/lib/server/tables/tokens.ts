import type { Db } from '../db';

export type TokenKind = 'confirm' | 'invitation' | 'reset';

interface TokenRow {
  hash: string;
  kind: TokenKind;
  person_id: number;
  expires_at: string;
  created_at: string;
  used_at: string | null;
}

export async function insertToken(db: Db, token: Omit<TokenRow, 'used_at'>): Promise<void> {
  await db('tokens').insert(token);
}

/** Spends a token: the person it was made for, or null when it is unknown, used, replaced or too old. */
export async function spendToken(db: Db, kind: TokenKind, hash: string, now: string): Promise<number | null> {
  const spent = await db<TokenRow>('tokens')
    .where({ hash, kind })
    .whereNull('used_at')
    .where('expires_at', '>', now)
    .update({ used_at: now });
  if (spent === 0) return null;
  const row = await db<TokenRow>('tokens').where({ hash }).first();
  return row?.person_id ?? null;
}

/** Makes every open token of a kind worthless, so that only the newest link works. */
export async function dropTokens(db: Db, personId: number, kind: TokenKind): Promise<void> {
  await db('tokens').where({ person_id: personId, kind }).whereNull('used_at').delete();
}

export async function hasOpenToken(db: Db, personId: number, kind: TokenKind, now: string): Promise<boolean> {
  const found = await db('tokens')
    .where({ person_id: personId, kind })
    .whereNull('used_at')
    .where('expires_at', '>', now)
    .first('hash');
  return found !== undefined;
}

export async function dropExpiredTokens(db: Db, now: string): Promise<void> {
  await db('tokens').where('expires_at', '<', now).delete();
}
