import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useForm, useWatch } from 'react-hook-form';
import type { z } from 'zod';
import { spotPresetSchema, type SpotPreset } from '@/lib/machines/machine';
import type { MachineView } from '@/lib/orders/views';
import { call } from '../api';
import { Num, Pick, Words } from './controlled';
import { FormDialog } from './FormDialog';
import { SpotLines } from './SpotLines';

export const MEASURED_WORDS: Record<SpotPreset['measuredBy'], string> = {
  'burned-line': 'width of a burned line at the working dose',
  maker: 'the maker’s figure',
  'beam-1e2': 'beam, 1/e² width',
  'beam-4sigma': 'beam, four sigma',
};
const SHAPES = [
  { id: 'ellipse', name: 'Ellipse' },
  { id: 'rectangle', name: 'Rectangle' },
] as const;

interface Props {
  machine: MachineView;
  preset: MachineView['spotPresets'][number] | null;
  onClose: () => void;
}

/** A spot preset: its two sizes, its shape, and how it was measured; drawn as it is typed. */
export function PresetForm({ machine, preset, onClose }: Props) {
  const queries = useQueryClient();
  const form = useForm<z.input<typeof spotPresetSchema>, unknown, SpotPreset>({
    resolver: zodResolver(spotPresetSchema),
    defaultValues: preset ?? {
      name: '',
      shape: 'ellipse',
      measuredBy: 'burned-line',
      measuredAtDoseJPerMm2: null,
    },
  });
  const save = useMutation({
    mutationFn: (body: SpotPreset) =>
      preset
        ? call('PATCH /api/machines/:id/spot-presets/:presetId', {
            params: { id: machine.id, presetId: preset.id },
            body,
          })
        : call('POST /api/machines/:id/spot-presets', { params: { id: machine.id }, body }),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: ['machines'] });
      onClose();
    },
  });
  const typed = spotPresetSchema.safeParse({ ...useWatch({ control: form.control }), name: 'drawn' });
  const { control } = form;
  return (
    <FormDialog
      title={preset ? `Spot preset ${preset.name}` : `New spot preset of ${machine.name}`}
      confirm={preset ? 'Keep this preset' : 'Add this preset'}
      isBusy={save.isPending}
      error={save.error}
      onSubmit={() => void form.handleSubmit((body) => save.mutate(body))()}
      onClose={onClose}
    >
      {typed.success && <SpotLines preset={typed.data} />}
      <Words control={control} name="name" label="Name" why="Such as the lens, or the height of the head." />
      <div className="grid grid-cols-2 items-start gap-4">
        <Num
          control={control}
          name="widthMm"
          label="Width along X"
          unit="mm"
          decimals={3}
          minValue={0.005}
          maxValue={5}
        />
        <Num
          control={control}
          name="heightMm"
          label="Height along Y"
          unit="mm"
          decimals={3}
          minValue={0.005}
          maxValue={5}
        />
      </div>
      <Pick control={control} name="shape" label="Shape" choices={SHAPES} />
      <Pick
        control={control}
        name="measuredBy"
        label="How it was measured"
        choices={Object.entries(MEASURED_WORDS).map(([id, name]) => ({ id, name }))}
      />
      <Num
        control={control}
        name="measuredAtDoseJPerMm2"
        label="At which dose, if noted"
        unit="J/mm²"
        decimals={3}
        minValue={0}
        maxValue={1000}
      />
    </FormDialog>
  );
}
