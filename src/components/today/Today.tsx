import { useQuery } from '@tanstack/react-query';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { EmptyState } from '../EmptyState';
import { Island } from '../Island';
import { Due, Thumbnail } from '../list/columns';
import { ProblemNotice } from '../Notice';
import { SkeletonTable } from '../SkeletonTable';
import { STATE_WORDS } from '../state-words';
import { durationWords } from '../time-words';
import { dayPlan, orderSeconds, type MachineDay } from './day-plan';
import { DayRule } from './DayRule';

const LIVE = { state: 'released,running', sort: 'due', perPage: 100 } as const;

function MachinePart({ day, today }: { day: MachineDay; today: string }) {
  return (
    <section aria-label={day.machineName || 'No machine'} className="flex flex-col gap-3">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h2>{day.machineName || 'No machine named'}</h2>
        <p className="text-15 text-quiet">
          {day.rows.length} {day.rows.length === 1 ? 'order' : 'orders'}, {day.isLeast ? 'at least ' : ''}
          {durationWords(day.seconds)} of scanning
        </p>
      </div>
      <DayRule day={day} />
      <ol className="flex flex-col">
        {day.rows.map((row) => {
          const seconds = orderSeconds(row);
          return (
            <li key={row.number} className="border-b border-hair">
              <a
                href={`/tickets/${row.number}`}
                className="grid min-h-target grid-cols-[60px_minmax(0,1fr)_auto] items-center gap-4 py-3 text-15"
              >
                <Thumbnail row={row} />
                <span className="min-w-0">
                  <span className="link figure font-semibold">{row.number}</span>{' '}
                  <span className="break-words">{row.title || 'Without a title'}</span>
                  <span className="block text-13 text-quiet">
                    {row.state === 'running' && (
                      <span className="font-semibold text-ink">{STATE_WORDS.running}. </span>
                    )}
                    {row.quantity.toLocaleString('en-GB')} {row.quantity === 1 ? 'piece' : 'pieces'},{' '}
                    {row.stockName || 'stock not named'}
                    {seconds !== null && `, ${durationWords(seconds)}`}
                  </span>
                </span>
                <span className="text-right">
                  <Due row={row} today={today} />
                </span>
              </a>
            </li>
          );
        })}
      </ol>
    </section>
  );
}

function Plan({ today }: { today: string }) {
  const { data, error, isPending, refetch } = useQuery({
    queryKey: ['orders', LIVE],
    queryFn: ({ signal }) => call('GET /api/orders', { query: LIVE, signal }),
    refetchInterval: 20_000,
  });
  if (error) {
    return (
      <ProblemNotice problem={problemOf(error)}>
        <Button onPress={() => void refetch()}>Try again</Button>
      </ProblemNotice>
    );
  }
  if (isPending) return <SkeletonTable columns={3} words="Fetching the tickets" />;
  const days = dayPlan(data.rows);
  if (days.length === 0)
    return <EmptyState words="Nothing to run. A ticket appears here once a designer has released it." />;
  return (
    <div className="flex flex-col gap-16">
      {days.map((day) => (
        <MachinePart key={day.machineName} day={day} today={today} />
      ))}
      {data.total > data.rows.length && (
        <p className="text-quiet">
          The {data.rows.length} most urgent of {data.total.toLocaleString('en-GB')}.
        </p>
      )}
    </div>
  );
}

/** What to run next, by machine and due date. */
export function Today(props: { today: string }) {
  return (
    <Island>
      <Plan {...props} />
    </Island>
  );
}
