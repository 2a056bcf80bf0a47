import type { OrderView } from '@/lib/orders/views';
import { EVENT_WORDS } from './event-words';
import { timeWords } from '../words';

/** What happened to an order, newest first. */
export function History({ entries }: { entries: OrderView['history'] }) {
  const newestFirst = [...entries].sort((a, b) => b.at.localeCompare(a.at));
  return (
    <section aria-label="History" className="border-t border-hair pt-6">
      <h2 className="mb-4">History</h2>
      <ol className="flex flex-col text-15">
        {newestFirst.map((entry, index) => (
          <li
            key={`${entry.at}-${index}`}
            className="grid gap-x-6 border-b border-hair py-2 md:grid-cols-[13em_12em_1fr]"
          >
            <time dateTime={entry.at} className="text-quiet">
              {timeWords(entry.at)}
            </time>
            <span className="font-semibold">{EVENT_WORDS[entry.event] ?? sentenceCase(entry.event)}</span>
            <span className="min-w-0 break-words">{[entry.by, entry.words].filter(Boolean).join(': ')}</span>
          </li>
        ))}
      </ol>
    </section>
  );
}

const sentenceCase = (event: string): string =>
  event.charAt(0).toUpperCase() + event.slice(1).replaceAll('-', ' ');
