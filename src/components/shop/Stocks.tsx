import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { StockView } from '@/lib/orders/views';
import { cautionOf } from '@/lib/stock/cautions';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { EmptyState } from '../EmptyState';
import { Island } from '../Island';
import { ProblemNotice } from '../Notice';
import { Pairs } from '../order-work/PreparationFacts';
import { SkeletonTable } from '../SkeletonTable';
import { Swatch } from '../Swatch';
import { ROUTE_WORDS } from '../words';
import { StockForm } from './StockForm';
import { WashPart } from './WashPart';

function Colours({ stock }: { stock: StockView }) {
  return (
    <span className="flex flex-wrap items-center gap-x-6 gap-y-2">
      <span className="inline-flex items-center gap-2">
        <Swatch colour={stock.groundColour} size={32} /> ground, L* {stock.groundLstar}
      </span>
      <span className="inline-flex items-center gap-2">
        <Swatch colour={stock.markColour} size={32} /> full mark, L* {stock.markLstar}
      </span>
    </span>
  );
}

function StockEntry({ stock, onChange }: { stock: StockView; onChange: () => void }) {
  const queries = useQueryClient();
  const retire = useMutation({
    mutationFn: () =>
      call('PATCH /api/stocks/:id', { params: { id: stock.id }, body: { retired: !stock.retired } }),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['stocks'] }),
  });
  const cautions = stock.cautions.map((id) => cautionOf(id, true).title.toLowerCase());
  return (
    <section aria-label={stock.name} className="flex flex-col gap-3">
      <h2>
        {stock.name}
        {stock.forbidden && <span className="stop">, forbidden</span>}
        {stock.retired && <span className="font-normal text-quiet">, retired</span>}
      </h2>
      <Pairs
        pairs={[
          ['Made of', [stock.species, `${stock.thicknessMm} mm`, stock.finish].filter(Boolean).join(', ')],
          ['Colours', <Colours key="colours" stock={stock} />],
          ['With dose', `it ${stock.direction}`],
          ['Routes', stock.routes.map((route) => ROUTE_WORDS[route]).join(', ') || 'none'],
          ['Cautions', cautions.join(', ') || 'none'],
          ...(stock.notes ? [['Notes', stock.notes] as const] : []),
        ]}
      />
      <div className="-ml-2 flex flex-wrap">
        <Button kind="text" onPress={onChange}>
          Change this stock
        </Button>
        <Button kind="text" onPress={() => retire.mutate()} isDisabled={retire.isPending}>
          {stock.retired ? 'Take it back into use' : 'Retire this stock'}
        </Button>
      </div>
      {retire.error && <ProblemNotice problem={problemOf(retire.error)} />}
    </section>
  );
}

function List() {
  const [open, setOpen] = useState<'new' | StockView | null>(null);
  const { data, error, isPending } = useQuery({
    queryKey: ['stocks'],
    queryFn: ({ signal }) => call('GET /api/stocks', { signal }),
  });
  if (error) return <ProblemNotice problem={problemOf(error)} />;
  if (isPending) return <SkeletonTable columns={2} words="Fetching the stocks" />;
  return (
    <div className="flex flex-col gap-10">
      <div>
        <Button onPress={() => setOpen('new')}>Add a stock</Button>
      </div>
      {data.stocks.length === 0 && (
        <EmptyState words="No stock yet. Add what the shop keeps on its shelves." />
      )}
      {data.stocks.map((stock) => (
        <StockEntry key={stock.id} stock={stock} onChange={() => setOpen(stock)} />
      ))}
      <WashPart />
      {open !== null && <StockForm stock={open === 'new' ? null : open} onClose={() => setOpen(null)} />}
    </div>
  );
}

/** What the shop engraves, and what it never does. */
export function Stocks() {
  return (
    <Island>
      <List />
    </Island>
  );
}
