import { Controller, useFormContext } from 'react-hook-form';
import { DATUMS } from '@/lib/orders/order';
import { LengthField, type LengthUnit } from '../LengthField';
import { RadioCards } from '../RadioCards';
import { Select } from '../Select';
import { TextField } from '../TextField';
import type { DraftForm } from './draft-form';
import { DatumDrawing } from './drawings';

const NAMES = {
  'top-left': 'Top left',
  'top-right': 'Top right',
  'bottom-left': 'Bottom left',
  'bottom-right': 'Bottom right',
  centre: 'Centre',
} as const;
const CHOICES = DATUMS.map((id) => ({ id, name: NAMES[id], drawing: <DatumDrawing datum={id} /> }));
const TURNS = [
  { id: '0', name: 'As it is' },
  { id: '1', name: 'A quarter turn clockwise' },
  { id: '2', name: 'Upside down' },
  { id: '3', name: 'A quarter turn anticlockwise' },
] as const;

/** Where the artwork lies on the blank: two distances from a corner or the centre. */
export function PlacementFields({ unit }: { unit: LengthUnit }) {
  const { control } = useFormContext<DraftForm>();
  return (
    <>
      <div className="pt-4">
        <h3>Placement</h3>
        <p className="text-15 text-quiet">
          The same corner or centre of blank and artwork, and how far they lie apart.
        </p>
      </div>
      <Controller
        control={control}
        name="placement.datum"
        render={({ field }) => (
          <RadioCards
            label="Measured from"
            choices={CHOICES}
            value={field.value}
            onChange={field.onChange}
            columns={5}
            small
          />
        )}
      />
      <LengthPair unit={unit} />
      <Controller
        control={control}
        name="placement.quarterTurns"
        render={({ field }) => (
          <Select
            label="Turned"
            choices={TURNS}
            value={String(field.value)}
            onChange={(id) => field.onChange(Number(id))}
          />
        )}
      />
      <Controller
        control={control}
        name="placement.fixture"
        render={({ field }) => (
          <TextField
            label="How it is held, if that matters"
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            maxLength={200}
          />
        )}
      />
    </>
  );
}

function LengthPair({ unit }: { unit: LengthUnit }) {
  const { control } = useFormContext<DraftForm>();
  return (
    <div className="grid grid-cols-2 gap-4">
      <Controller
        control={control}
        name="placement.xMm"
        render={({ field }) => (
          <LengthField
            label="To the right"
            unit={unit}
            minMm={-3000}
            maxMm={3000}
            valueMm={field.value}
            onChangeMm={(mm) => field.onChange(mm ?? 0)}
          />
        )}
      />
      <Controller
        control={control}
        name="placement.yMm"
        render={({ field }) => (
          <LengthField
            label="Down"
            unit={unit}
            minMm={-3000}
            maxMm={3000}
            valueMm={field.value}
            onChangeMm={(mm) => field.onChange(mm ?? 0)}
          />
        )}
      />
    </div>
  );
}
