import { randomBytes, scrypt, timingSafeEqual, type ScryptOptions } from 'node:crypto';
import { config } from '../config';

/** Cost of scrypt (RFC 7914): N = 2^ln. */
interface Cost {
  ln: number;
  r: number;
  p: number;
}
/** Unless set higher, 32 MiB and about a quarter of a second a password. */
const presentCost = (): Cost => ({ ln: config().passwordCost, r: 8, p: 3 });
const HASH_BYTES = 32;
const SALT_BYTES = 16;

function derive(password: string, salt: Buffer, { ln, r, p }: Cost, bytes: number): Promise<Buffer> {
  const options: ScryptOptions = { N: 2 ** ln, r, p, maxmem: 256 * 2 ** ln * r };
  // The same letters may be typed in composed or decomposed form.
  return new Promise((resolve, reject) => {
    scrypt(password.normalize('NFKC'), salt, bytes, options, (error, key) =>
      error ? reject(error) : resolve(key),
    );
  });
}

/** A salted hash with its cost, such as `scrypt$15$8$3$salt$hash`, so that the cost can be raised later. */
export async function hashPassword(password: string, cost: Cost = presentCost()): Promise<string> {
  const salt = randomBytes(SALT_BYTES);
  const key = await derive(password, salt, cost, HASH_BYTES);
  return ['scrypt', cost.ln, cost.r, cost.p, salt.toString('base64url'), key.toString('base64url')].join('$');
}

function parse(stored: string): { cost: Cost; salt: Buffer; key: Buffer } {
  const [scheme, ln, r, p, salt, key] = stored.split('$');
  const cost = { ln: Number(ln), r: Number(r), p: Number(p) };
  const sound =
    scheme === 'scrypt' &&
    Object.values(cost).every((part) => Number.isInteger(part) && part > 0) &&
    cost.ln <= 20;
  if (!sound || !salt || !key) throw new Error('expected a stored scrypt hash, got something else');
  return { cost, salt: Buffer.from(salt, 'base64url'), key: Buffer.from(key, 'base64url') };
}

/** Whether a password belongs to a stored hash, compared in constant time. */
export async function passwordMatches(password: string, stored: string): Promise<boolean> {
  const { cost, salt, key } = parse(stored);
  return timingSafeEqual(await derive(password, salt, cost, key.length), key);
}

/** Whether a stored hash was made at another cost than today's. */
export function needsNewHash(stored: string): boolean {
  const { cost } = parse(stored);
  const present = presentCost();
  return cost.ln !== present.ln || cost.r !== present.r || cost.p !== present.p;
}

let dummy: Promise<string> | undefined;

/** Takes as long as a real check and never matches: an unknown address must not answer faster than a known one. */
export async function pretendToCheck(password: string): Promise<false> {
  dummy ??= hashPassword(randomBytes(16).toString('hex'));
  await passwordMatches(password, await dummy);
  return false;
}
