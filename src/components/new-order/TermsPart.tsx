import { Controller, useFormContext } from 'react-hook-form';
import type { Use } from '@/lib/orders/order';
import { Checkbox } from '../Checkbox';
import { NumberField } from '../NumberField';
import { RadioCards } from '../RadioCards';
import { TextField } from '../TextField';
import type { DraftForm } from './draft-form';
import { Part } from './Part';

const USES: readonly { id: Use; name: string; words: string }[] = [
  { id: 'decoration', name: 'Decoration', words: 'Indoors, to look at.' },
  { id: 'touches-food', name: 'Touches food', words: 'Boards, cups, spoons.' },
  { id: 'for-a-child', name: 'For a child', words: 'Toys and the like.' },
  { id: 'outdoors', name: 'Outdoors', words: 'Sun, rain and frost.' },
];

/** What it is for, how many, until when. */
export function TermsPart() {
  const { control } = useFormContext<DraftForm>();
  return (
    <Part title="The order">
      <Controller
        control={control}
        name="title"
        render={({ field }) => (
          <TextField
            label="What you call it"
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            maxLength={120}
          />
        )}
      />
      <Controller
        control={control}
        name="use"
        render={({ field }) => (
          <RadioCards
            label="Use"
            choices={USES}
            value={field.value}
            onChange={field.onChange}
            columns={2}
            small
          />
        )}
      />
      <div className="grid grid-cols-2 gap-4">
        <Controller
          control={control}
          name="quantity"
          render={({ field }) => (
            <NumberField
              label="Quantity"
              decimals={0}
              minValue={1}
              maxValue={10_000}
              value={field.value}
              onChange={field.onChange}
            />
          )}
        />
        <Controller
          control={control}
          name="dueOn"
          render={({ field }) => (
            <TextField
              label="Needed by"
              type="date"
              value={field.value}
              onChange={field.onChange}
              onBlur={field.onBlur}
            />
          )}
        />
      </div>
      <Controller
        control={control}
        name="notes"
        render={({ field }) => (
          <TextField
            label="Notes for the shop"
            rows={3}
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            maxLength={2000}
          />
        )}
      />
      <Controller
        control={control}
        name="withoutProof"
        render={({ field }) => (
          <Checkbox isSelected={field.value} onChange={field.onChange}>
            Go ahead without a proof. The shop’s own sign-off then stands in for my approval.
          </Checkbox>
        )}
      />
    </Part>
  );
}
