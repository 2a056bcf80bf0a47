import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { FormProvider, useForm, useWatch, type UseFormReturn } from 'react-hook-form';
import type { OrderView, StockView } from '@/lib/orders/views';
import type { Role } from '@/lib/orders/state';
import { call } from '../api';
import { Island } from '../Island';
import type { LengthUnit } from '../LengthField';
import { newestArtwork, pictureOf } from '../newest-artwork';
import { PlacementFigure } from '../PlacementFigure';
import { useOrder } from '../use-order';
import { useProgress } from '../use-progress';
import { ArtworkPart } from './ArtworkPart';
import { BlankPart } from './BlankPart';
import { CustomerChoice } from './CustomerChoice';
import { aspectOf, EMPTY_FORM, formOf, lockedSize, type DraftForm } from './draft-form';
import { LookPart } from './LookPart';
import { SizePart } from './SizePart';
import { SubmitPart } from './SubmitPart';
import { TermsPart } from './TermsPart';
import { useDraft, type Draft } from './use-draft';
import { useFileArrival } from './use-file-arrival';
import { useUpload } from './use-upload';

interface Props {
  initial: OrderView | null;
  role: Role;
  /** own address while it is not confirmed, else null */
  unconfirmedEmail: string | null;
}

export default function NewOrder(props: Props) {
  return (
    <Island>
      <Flow {...props} />
    </Island>
  );
}

/** The new order in one flow: artwork, size, blank, look, order, submit. */
function Flow({ initial, role, unconfirmedEmail }: Props) {
  const form = useForm<DraftForm>({ defaultValues: initial ? formOf(initial.fields) : EMPTY_FORM });
  const [unit, setUnit] = useState<LengthUnit>('mm');
  const [customerId, setCustomerId] = useState<number | null>(null);
  const draft = useDraft(form, initial, customerId);
  const { order } = draft;
  const task = useNews(draft).find(({ kind }) => kind === 'check') ?? null;
  const upload = useUpload(draft);
  const mustName = role !== 'customer' && order === null;
  const mayStart = !mustName || customerId !== null;
  const over = useFileArrival((file) => mayStart && upload.start(file));
  const stocks = useQuery({
    queryKey: ['stocks'],
    queryFn: async ({ signal }) => (await call('GET /api/stocks', { signal })).stocks,
  });
  const check = (order && newestArtwork(order.artworks)?.check) ?? null;
  const [widthMm, stockId, quarterTurns] = useWatch({
    control: form.control,
    name: ['widthMm', 'blank.stockId', 'placement.quarterTurns'],
  });
  const stock = stocks.data?.find(({ id }) => id === stockId) ?? null;
  const useWidth = (width: number) => {
    // The check speaks of the artwork as it lies; the form of the artwork before its quarter turns.
    const size = lockedSize(quarterTurns % 2 === 1 ? 'height' : 'width', width, aspectOf(check) ?? 1);
    form.setValue('widthMm', size.widthMm, { shouldDirty: true });
    form.setValue('heightMm', size.heightMm, { shouldDirty: true });
  };
  return (
    <FormProvider {...form}>
      <div className="flex flex-col gap-10">
        {mustName && <CustomerChoice value={customerId} onChange={setCustomerId} />}
        {over && (
          <p className="fixed inset-x-0 top-0 z-50 bg-action py-4 text-center font-semibold text-ground">
            Let go to send it
          </p>
        )}
        {mayStart && (
          <>
            <ArtworkPart
              order={order}
              upload={upload}
              take={draft.take}
              liveTask={task}
              unit={unit}
              sizeIsSaid={widthMm !== null}
              onUseWidth={useWidth}
            />
            <SizePart check={check} unit={unit} onUnit={setUnit} />
            <BlankPart
              stocks={stocks.data ?? []}
              unit={unit}
              beside={<Placed order={order} form={form} stock={stock} />}
            />
            <LookPart check={check} stock={stock} />
            <TermsPart />
            <SubmitPart draft={draft} unconfirmedEmail={unconfirmedEmail} />
          </>
        )}
      </div>
    </FormProvider>
  );
}

/** Takes what happens to the draft elsewhere: the check goes on, another tab changes it. */
function useNews({ order, take }: Draft): ReturnType<typeof useProgress> {
  const tasks = useProgress(order?.number ?? null);
  const { data } = useOrder(order?.number ?? '', order ?? undefined);
  useEffect(() => {
    if (data) take(data);
  }, [data, take]);
  return tasks;
}

interface PlacedProps {
  order: OrderView | null;
  form: UseFormReturn<DraftForm>;
  stock: StockView | null;
}

function Placed({ order, form, stock }: PlacedProps) {
  const { blank, placement, widthMm, heightMm } = useWatch({ control: form.control }) as DraftForm;
  if (blank.widthMm === null || blank.heightMm === null || widthMm === null || heightMm === null) {
    return (
      <p className="text-15 text-quiet">
        With the sizes of blank and engraving, this shows where the artwork will lie.
      </p>
    );
  }
  return (
    <PlacementFigure
      blank={{ ...blank, widthMm: blank.widthMm, heightMm: blank.heightMm }}
      placement={placement}
      artworkMm={{ widthMm, heightMm }}
      pictureUrl={order && pictureOf(newestArtwork(order.artworks))}
      groundColour={stock?.groundColour}
    />
  );
}
