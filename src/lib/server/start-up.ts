import { deliverSoon } from './mail/deliver';
import { introduceFirstAdmin } from './usecases/introduce-first-admin';

const slot = globalThis as typeof globalThis & { umberlineStarted?: Promise<void> };

async function start(): Promise<void> {
  await introduceFirstAdmin();
  deliverSoon();
}

/** What the server does once, before it answers its first request. */
export function startUp(): Promise<void> {
  return (slot.umberlineStarted ??= start());
}
