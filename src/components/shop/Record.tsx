import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { call, problemOf } from '../api';
import { EmptyState } from '../EmptyState';
import { Island } from '../Island';
import { Pages } from '../list/Pages';
import { ProblemNotice } from '../Notice';
import { SkeletonTable } from '../SkeletonTable';
import { TextField } from '../TextField';
import { EVENT_WORDS } from '../order/event-words';
import { momentWords } from '../time-words';

const eventWords = (event: string): string =>
  (EVENT_WORDS[event] ?? event.replace(/[-.]/g, ' ')).toLowerCase();

function Subject({ subject }: { subject: string }) {
  if (!/^U-\d{4,8}$/.test(subject)) return <>{subject}</>;
  return (
    <a href={`/queue/${subject}`} className="link figure">
      {subject}
    </a>
  );
}

function Entries() {
  const [asked, setAsked] = useState({ q: '', page: 1 });
  const { data, error, isPending } = useQuery({
    queryKey: ['record', asked],
    queryFn: ({ signal }) => call('GET /api/record', { query: asked, signal }),
    placeholderData: keepPreviousData,
  });
  return (
    <div className="flex flex-col gap-6">
      <form role="search" className="max-w-form" onSubmit={(event) => event.preventDefault()}>
        <TextField
          label="Search"
          type="search"
          value={asked.q}
          onChange={(q) => setAsked({ q: q.slice(0, 100), page: 1 })}
          placeholder="Order, name or event"
        />
      </form>
      {error && <ProblemNotice problem={problemOf(error)} />}
      {isPending && !error && <SkeletonTable columns={4} words="Fetching the record" />}
      {data?.total === 0 && (
        <EmptyState
          words={asked.q ? 'Nothing in the record fits this search.' : 'Nothing is recorded yet.'}
        />
      )}
      <ol className="flex flex-col">
        {data?.entries.map((entry) => (
          <li
            key={entry.id}
            className="grid gap-x-6 border-b border-hair py-2.5 text-15 md:grid-cols-[13em_12em_minmax(0,1fr)]"
          >
            <span className="figure text-quiet">{momentWords(entry.at)}</span>
            <span className="break-words font-semibold">{entry.by}</span>
            <span className="min-w-0 break-words">
              {entry.subject && (
                <>
                  <Subject subject={entry.subject} />:{' '}
                </>
              )}
              {eventWords(entry.event)}
              {entry.words && <span className="block text-quiet">{entry.words}</span>}
            </span>
          </li>
        ))}
      </ol>
      {data && data.total > 0 && (
        <Pages
          page={data.page}
          perPage={data.perPage}
          total={data.total}
          onPage={(page) => setAsked({ ...asked, page })}
        />
      )}
    </div>
  );
}

/** Who did what and when, newest first. Nothing in it can be changed. */
export function Record() {
  return (
    <Island>
      <Entries />
    </Island>
  );
}
