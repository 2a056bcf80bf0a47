import { database, withWrite } from '../db';
import { log } from '../log';
import { claimMail, markMailSent, markMailTrouble, nextMailDue, type MailRow } from '../tables/mails';
import { sendByMailServer } from './mail-server';

/** After these the mail is given up; the waits between them double from half a minute to about two hours. */
const MOST_ATTEMPTS = 9;
const FIRST_WAIT_MS = 30_000;

const waitMs = (attempts: number): number => FIRST_WAIT_MS * 2 ** (attempts - 1);

async function sendOne(mail: MailRow): Promise<void> {
  try {
    await sendByMailServer(mail);
  } catch (error) {
    const problem = error instanceof Error ? error.message : String(error);
    const gaveUp = mail.attempts >= MOST_ATTEMPTS;
    log[gaveUp ? 'error' : 'warn'](
      { mail: mail.id, kind: mail.kind, attempts: mail.attempts, problem },
      'a mail did not go out',
    );
    await withWrite((trx) =>
      markMailTrouble(trx, mail.id, problem, gaveUp ? new Date().toISOString() : null),
    );
    return;
  }
  await withWrite((trx) => markMailSent(trx, mail.id, new Date().toISOString()));
}

/** Sends every mail that is due, one after the other. Taking one puts its next attempt off, so none goes out twice. */
export async function deliverDue(): Promise<void> {
  for (;;) {
    const now = Date.now();
    const mail = await withWrite((trx) =>
      claimMail(trx, new Date(now).toISOString(), (attempts) =>
        new Date(now + waitMs(attempts)).toISOString(),
      ),
    );
    if (!mail) return;
    await sendOne(mail);
  }
}

interface Delivery {
  running: Promise<void> | null;
  again: boolean;
  timer: NodeJS.Timeout | null;
}
const slot = globalThis as typeof globalThis & { umberlineDelivery?: Delivery };
const delivery = (): Delivery => (slot.umberlineDelivery ??= { running: null, again: false, timer: null });

async function wakeForNext(state: Delivery): Promise<void> {
  const due = await nextMailDue(database());
  if (due === null) return;
  if (state.timer) clearTimeout(state.timer);
  state.timer = setTimeout(deliverSoon, Math.max(1_000, Date.parse(due) - Date.now()));
  state.timer.unref();
}

async function run(state: Delivery): Promise<void> {
  try {
    do {
      state.again = false;
      await deliverDue();
    } while (state.again);
    await wakeForNext(state);
  } catch (error) {
    log.error({ err: error }, 'mails could not be delivered');
  } finally {
    state.running = null;
  }
}

/** Sends what is due in the background; called after every commit that queued a mail, and at start for what was left. */
export function deliverSoon(): void {
  const state = delivery();
  if (state.running) state.again = true;
  else state.running = run(state);
}

/** Resolves when no delivery is under way; for a clean stop and for tests. */
export async function deliveryIdle(): Promise<void> {
  while (delivery().running) await delivery().running;
}
