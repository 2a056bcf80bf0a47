import { useQueries, useQuery } from '@tanstack/react-query';
import type { OrderRow } from '@/lib/orders/views';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { EmptyState } from '../EmptyState';
import { Island } from '../Island';
import { Thumbnail } from '../list/columns';
import { Pages } from '../list/Pages';
import { useListAddress } from '../list/use-list-address';
import { ProblemNotice } from '../Notice';
import { SkeletonTable } from '../SkeletonTable';
import { STATE_WORDS } from '../state-words';
import { TextField } from '../TextField';
import { orderKey } from '../use-order';
import { OutcomeWords } from './Outcomes';

const OWN = {
  state: 'running,finished,handed-over,released',
  sort: 'updated',
  order: 'down',
  perPage: 10,
} as const;

/** Orders with what came out of them. The list gives the orders; each is asked for what was recorded. */
function useRecorded(rows: readonly OrderRow[]) {
  const answers = useQueries({
    queries: rows.map((row) => ({
      queryKey: orderKey(row.number),
      queryFn: async () => (await call('GET /api/orders/:number', { params: { number: row.number } })).order,
    })),
  });
  return rows.map((row, index) => ({ row, order: answers[index]?.data ?? null }));
}

function Entry({ row, order }: ReturnType<typeof useRecorded>[number]) {
  return (
    <li className="grid gap-x-4 border-b border-hair py-3 text-15 md:grid-cols-[60px_minmax(0,2fr)_minmax(0,3fr)]">
      <span className="max-md:hidden">
        <Thumbnail row={row} />
      </span>
      <span className="min-w-0">
        <a href={`/tickets/${row.number}`} className="link figure font-semibold">
          {row.number}
        </a>{' '}
        {row.title || 'Without a title'}
        <span className="block text-13 text-quiet">
          {STATE_WORDS[row.state]}, {row.machineName || 'no machine'}, {row.stockName || 'stock not named'}
        </span>
      </span>
      <ul className="flex min-w-0 flex-col gap-2">
        {order?.outcomes.map((outcome) => (
          <li key={`${outcome.at}${outcome.kind}`}>
            <OutcomeWords outcome={outcome} />
          </li>
        ))}
        {order && order.outcomes.length === 0 && (
          <li className="text-quiet">
            {row.state === 'running' ? 'Running. Nothing recorded yet.' : 'Nothing recorded.'}
          </li>
        )}
      </ul>
    </li>
  );
}

function Ledger({ initialSearch }: { initialSearch: string }) {
  const { query, change } = useListAddress(initialSearch, OWN);
  const { data, error, isPending, refetch } = useQuery({
    queryKey: ['orders', query],
    queryFn: ({ signal }) => call('GET /api/orders', { query, signal }),
    placeholderData: (former) => former,
  });
  const entries = useRecorded(data?.rows ?? []).filter(
    ({ row, order }) => row.state !== 'released' || (order?.outcomes.length ?? 0) > 0,
  );
  return (
    <div className="flex flex-col gap-6">
      <form role="search" className="max-w-form" onSubmit={(event) => event.preventDefault()}>
        <TextField
          label="Search"
          type="search"
          value={query.q}
          onChange={(q) => change({ q: q.slice(0, 100) }, 'replace')}
          placeholder="Number, title or name"
        />
      </form>
      {error && (
        <ProblemNotice problem={problemOf(error)}>
          <Button onPress={() => void refetch()}>Try again</Button>
        </ProblemNotice>
      )}
      {isPending && !error && <SkeletonTable columns={3} words="Fetching the outcomes" />}
      {data && entries.length === 0 && (
        <EmptyState
          words={query.q ? 'No outcome fits this search.' : 'Nothing has come off a machine yet.'}
        />
      )}
      <ul>
        {entries.map((entry) => (
          <Entry key={entry.row.number} {...entry} />
        ))}
      </ul>
      {data && data.total > data.perPage && (
        <Pages
          page={data.page}
          perPage={data.perPage}
          total={data.total}
          onPage={(page) => change({ page })}
        />
      )}
    </div>
  );
}

/** How orders came out, newest first: done or spoiled, what was seen, what was measured. */
export function OutcomeLedger(props: { initialSearch: string }) {
  return (
    <Island>
      <Ledger {...props} />
    </Island>
  );
}
