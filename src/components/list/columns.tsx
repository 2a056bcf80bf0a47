import {
  createColumnHelper,
  rowPaginationFeature,
  rowSortingFeature,
  tableFeatures,
} from '@tanstack/react-table';
import type { OrderRow } from '@/lib/orders/views';
import { SeverityMark } from '../SeverityMark';
import { STATE_WORDS } from '../state-words';
import { dayWords, dueWords, durationWords } from '../time-words';
import type { ListQuery } from './list-address';

export const features = tableFeatures({ rowSortingFeature, rowPaginationFeature });
const column = createColumnHelper<typeof features, OrderRow>();

/** How the findings of an order stand: marks with counts, nothing where there is nothing open. */
export function FindingCounts({ row }: { row: OrderRow }) {
  if (row.blockers === 0 && row.warnings === 0) return <span className="text-quiet">none open</span>;
  return (
    <span className="inline-flex flex-wrap items-center gap-x-3">
      {row.blockers > 0 && (
        <span className="inline-flex items-center gap-1.5 text-stop">
          <SeverityMark severity="blocker" wordless />
          {row.blockers} {row.blockers === 1 ? 'blocker' : 'blockers'}
        </span>
      )}
      {row.warnings > 0 && (
        <span className="inline-flex items-center gap-1.5 text-warning">
          <SeverityMark severity="warning" wordless />
          {row.warnings} {row.warnings === 1 ? 'warning' : 'warnings'}
        </span>
      )}
    </span>
  );
}

/** A due date and how far it is; on one line where `inline`. */
export function Due({ row, today, inline = false }: { row: OrderRow; today: string; inline?: boolean }) {
  if (row.dueOn === null) return <span className="text-quiet">no date</span>;
  const words = dueWords(row.dueOn, today);
  const open = row.state !== 'finished' && row.state !== 'handed-over' && row.state !== 'cancelled';
  const late = open && words.endsWith('late');
  return (
    <span className="figure">
      {dayWords(row.dueOn)}
      {open && inline && ', '}
      {open && (
        <span
          className={`text-13 ${inline ? '' : 'block'} ${late ? 'font-semibold text-stop' : 'text-quiet'}`}
        >
          {words}
        </span>
      )}
    </span>
  );
}

export function Thumbnail({ row }: { row: OrderRow }) {
  return (
    <span className="flex h-[44px] w-[60px] flex-none items-center justify-center bg-well p-1">
      {row.pictureUrl && (
        <img src={row.pictureUrl} alt="" loading="lazy" className="max-h-full max-w-full object-contain" />
      )}
    </span>
  );
}

export const COLUMN_IDS = [
  'number',
  'title',
  'customer',
  'state',
  'findings',
  'machine',
  'stock',
  'quantity',
  'time',
  'due',
  'updated',
] as const;
export type ColumnId = (typeof COLUMN_IDS)[number];

/** Columns that the server can sort by, and what it calls that. */
export const SORTS: Partial<Record<ColumnId, ListQuery['sort']>> = {
  number: 'number',
  customer: 'customer',
  state: 'state',
  due: 'due',
  updated: 'updated',
};

/** All columns an order list can have, in reading order; a page names those that it shows. */
export function orderColumns(hrefBase: string, today: string) {
  return column.columns([
    column.accessor('number', {
      id: 'number',
      header: 'Order',
      cell: ({ row }) => (
        <a href={`${hrefBase}/${row.original.number}`} className="link figure font-semibold">
          {row.original.number}
        </a>
      ),
    }),
    column.accessor('title', {
      id: 'title',
      header: 'Title',
      cell: ({ row }) => (
        <span className="flex items-center gap-3">
          <Thumbnail row={row.original} />
          <span className="min-w-0 break-words">{row.original.title || 'Without a title'}</span>
        </span>
      ),
    }),
    column.accessor('customerName', {
      id: 'customer',
      header: 'Customer',
      cell: ({ getValue }) => getValue(),
    }),
    column.accessor('state', {
      id: 'state',
      header: 'State',
      cell: ({ getValue }) => STATE_WORDS[getValue()],
    }),
    column.accessor('blockers', {
      id: 'findings',
      header: 'Findings',
      cell: ({ row }) => <FindingCounts row={row.original} />,
    }),
    column.accessor('machineName', {
      id: 'machine',
      header: 'Machine',
      cell: ({ getValue }) => getValue() || <span className="text-quiet">not chosen</span>,
    }),
    column.accessor('stockName', {
      id: 'stock',
      header: 'Stock',
      cell: ({ getValue }) => getValue() || <span className="text-quiet">not named</span>,
    }),
    column.accessor('quantity', {
      id: 'quantity',
      header: 'Pieces',
      cell: ({ getValue }) => getValue().toLocaleString('en-GB'),
    }),
    column.accessor('scanSeconds', {
      id: 'time',
      header: 'Time a piece',
      cell: ({ getValue }) => {
        const seconds = getValue();
        return seconds === null ? (
          <span className="text-quiet">not known</span>
        ) : (
          <span className="figure">{durationWords(seconds)}</span>
        );
      },
    }),
    column.accessor('dueOn', {
      id: 'due',
      header: 'Due',
      cell: ({ row }) => <Due row={row.original} today={today} />,
    }),
    column.accessor('updatedAt', {
      id: 'updated',
      header: 'Last change',
      cell: ({ getValue }) => <span className="figure">{dayWords(getValue())}</span>,
    }),
  ]);
}
