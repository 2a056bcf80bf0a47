import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { machineSchema, powerPointSchema, type Machine } from '@/lib/machines/machine';
import type { MachineView } from '@/lib/orders/views';
import { call } from '../api';
import { Num, Pick, Words } from './controlled';
import { FormDialog } from './FormDialog';

/** The measured power curve as lines of "percent watts"; nothing where none was measured. */
export function curveText(curve: Machine['powerCurve']): string {
  return curve.map((point) => `${point.settingPercent} ${point.watts}`).join('\n');
}

/** Points of a curve that was typed line by line, or null where a line is not two figures in range. */
export function readCurve(text: string): Machine['powerCurve'] | null {
  const lines = text
    .split('\n')
    .map((line) => line.trim())
    .filter(Boolean);
  const points = lines.map((line) => {
    const [settingPercent, watts, ...rest] = line.split(/[\s;,]+/).map(Number);
    return rest.length === 0 ? powerPointSchema.safeParse({ settingPercent, watts }) : null;
  });
  return points.every((p) => p?.success) ? points.flatMap((p) => (p?.success ? [p.data] : [])) : null;
}

const formSchema = machineSchema.omit({ powerCurve: true }).extend({
  curve: z
    .string()
    .refine(
      (text) => readCurve(text) !== null,
      'Write a setting in percent and the watts on each line, such as: 50 18.4',
    ),
});
type FormValues = z.infer<typeof formSchema>;

const EMPTY = {
  name: '',
  powerLevels: 256,
  lasingThresholdPercent: 0,
  speedUnit: 'mm/s',
  firing: 'swept',
  scanning: 'two-way',
  curve: '',
} as const;

/** One laser: what dose, time and run-off are reckoned from. */
export function MachineForm({ machine, onClose }: { machine: MachineView | null; onClose: () => void }) {
  const queries = useQueryClient();
  const form = useForm<FormValues>({
    resolver: zodResolver(formSchema),
    defaultValues: machine ? { ...machine, curve: curveText(machine.powerCurve) } : EMPTY,
  });
  const save = useMutation({
    mutationFn: ({ curve, ...values }: FormValues) => {
      const body = { ...values, powerCurve: readCurve(curve) ?? [] };
      return machine
        ? call('PATCH /api/machines/:id', { params: { id: machine.id }, body })
        : call('POST /api/machines', { body });
    },
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: ['machines'] });
      onClose();
    },
  });
  const { control } = form;
  return (
    <FormDialog
      title={machine ? machine.name : 'New machine'}
      confirm={machine ? 'Keep this machine' : 'Add this machine'}
      isBusy={save.isPending}
      error={save.error}
      onSubmit={() => void form.handleSubmit((values) => save.mutate(values))()}
      onClose={onClose}
    >
      <Words control={control} name="name" label="Name" />
      <div className="grid grid-cols-2 items-start gap-4">
        <Num
          control={control}
          name="bedWidthMm"
          label="Bed along X"
          unit="mm"
          minValue={1}
          maxValue={10_000}
        />
        <Num
          control={control}
          name="bedHeightMm"
          label="Bed along Y"
          unit="mm"
          minValue={1}
          maxValue={10_000}
        />
        <Num
          control={control}
          name="maxSpeedMmPerS"
          label="Highest speed"
          unit="mm/s"
          minValue={0.1}
          maxValue={20_000}
        />
        <Num
          control={control}
          name="accelerationMmPerS2"
          label="Acceleration"
          unit="mm/s²"
          minValue={1}
          maxValue={200_000}
        />
        <Num
          control={control}
          name="wattsAtFull"
          label="Optical power at 100 %"
          unit="W"
          minValue={0.01}
          maxValue={10_000}
        />
        <Num
          control={control}
          name="lasingThresholdPercent"
          label="Lases from"
          unit="%"
          decimals={1}
          minValue={0}
          maxValue={90}
        />
      </div>
      <Num
        control={control}
        name="powerLevels"
        label="Power levels that it can tell apart"
        decimals={0}
        minValue={2}
        maxValue={65_536}
      />
      <Words
        control={control}
        name="curve"
        rows={4}
        label="Measured power curve"
        why="A setting in percent and the watts on each line. Empty: dose says that it assumes linear power."
      />
      <Pick
        control={control}
        name="speedUnit"
        label="Shows speed in"
        choices={[
          { id: 'mm/s', name: 'mm/s' },
          { id: 'mm/min', name: 'mm/min' },
        ]}
      />
      <Pick
        control={control}
        name="firing"
        label="Firing"
        choices={[
          { id: 'swept', name: 'Swept: the beam stays on across the pixel' },
          { id: 'pulsed', name: 'Pulsed: one spot per pixel' },
        ]}
      />
      <Pick
        control={control}
        name="scanning"
        label="Scanning"
        choices={[
          { id: 'two-way', name: 'Two-way' },
          { id: 'one-way', name: 'One-way' },
        ]}
      />
    </FormDialog>
  );
}
