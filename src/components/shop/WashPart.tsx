import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { cautionOf } from '@/lib/stock/cautions';
import { washSchema, type Wash } from '@/lib/stock/wash';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { CautionList } from '../CautionList';
import { ProblemNotice } from '../Notice';
import { Pairs } from '../order-work/PreparationFacts';
import { Num, Words } from './controlled';
import { FormDialog } from './FormDialog';

function WashForm({ wash, onClose }: { wash: Wash | null; onClose: () => void }) {
  const queries = useQueryClient();
  const form = useForm<Wash>({
    resolver: zodResolver(washSchema),
    defaultValues: wash ?? { product: '', ratio: '', sheetUrl: '' },
  });
  const save = useMutation({
    mutationFn: (body: Wash) => call('PUT /api/wash', { body }),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: ['wash'] });
      onClose();
    },
  });
  const { control } = form;
  return (
    <FormDialog
      title="Darkening wash"
      confirm="Keep this wash"
      isBusy={save.isPending}
      error={save.error}
      onSubmit={() => void form.handleSubmit((body) => save.mutate(body))()}
      onClose={onClose}
    >
      <Words control={control} name="product" label="Product" why="As its label has it." />
      <Words control={control} name="ratio" label="Ratio" why="In the words of its sheet." />
      <Num
        control={control}
        name="dryingMinutes"
        label="Fully dry after"
        unit="min"
        decimals={0}
        minValue={1}
        maxValue={10_080}
      />
      <Words
        control={control}
        name="sheetUrl"
        type="url"
        label="Safety data sheet"
        why="Its address. Without a sheet the route is not offered."
      />
    </FormDialog>
  );
}

/** The shop's own darkening wash; without its safety data sheet no order can take that route. */
export function WashPart() {
  const [open, setOpen] = useState(false);
  const { data, error } = useQuery({
    queryKey: ['wash'],
    queryFn: ({ signal }) => call('GET /api/wash', { signal }),
  });
  const wash = data?.wash ?? null;
  return (
    <section aria-label="Darkening wash" className="flex flex-col gap-4 border-t border-hair pt-6">
      <h2>Darkening wash</h2>
      {error && <ProblemNotice problem={problemOf(error)} />}
      {data && !wash && <p>None is entered, so the route is not offered.</p>}
      {wash && (
        <Pairs
          pairs={[
            ['Product', wash.product],
            ['Ratio', wash.ratio],
            ['Fully dry after', `${wash.dryingMinutes} min`],
            [
              'Safety data sheet',
              <a key="sheet" className="link" href={wash.sheetUrl} rel="noreferrer">
                {wash.sheetUrl}
              </a>,
            ],
          ]}
        />
      )}
      <CautionList cautions={[cautionOf('darkening-wash', true)]} />
      {data && (
        <div>
          <Button onPress={() => setOpen(true)}>{wash ? 'Change the wash' : 'Enter a wash'}</Button>
        </div>
      )}
      {open && <WashForm wash={wash} onClose={() => setOpen(false)} />}
    </section>
  );
}
