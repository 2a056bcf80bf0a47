import { createHash, randomBytes } from 'node:crypto';
import type { Transaction } from '../db';
import { AppError } from '../errors';
import { dropExpiredTokens, dropTokens, insertToken, spendToken, type TokenKind } from '../tables/tokens';

const HOUR_MS = 60 * 60 * 1000;
const LIFE_MS: Record<TokenKind, number> = {
  confirm: 7 * 24 * HOUR_MS,
  invitation: 7 * 24 * HOUR_MS,
  reset: HOUR_MS,
};

// A token is 192 random bits, so a plain hash hides it as well as a slow one would.
const hashOf = (token: string): string => createHash('sha256').update(token).digest('hex');

/** A new single-use token for a link; earlier ones of its kind stop working. Only its hash is kept. */
export async function makeToken(trx: Transaction, personId: number, kind: TokenKind): Promise<string> {
  const token = randomBytes(24).toString('base64url');
  const now = Date.now();
  await dropExpiredTokens(trx, new Date(now).toISOString());
  await dropTokens(trx, personId, kind);
  await insertToken(trx, {
    hash: hashOf(token),
    kind,
    person_id: personId,
    created_at: new Date(now).toISOString(),
    expires_at: new Date(now + LIFE_MS[kind]).toISOString(),
  });
  return token;
}

/** The person a token was made for; it cannot be used again. Throws `link-spent` when it is used, replaced or too old. */
export async function useToken(trx: Transaction, kind: TokenKind, token: string): Promise<number> {
  const personId = await spendToken(trx, kind, hashOf(token), new Date().toISOString());
  if (personId === null) throw new AppError('link-spent');
  return personId;
}
