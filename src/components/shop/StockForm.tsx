import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { Controller, useForm, type Control } from 'react-hook-form';
import type { StockView } from '@/lib/orders/views';
import { cautionOf } from '@/lib/stock/cautions';
import { cautionIdSchema, routeSchema, stockSchema, type Stock } from '@/lib/stock/stock';
import { call } from '../api';
import { Checkbox } from '../Checkbox';
import { ROUTE_WORDS } from '../words';
import { Num, Pick, Words } from './controlled';
import { FormDialog } from './FormDialog';

const EMPTY = {
  name: '',
  species: '',
  finish: '',
  direction: 'darkens',
  groundColour: '#d9bd8f',
  markColour: '#3f2614',
  cautions: ['machine-class'],
  forbidden: false,
  routes: ['bare-burn'],
  notes: '',
} as const;

function Ticks<K extends 'cautions' | 'routes'>({
  control,
  name,
  label,
  items,
}: {
  control: Control<Stock>;
  name: K;
  label: string;
  items: readonly { id: Stock[K][number]; name: string }[];
}) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field }) => {
        const chosen = field.value as readonly string[];
        return (
          <fieldset>
            <legend className="field-label">{label}</legend>
            {items.map((item) => (
              <Checkbox
                key={item.id}
                isSelected={chosen.includes(item.id)}
                onChange={(on) =>
                  field.onChange(on ? [...chosen, item.id] : chosen.filter((id) => id !== item.id))
                }
              >
                {item.name}
              </Checkbox>
            ))}
          </fieldset>
        );
      }}
    />
  );
}

/** A stock: what it is, its two colours, the routes it takes and the cautions it needs. */
export function StockForm({ stock, onClose }: { stock: StockView | null; onClose: () => void }) {
  const queries = useQueryClient();
  const form = useForm<Stock>({
    resolver: zodResolver(stockSchema),
    defaultValues: stock ?? { ...EMPTY, cautions: [...EMPTY.cautions], routes: [...EMPTY.routes] },
  });
  const save = useMutation({
    mutationFn: (body: Stock) =>
      stock
        ? call('PATCH /api/stocks/:id', { params: { id: stock.id }, body })
        : call('POST /api/stocks', { body }),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: ['stocks'] });
      onClose();
    },
  });
  const { control } = form;
  return (
    <FormDialog
      title={stock ? stock.name : 'New stock'}
      confirm={stock ? 'Keep this stock' : 'Add this stock'}
      isBusy={save.isPending}
      error={save.error}
      onSubmit={() => void form.handleSubmit((body) => save.mutate(body))()}
      onClose={onClose}
    >
      <Words control={control} name="name" label="Name" />
      <Words control={control} name="species" label="Species or substance" />
      <div className="grid grid-cols-2 items-start gap-4">
        <Num control={control} name="thicknessMm" label="Thickness" unit="mm" minValue={0.1} maxValue={200} />
        <Words control={control} name="finish" label="Finish" />
        <Words control={control} name="groundColour" type="color" label="Ground colour" />
        <Num
          control={control}
          name="groundLstar"
          label="Ground"
          unit="L*"
          decimals={1}
          minValue={0}
          maxValue={100}
        />
        <Words control={control} name="markColour" type="color" label="Mark colour" />
        <Num
          control={control}
          name="markLstar"
          label="Full mark"
          unit="L*"
          decimals={1}
          minValue={0}
          maxValue={100}
        />
      </div>
      <Pick
        control={control}
        name="direction"
        label="With more dose it"
        choices={[
          { id: 'darkens', name: 'darkens' },
          { id: 'lightens', name: 'lightens' },
        ]}
      />
      <Ticks
        control={control}
        name="routes"
        label="Routes"
        items={routeSchema.options.map((id) => ({ id, name: ROUTE_WORDS[id] }))}
      />
      <Ticks
        control={control}
        name="cautions"
        label="Cautions"
        items={cautionIdSchema.options.map((id) => ({ id, name: cautionOf(id, true).title }))}
      />
      <Controller
        control={control}
        name="forbidden"
        render={({ field }) => (
          <Checkbox isSelected={field.value} onChange={field.onChange}>
            Forbidden: it cannot be submitted or released
          </Checkbox>
        )}
      />
      <Words control={control} name="notes" rows={3} label="Notes" />
    </FormDialog>
  );
}
