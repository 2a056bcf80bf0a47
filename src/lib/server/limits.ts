import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { AppError } from './errors';
import type { RouteKey } from './routes';

/** Attempts allowed in a stretch of time, per socket address and per account named. */
interface Allowance {
  perAddress: number;
  perAccount: number;
  seconds: number;
}

const HOUR = 3600;

/** What is counted, and how often it may happen. Sign-in counts failures only: see `forgive`. */
export const ALLOWANCES = {
  'sign-in': { perAddress: 100, perAccount: 10, seconds: HOUR / 4 },
  'POST /api/account/register': { perAddress: 30, perAccount: 5, seconds: HOUR },
  'POST /api/account/confirm': { perAddress: 60, perAccount: 60, seconds: HOUR },
  'POST /api/account/confirmation': { perAddress: 30, perAccount: 5, seconds: HOUR },
  'POST /api/account/forgotten': { perAddress: 30, perAccount: 5, seconds: HOUR },
  'POST /api/account/reset': { perAddress: 30, perAccount: 30, seconds: HOUR },
  'POST /api/account/invitation': { perAddress: 30, perAccount: 30, seconds: HOUR },
  'PATCH /api/account': { perAddress: 100, perAccount: 20, seconds: HOUR / 4 },
  'POST /api/people/invitations': { perAddress: 200, perAccount: 60, seconds: HOUR },
  'POST /api/orders': { perAddress: 600, perAccount: 200, seconds: HOUR },
  'POST /api/orders/:number/artwork': { perAddress: 600, perAccount: 200, seconds: HOUR },
} as const satisfies Partial<Record<RouteKey | 'sign-in', Allowance>>;
export type Limited = keyof typeof ALLOWANCES;

export const isLimited = (key: string): key is Limited => key in ALLOWANCES;

interface Limiters {
  address: RateLimiterMemory;
  account: RateLimiterMemory;
}
const limiters = new Map<Limited, Limiters>();

function limitersOf(what: Limited): Limiters {
  const known = limiters.get(what);
  if (known) return known;
  const { perAddress, perAccount, seconds } = ALLOWANCES[what];
  const made = {
    address: new RateLimiterMemory({ keyPrefix: `${what} address`, points: perAddress, duration: seconds }),
    account: new RateLimiterMemory({ keyPrefix: `${what} account`, points: perAccount, duration: seconds }),
  };
  limiters.set(what, made);
  return made;
}

const accountKey = (account: string): string => account.trim().toLowerCase();

/** Counts one attempt against the address and, where there is one, the account; throws `too-many` when either is used up. */
export async function countAttempt(what: Limited, address: string, account: string | null): Promise<void> {
  const { address: byAddress, account: byAccount } = limitersOf(what);
  try {
    await byAddress.consume(address);
    if (account !== null) await byAccount.consume(accountKey(account));
  } catch (refused) {
    if (!(refused instanceof RateLimiterRes)) throw refused;
    const minutes = Math.max(1, Math.ceil(refused.msBeforeNext / 60_000));
    throw new AppError('too-many', {
      action: `Wait ${minutes} ${minutes === 1 ? 'minute' : 'minutes'} and try again.`,
    });
  }
}

/** Takes an attempt back that turned out right, so that only failures are counted. */
export async function forgive(what: Limited, address: string, account: string): Promise<void> {
  const { address: byAddress, account: byAccount } = limitersOf(what);
  await byAddress.reward(address);
  await byAccount.delete(accountKey(account));
}

/** Forgets all attempts; tests start from nothing. */
export function forgetAttempts(): void {
  limiters.clear();
}
