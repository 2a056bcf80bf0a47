import { FlexRender, useTable } from '@tanstack/react-table';
import { useMemo } from 'react';
import type { OrderRow } from '@/lib/orders/views';
import { STATE_WORDS } from '../state-words';
import { DropArrow } from '../DropArrow';
import { Due, features, FindingCounts, orderColumns, SORTS, Thumbnail, type ColumnId } from './columns';
import { sortedBy, type ListQuery } from './list-address';

interface Props {
  rows: OrderRow[];
  columns: readonly ColumnId[];
  query: ListQuery;
  onQuery: (query: ListQuery) => void;
  hrefBase: string;
  today: string;
}

/** Below 768 px a row is a slip of two lines. */
function Slip({ row, hrefBase, today }: { row: OrderRow; hrefBase: string; today: string }) {
  return (
    <li className="border-b border-hair">
      <a href={`${hrefBase}/${row.number}`} className="flex min-h-target items-center gap-3 py-3">
        <Thumbnail row={row} />
        <span className="min-w-0 flex-1">
          <span className="flex justify-between gap-3 text-15">
            <span className="truncate">
              <span className="font-semibold text-action">{row.number}</span> {row.title || 'Without a title'}
            </span>
          </span>
          <span className="flex flex-wrap justify-between gap-x-3 text-13 text-quiet">
            <span>
              {STATE_WORDS[row.state]} · {row.customerName}
            </span>
            <Due row={row} today={today} inline />
          </span>
          {row.blockers + row.warnings > 0 && (
            <span className="block text-13">
              <FindingCounts row={row} />
            </span>
          )}
        </span>
      </a>
    </li>
  );
}

export function OrderTable({ rows, columns, query, onQuery, hrefBase, today }: Props) {
  const all = useMemo(() => orderColumns(hrefBase, today), [hrefBase, today]);
  const shown = useMemo(() => all.filter((c) => columns.some((id) => id === c.id)), [all, columns]);
  const table = useTable({
    features,
    columns: shown,
    data: rows,
    manualSorting: true,
    manualPagination: true,
    getRowId: (row) => row.number,
  });
  return (
    <>
      <ul className="md:hidden">
        {rows.map((row) => (
          <Slip key={row.number} row={row} hrefBase={hrefBase} today={today} />
        ))}
      </ul>
      <table className="ledger hidden md:table">
        <thead>
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id}>
              {group.headers.map((header) => {
                const sort = SORTS[header.column.id as ColumnId];
                const active = sort !== undefined && query.sort === sort;
                return (
                  <th
                    key={header.id}
                    scope="col"
                    aria-sort={active ? (query.order === 'up' ? 'ascending' : 'descending') : undefined}
                  >
                    {sort ? (
                      <button
                        type="button"
                        onClick={() => onQuery(sortedBy(query, sort))}
                        className="ledger-sort"
                      >
                        <FlexRender header={header} />
                        <span
                          className={`transition-transform ${active ? '' : 'opacity-0'} ${active && query.order === 'up' ? 'rotate-180' : ''}`}
                        >
                          <DropArrow />
                        </span>
                      </button>
                    ) : (
                      <FlexRender header={header} />
                    )}
                  </th>
                );
              })}
            </tr>
          ))}
        </thead>
        <tbody>
          {table.getRowModel().rows.map((row) => (
            <tr key={row.id}>
              {row.getAllCells().map((cell) => (
                <td key={cell.id}>
                  <FlexRender cell={cell} />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}
