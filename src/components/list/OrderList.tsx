import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useDeferredValue, type ReactNode } from 'react';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { EmptyState } from '../EmptyState';
import { Island } from '../Island';
import { ProblemNotice } from '../Notice';
import { Select } from '../Select';
import { SkeletonTable } from '../SkeletonTable';
import { TextField } from '../TextField';
import type { ColumnId } from './columns';
import { OrderTable } from './OrderTable';
import { Pages } from './Pages';
import type { ListQuery } from './list-address';
import { useListAddress } from './use-list-address';

export interface StateFilter {
  /** states, comma between; empty for all */
  id: string;
  name: string;
}

interface Props {
  initialSearch: string;
  /** the day it is, as the server has it */
  today: string;
  own: Partial<ListQuery>;
  filters: readonly StateFilter[];
  columns: readonly ColumnId[];
  hrefBase: string;
  empty: string;
  emptyAction?: ReactNode;
}

function Machines({
  value,
  onChange,
}: {
  value: number | undefined;
  onChange: (id: number | undefined) => void;
}) {
  const { data } = useQuery({
    queryKey: ['machines'],
    queryFn: ({ signal }) => call('GET /api/machines', { signal }),
  });
  const machines = data?.machines.filter((m) => !m.retired) ?? [];
  return (
    <Select
      label="Machine"
      value={value === undefined ? 'any' : String(value)}
      onChange={(id) => onChange(id === 'any' ? undefined : Number(id))}
      choices={[
        { id: 'any', name: 'Any machine' },
        ...machines.map((m) => ({ id: String(m.id), name: m.name })),
      ]}
    />
  );
}

function List({ initialSearch, today, own, filters, columns, hrefBase, empty, emptyAction }: Props) {
  const { query, go, change } = useListAddress(initialSearch, own);
  const asked = useDeferredValue(query);
  const { data, error, isPending, refetch } = useQuery({
    queryKey: ['orders', asked],
    queryFn: ({ signal }) => call('GET /api/orders', { query: asked, signal }),
    placeholderData: keepPreviousData,
    refetchInterval: 30_000,
  });
  const narrowed = query.q !== '' || query.state !== (own.state ?? '') || query.machineId !== undefined;
  return (
    <div className="flex flex-col gap-6">
      <form
        role="search"
        className="grid items-end gap-4 md:grid-cols-[minmax(0,2fr)_minmax(0,1fr)_minmax(0,1fr)]"
        onSubmit={(event) => event.preventDefault()}
      >
        <TextField
          label="Search"
          type="search"
          value={query.q}
          onChange={(q) => change({ q: q.slice(0, 100) }, 'replace')}
          placeholder="Number, title or name"
        />
        <Select
          label="Show"
          value={filters.some((f) => f.id === query.state) ? query.state || 'all' : null}
          onChange={(id) => change({ state: id === 'all' ? '' : id })}
          choices={filters.map((f) => ({ id: f.id || 'all', name: f.name }))}
          placeholder="Some states"
        />
        <Machines value={query.machineId} onChange={(machineId) => change({ machineId })} />
      </form>
      {error && (
        <ProblemNotice problem={problemOf(error)}>
          <Button onPress={() => void refetch()}>Try again</Button>
        </ProblemNotice>
      )}
      {isPending && !error && <SkeletonTable columns={columns.length} words="Fetching orders" />}
      {data && data.rows.length > 0 && (
        <OrderTable
          rows={data.rows}
          columns={columns}
          query={query}
          onQuery={go}
          hrefBase={hrefBase}
          today={today}
        />
      )}
      {data && data.rows.length === 0 && (
        <EmptyState words={narrowed ? 'No order fits this search.' : empty}>
          {narrowed ? (
            <Button
              onPress={() => go({ ...query, q: '', machineId: undefined, state: own.state ?? '', page: 1 })}
            >
              Show all of the list
            </Button>
          ) : (
            emptyAction
          )}
        </EmptyState>
      )}
      {data && data.total > 0 && (
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

/** Orders as a ledger: searched, filtered, sorted and turned page by page, all in the address. */
export function OrderList(props: Props) {
  return (
    <Island>
      <List {...props} />
    </Island>
  );
}
