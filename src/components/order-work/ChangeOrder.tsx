import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { DATUMS, type OrderPatch } from '@/lib/orders/order';
import type { OrderView } from '@/lib/orders/views';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { Dialog } from '../Dialog';
import { NumberField } from '../NumberField';
import { ProblemNotice } from '../Notice';
import { Select } from '../Select';
import { TextField } from '../TextField';
import { useOrderFields } from '../use-order';

const DATUM_NAMES = {
  'top-left': 'Top left corner',
  'top-right': 'Top right corner',
  'bottom-left': 'Bottom left corner',
  'bottom-right': 'Bottom right corner',
  centre: 'Centre',
} as const;
const CLOSED = ['running', 'finished', 'handed-over', 'cancelled'];

function useStocks() {
  const { data } = useQuery({
    queryKey: ['stocks'],
    queryFn: ({ signal }) => call('GET /api/stocks', { signal }),
  });
  return (data?.stocks ?? []).filter((stock) => !stock.retired);
}

/** Only what was changed is sent, so that what must not change after a pass is left alone. */
function patchOf(order: OrderView, draft: Draft): OrderPatch {
  const { fields } = order;
  const patch: OrderPatch = {};
  if (draft.widthMm !== fields.widthMm) patch.widthMm = draft.widthMm;
  if (draft.heightMm !== fields.heightMm) patch.heightMm = draft.heightMm;
  if ((draft.dueOn || null) !== fields.dueOn) patch.dueOn = draft.dueOn || null;
  if (draft.notes !== fields.notes) patch.notes = draft.notes;
  if (fields.blank && draft.stockId !== fields.blank.stockId)
    patch.blank = { ...fields.blank, stockId: draft.stockId };
  const placement = {
    ...fields.placement,
    datum: draft.datum,
    xMm: draft.xMm ?? 0,
    yMm: draft.yMm ?? 0,
    fixture: draft.fixture,
  };
  if (JSON.stringify(placement) !== JSON.stringify(fields.placement)) patch.placement = placement;
  return patch;
}

interface Draft {
  widthMm: number | null;
  heightMm: number | null;
  dueOn: string;
  notes: string;
  stockId: number | null;
  datum: (typeof DATUMS)[number];
  xMm: number | null;
  yMm: number | null;
  fixture: string;
}

function draftOf({ fields }: OrderView): Draft {
  const { datum, xMm, yMm, fixture } = fields.placement;
  return {
    widthMm: fields.widthMm,
    heightMm: fields.heightMm,
    dueOn: fields.dueOn ?? '',
    notes: fields.notes,
    stockId: fields.blank?.stockId ?? null,
    datum,
    xMm,
    yMm,
    fixture,
  };
}

function ChangeForm({ order, onClose }: { order: OrderView; onClose: () => void }) {
  const [draft, setDraft] = useState(() => draftOf(order));
  const change = useOrderFields(order);
  const stocks = useStocks();
  const set = (part: Partial<Draft>) => setDraft((known) => ({ ...known, ...part }));
  const aspect =
    order.fields.widthMm && order.fields.heightMm ? order.fields.widthMm / order.fields.heightMm : null;
  const setWidth = (widthMm: number | null) =>
    set({ widthMm, heightMm: aspect && widthMm ? Number((widthMm / aspect).toFixed(2)) : draft.heightMm });
  const submit = () => {
    const patch = patchOf(order, draft);
    if (Object.keys(patch).length === 0) return onClose();
    change.mutate(patch, { onSuccess: onClose });
  };
  return (
    <form
      className="flex flex-col gap-4"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <div className="grid grid-cols-2 items-start gap-4">
        <NumberField
          label="Width"
          unit="mm"
          minValue={1}
          maxValue={3000}
          value={draft.widthMm}
          onChange={setWidth}
          why="The height follows."
        />
        <NumberField
          label="Height"
          unit="mm"
          minValue={1}
          maxValue={3000}
          value={draft.heightMm}
          onChange={(heightMm) => set({ heightMm })}
        />
      </div>
      {order.fields.blank && (
        <Select
          label="Stock of the blank"
          value={draft.stockId === null ? 'unknown' : String(draft.stockId)}
          onChange={(id) => set({ stockId: id === 'unknown' ? null : Number(id) })}
          choices={[
            { id: 'unknown', name: 'Not identified' },
            ...stocks.map((stock) => ({ id: String(stock.id), name: stock.name })),
          ]}
        />
      )}
      <Select
        label="Placed from"
        value={draft.datum}
        onChange={(id) => set({ datum: DATUMS.find((d) => d === id) ?? 'centre' })}
        choices={DATUMS.map((id) => ({ id, name: DATUM_NAMES[id] }))}
      />
      <div className="grid grid-cols-2 items-start gap-4">
        <NumberField
          label="To the right"
          unit="mm"
          minValue={-3000}
          maxValue={3000}
          value={draft.xMm}
          onChange={(xMm) => set({ xMm })}
        />
        <NumberField
          label="Down"
          unit="mm"
          minValue={-3000}
          maxValue={3000}
          value={draft.yMm}
          onChange={(yMm) => set({ yMm })}
        />
      </div>
      <TextField
        label="Fixture"
        value={draft.fixture}
        onChange={(fixture) => set({ fixture })}
        maxLength={200}
        why="What holds the blank."
      />
      <TextField label="Due" type="date" value={draft.dueOn} onChange={(dueOn) => set({ dueOn })} />
      <TextField
        label="Notes"
        rows={3}
        value={draft.notes}
        onChange={(notes) => set({ notes })}
        maxLength={2000}
      />
      {change.error && <ProblemNotice problem={problemOf(change.error)} />}
      <div className="flex flex-wrap gap-2">
        <Button type="submit" kind="filled" isDisabled={change.isPending}>
          Keep these changes
        </Button>
        <Button kind="text" onPress={onClose}>
          Leave it as it was
        </Button>
      </div>
    </form>
  );
}

/** Size, stock, placement and dates can be put right by a designer until the order runs. */
export function ChangeOrder({ order }: { order: OrderView }) {
  const [open, setOpen] = useState(false);
  if (CLOSED.includes(order.state)) return null;
  return (
    <div>
      <Button onPress={() => setOpen(true)}>Change size, stock or placement</Button>
      <Dialog title={`Change ${order.number}`} isOpen={open} onClose={() => setOpen(false)}>
        <ChangeForm order={order} onClose={() => setOpen(false)} />
      </Dialog>
    </div>
  );
}
