import type { OrderView } from '@/lib/orders/views';
import { momentWords } from '../time-words';

type Outcome = OrderView['outcomes'][number];

/** One outcome in words: what came out, what was measured, what a spoiled piece cost. */
export function OutcomeWords({ outcome }: { outcome: Outcome }) {
  return (
    <>
      <span className={`font-semibold ${outcome.kind === 'done' ? 'good' : 'stop'}`}>
        {outcome.kind === 'done' ? 'Done' : 'Spoiled'}
      </span>{' '}
      by {outcome.by}, {momentWords(outcome.at)}
      {outcome.measuredLstar !== null && `, measured L* ${outcome.measuredLstar}`}
      {outcome.cost && `, cost ${outcome.cost}`}
      {outcome.words && <span className="block">{outcome.words}</span>}
    </>
  );
}

/** How an order came out so far; nothing where nothing has. */
export function Outcomes({ outcomes }: { outcomes: OrderView['outcomes'] }) {
  if (outcomes.length === 0) return null;
  return (
    <section aria-label="How it came out" className="flex flex-col gap-2 print:hidden">
      <h2>How it came out</h2>
      <ul className="flex flex-col">
        {outcomes.map((outcome) => (
          <li key={`${outcome.at}${outcome.kind}`} className="border-b border-hair py-2.5 text-15">
            <OutcomeWords outcome={outcome} />
          </li>
        ))}
      </ul>
    </section>
  );
}
