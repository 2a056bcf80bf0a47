import type { OrderView } from '@/lib/orders/views';
import { STATE_WORDS } from '../state-words';
import { momentWords } from '../time-words';

const EVENT_WORDS: Record<string, string> = {
  submit: 'submitted it',
  take: 'took it',
  pass: 'passed the prepared file',
  'send-proof': 'sent the proof',
  approve: 'approved it',
  'approve-without-proof': 'approved it without a proof',
  'ask-for-changes': 'asked for changes',
  'prepare-again': 'had it prepared again',
  'new-artwork': 'sent new artwork',
  release: 'released it to the machine',
  recall: 'recalled the ticket',
  'on-the-machine': 'put it on the machine',
  done: 'finished it',
  spoiled: 'recorded a spoiled piece',
  'hand-over': 'handed it over',
  hold: 'put it on hold',
  resume: 'resumed it',
  cancel: 'cancelled it',
};

export const eventWords = (event: string): string => EVENT_WORDS[event] ?? event.replace(/[-.]/g, ' ');

/** Who did what, newest first. */
export function History({ history }: { history: OrderView['history'] }) {
  const newest = [...history].sort((a, b) => (a.at < b.at ? 1 : a.at > b.at ? -1 : 0));
  return (
    <ol className="flex flex-col">
      {newest.map((entry, index) => (
        <li key={`${entry.at}-${index}`} className="grid gap-x-6 border-b border-hair py-2.5 text-15 md:grid-cols-[13em_minmax(0,1fr)]">
          <span className="figure text-quiet">{momentWords(entry.at)}</span>
          <span>
            <span className="font-semibold">{entry.by}</span> {eventWords(entry.event)}
            {entry.to && entry.to !== entry.from && <span className="text-quiet">, now {STATE_WORDS[entry.to].toLowerCase()}</span>}
            {entry.words && <span className="block">{entry.words}</span>}
          </span>
        </li>
      ))}
    </ol>
  );
}
