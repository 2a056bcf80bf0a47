import type { ReactNode } from 'react';
import { Controller, useFormContext, useWatch } from 'react-hook-form';
import type { StockView } from '@/lib/orders/views';
import { Checkbox } from '../Checkbox';
import { LengthField, type LengthUnit } from '../LengthField';
import { RadioCards } from '../RadioCards';
import { Select } from '../Select';
import { Swatch } from '../Swatch';
import { TextField } from '../TextField';
import type { DraftForm } from './draft-form';
import { OutlineDrawing } from './drawings';
import { Part } from './Part';
import { PlacementFields } from './PlacementFields';

interface Props {
  stocks: readonly StockView[];
  unit: LengthUnit;
  /** the blank to scale */
  beside: ReactNode;
}

const UNIDENTIFIED = 'unidentified';

const SOURCES = [
  { id: 'shop', name: 'From the shop', words: 'We have it, or get it.' },
  { id: 'customer', name: 'My own piece', words: 'You bring or send it.' },
] as const;
const OUTLINES = (['rectangle', 'round', 'own'] as const).map((id) => ({
  id,
  name: { rectangle: 'Rectangle', round: 'Round', own: 'Other' }[id],
  drawing: <OutlineDrawing outline={id} />,
}));
const GRAINS = [
  { id: 'none', name: 'No grain, or it does not matter' },
  { id: '0', name: 'Grain runs along the width' },
  { id: '90', name: 'Grain runs along the height' },
] as const;

/** The piece that will be engraved: what it is made of, its outline and size, and where the artwork lies on it. */
export function BlankPart({ stocks, unit, beside }: Props) {
  const { control } = useFormContext<DraftForm>();
  const [source, outline] = useWatch({ control, name: ['blank.source', 'blank.outline'] });
  return (
    <Part title="Blank" words="The piece that will be engraved." beside={beside}>
      <Controller
        control={control}
        name="blank.source"
        render={({ field }) => (
          <RadioCards
            label="Where it comes from"
            choices={SOURCES}
            value={field.value}
            onChange={field.onChange}
            columns={2}
            small
          />
        )}
      />
      <StockChoice stocks={stocks} own={source === 'customer'} />
      <Controller
        control={control}
        name="blank.outline"
        render={({ field }) => (
          <RadioCards
            label="Outline"
            choices={OUTLINES}
            value={field.value}
            onChange={field.onChange}
            small
          />
        )}
      />
      <div className="grid grid-cols-3 gap-4">
        <Length name="blank.widthMm" label={outline === 'round' ? 'Across' : 'Width'} unit={unit} minMm={5} />
        <Length name="blank.heightMm" label={outline === 'round' ? 'Down' : 'Height'} unit={unit} minMm={5} />
        <Length name="blank.thicknessMm" label="Thickness" unit={unit} minMm={0.1} maxMm={200} />
      </div>
      <Controller
        control={control}
        name="blank.grainDeg"
        render={({ field }) => (
          <Select
            label="Grain"
            choices={GRAINS}
            value={field.value === null ? 'none' : String(field.value)}
            onChange={(id) => field.onChange(id === 'none' ? null : Number(id))}
          />
        )}
      />
      <Controller
        control={control}
        name="blank.side"
        render={({ field }) => (
          <Checkbox
            isSelected={field.value === 'back'}
            onChange={(back) => field.onChange(back ? 'back' : 'front')}
          >
            Engrave the back
          </Checkbox>
        )}
      />
      {source === 'customer' && <OwnPiece />}
      <PlacementFields unit={unit} />
    </Part>
  );
}

function StockChoice({ stocks, own }: { stocks: readonly StockView[]; own: boolean }) {
  const { control, setValue } = useFormContext<DraftForm>();
  const choose = (stockId: number | null) => {
    const thicknessMm = stocks.find((stock) => stock.id === stockId)?.thicknessMm;
    if (thicknessMm !== undefined) setValue('blank.thicknessMm', thicknessMm, { shouldDirty: true });
    return stockId;
  };
  const choices = stocks
    .filter((stock) => !stock.retired)
    .map((stock) => ({
      id: String(stock.id),
      name: stock.name,
      words: stock.forbidden
        ? 'Never engraved here'
        : [`${stock.thicknessMm} mm`, stock.finish].filter(Boolean).join(', '),
      drawing: <Swatch colour={stock.groundColour} />,
      disabled: stock.forbidden,
    }));
  const unsure = own
    ? [{ id: UNIDENTIFIED, name: 'I do not know', words: 'The order waits until the shop has looked at it.' }]
    : [];
  return (
    <Controller
      control={control}
      name="blank.stockId"
      render={({ field }) => (
        <Select
          label="Made of"
          choices={[...choices, ...unsure]}
          value={field.value !== null ? String(field.value) : own ? UNIDENTIFIED : null}
          onChange={(id) => field.onChange(choose(id === UNIDENTIFIED ? null : Number(id)))}
          why="Plastics that give off chlorine, such as PVC or vinyl, are never engraved."
          placeholder="Choose a stock"
        />
      )}
    />
  );
}

interface LengthProps {
  name: 'blank.widthMm' | 'blank.heightMm' | 'blank.thicknessMm';
  label: string;
  unit: LengthUnit;
  minMm: number;
  maxMm?: number;
}

function Length({ name, maxMm = 3000, ...props }: LengthProps) {
  const { control } = useFormContext<DraftForm>();
  return (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <LengthField {...props} maxMm={maxMm} valueMm={field.value} onChangeMm={field.onChange} />
      )}
    />
  );
}

function OwnPiece() {
  const { control } = useFormContext<DraftForm>();
  return (
    <>
      <Controller
        control={control}
        name="blank.condition"
        render={({ field }) => (
          <TextField
            label="Its condition"
            rows={2}
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            why="Finish, scratches, what was done to it before. We may keep it waiting if this is unclear."
            maxLength={500}
          />
        )}
      />
      <Controller
        control={control}
        name="blank.spare"
        render={({ field }) => (
          <Checkbox isSelected={field.value} onChange={field.onChange}>
            There is a spare piece, in case one is spoiled
          </Checkbox>
        )}
      />
    </>
  );
}
