import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm, type Control } from 'react-hook-form';
import { SCREEN_WORDS, TREATMENT_WORDS } from '@/lib/orders/sentence';
import { designSchema, type Design } from '@/lib/orders/views';
import { SCREEN_NAMES, treatmentSchema } from '@/lib/prepare/settings';
import { Button } from '../Button';
import { Checkbox } from '../Checkbox';
import { Dialog } from '../Dialog';
import { NumberField } from '../NumberField';
import { Select } from '../Select';
import type { ChoiceContext } from './context';
import { figuresSchema, figuresOf, designOf, type Figures } from './figures';

interface Props {
  design: Design;
  context: ChoiceContext;
  onChange: (design: Design) => void;
  onClose: () => void;
}

type FigureName = { [K in keyof Figures]: Figures[K] extends number | null ? K : never }[keyof Figures];

const FIELDS: readonly {
  name: FigureName;
  label: string;
  unit?: string;
  decimals: number;
  least: number;
  most: number;
}[] = [
  { name: 'linePitchMm', label: 'Line pitch', unit: 'mm', decimals: 3, least: 0.01, most: 2 },
  { name: 'alongPitchMm', label: 'Pixel pitch along a line', unit: 'mm', decimals: 3, least: 0.01, most: 2 },
  { name: 'directionDeg', label: 'Scan direction', unit: '°', decimals: 2, least: -180, most: 180 },
  {
    name: 'perpendicularPitchMm',
    label: 'Line pitch of the perpendicular pass, empty for none',
    unit: 'mm',
    decimals: 3,
    least: 0.01,
    most: 2,
  },
  { name: 'blackPoint', label: 'Black point, as a ratio', decimals: 3, least: 0, most: 0.95 },
  { name: 'whitePoint', label: 'White point, as a ratio', decimals: 3, least: 0.05, most: 1 },
  { name: 'gamma', label: 'Gamma', decimals: 2, least: 0.2, most: 5 },
  { name: 'dividingLstar', label: 'Dividing level', unit: 'L*', decimals: 1, least: 1, most: 99 },
  { name: 'powerPercent', label: 'Power', unit: '%', decimals: 1, least: 1, most: 100 },
  { name: 'speedMmPerS', label: 'Speed', unit: 'mm/s', decimals: 2, least: 0.1, most: 20_000 },
  {
    name: 'secondPowerPercent',
    label: 'Power of the perpendicular pass',
    unit: '%',
    decimals: 1,
    least: 1,
    most: 100,
  },
  {
    name: 'secondSpeedMmPerS',
    label: 'Speed of the perpendicular pass',
    unit: 'mm/s',
    decimals: 2,
    least: 0.1,
    most: 20_000,
  },
  {
    name: 'focusOffsetMm',
    label: 'Focus offset, above focus',
    unit: 'mm',
    decimals: 2,
    least: -20,
    most: 50,
  },
];

function FigureFields({ control }: { control: Control<Figures> }) {
  return FIELDS.map(({ name, label, unit, decimals, least, most }) => (
    <Controller
      key={name}
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <NumberField
          label={label}
          unit={unit}
          decimals={decimals}
          minValue={least}
          maxValue={most}
          value={field.value}
          onChange={field.onChange}
          onBlur={field.onBlur}
          wrong={fieldState.error?.message}
        />
      )}
    />
  ));
}

function WordFields({ control, context }: { control: Control<Figures>; context: ChoiceContext }) {
  const presets = context.machines.flatMap((machine) =>
    machine.spotPresets.map((preset) => ({
      id: `${machine.id}/${preset.id}`,
      name: `${machine.name}, ${preset.name}`,
    })),
  );
  const lists = [
    {
      name: 'treatment',
      label: 'Treatment',
      choices: treatmentSchema.options.map((id) => ({ id, name: TREATMENT_WORDS[id] })),
    },
    {
      name: 'screen',
      label: 'Screen, for halftone',
      choices: SCREEN_NAMES.map((id) => ({ id, name: SCREEN_WORDS[id] })),
    },
    {
      name: 'toneMode',
      label: 'Tones',
      choices: [
        { id: 'absolute', name: 'absolute' },
        { id: 'scaled', name: 'scaled' },
      ],
    },
    {
      name: 'corners',
      label: 'Corners of traced outlines',
      choices: [
        { id: 'kept', name: 'kept' },
        { id: 'eased', name: 'eased' },
      ],
    },
    { name: 'machineAndSpot', label: 'Machine and spot preset', choices: presets },
  ] as const;
  return (
    <>
      {lists.map(({ name, label, choices }) => (
        <Controller
          key={name}
          control={control}
          name={name}
          render={({ field }) => (
            <Select label={label} choices={choices} value={field.value} onChange={field.onChange} />
          )}
        />
      ))}
      <Controller
        control={control}
        name="mirror"
        render={({ field }) => (
          <Checkbox isSelected={field.value} onChange={field.onChange}>
            Mirrored
          </Checkbox>
        )}
      />
    </>
  );
}

/** Every choice of the sentence as one plain form. Nothing changes until it is kept. */
export function AllFigures({ design, context, onChange, onClose }: Props) {
  const form = useForm<Figures>({ resolver: zodResolver(figuresSchema), defaultValues: figuresOf(design) });
  const keep = form.handleSubmit((figures) => {
    onChange(designSchema.parse(designOf(figures, design)));
    onClose();
  });
  return (
    <Dialog title="All figures" isOpen onClose={onClose}>
      <form onSubmit={(event) => void keep(event)} className="flex flex-col gap-4" noValidate>
        <WordFields control={form.control} context={context} />
        <FigureFields control={form.control} />
        <div className="flex gap-2">
          <Button type="submit" kind="filled">
            Keep these figures
          </Button>
          <Button kind="text" onPress={onClose}>
            Leave them as they were
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
