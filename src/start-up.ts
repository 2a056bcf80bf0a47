import { openDemoShop } from './lib/server/demo/open-demo-shop';
import { config } from './lib/server/config';
import { log } from './lib/server/log';
import { deliverSoon } from './lib/server/mail/deliver';
import { introduceFirstAdmin } from './lib/server/usecases/introduce-first-admin';
import { startWorker } from './worker';

const slot = globalThis as typeof globalThis & { umberlineStarted?: Promise<void> };

async function start(): Promise<void> {
  try {
    await introduceFirstAdmin();
    startWorker();
    deliverSoon();
    // In the background: nobody waits for the demo shop to fill.
    void openDemoShop().catch((error: unknown) => log.error({ err: error }, 'the demo shop stayed empty'));
  } catch (error) {
    log.fatal({ err: error }, 'the server cannot start');
    if (!config().isProduction) throw error;
    console.error(`umberline: ${error instanceof Error ? error.message : String(error)}`);
    process.exit(1);
  }
}

/** What the server does once, before it answers its first request. */
export function startUp(): Promise<void> {
  return (slot.umberlineStarted ??= start());
}
