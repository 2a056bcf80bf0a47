import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { MachineView } from '@/lib/orders/views';
import { runOff } from '@/lib/machines/scan-time';
import { sizeAcross } from '@/lib/machines/spot';
import { pitchWords, spotWords } from '@/lib/orders/sentence';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { EmptyState } from '../EmptyState';
import { Island } from '../Island';
import { ProblemNotice } from '../Notice';
import { Pairs } from '../order-work/PreparationFacts';
import { SkeletonTable } from '../SkeletonTable';
import { MachineForm } from './MachineForm';
import { MEASURED_WORDS, PresetForm } from './PresetForm';
import { SpotLines } from './SpotLines';

type Preset = MachineView['spotPresets'][number];

function machinePairs(machine: MachineView): [string, string][] {
  const reach = runOff(machine.maxSpeedMmPerS, machine.accelerationMmPerS2);
  return [
    ['Bed', `${machine.bedWidthMm} × ${machine.bedHeightMm} mm`],
    [
      'Speed',
      `at most ${machine.maxSpeedMmPerS} mm/s, shown in ${machine.speedUnit}; acceleration ${machine.accelerationMmPerS2.toLocaleString('en-GB')} mm/s², run-off ${reach.toFixed(1)} mm at full speed`,
    ],
    [
      'Power',
      `${machine.wattsAtFull} W at 100 %, ${machine.powerLevels} levels, lases from ${machine.lasingThresholdPercent} %; ${machine.powerCurve.length > 1 ? `curve of ${machine.powerCurve.length} points measured` : 'no curve measured, so dose assumes linear power'}`,
    ],
    ['Firing', `${machine.firing}, ${machine.scanning} scanning`],
  ];
}

function PresetEntry({
  machine,
  preset,
  onChange,
}: {
  machine: MachineView;
  preset: Preset;
  onChange: () => void;
}) {
  const queries = useQueryClient();
  const remove = useMutation({
    mutationFn: () =>
      call('DELETE /api/machines/:id/spot-presets/:presetId', {
        params: { id: machine.id, presetId: preset.id },
      }),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['machines'] }),
  });
  return (
    <li className="grid items-center gap-x-10 gap-y-3 border-b border-hair py-4 lg:grid-cols-[minmax(0,1fr)_auto]">
      <div className="min-w-0">
        <p className="font-semibold">{preset.name}</p>
        <p className="text-15">
          {spotWords(preset)}, {preset.shape === 'ellipse' ? 'ellipse' : 'rectangle'}. Lines touch at{' '}
          {pitchWords(sizeAcross(preset, 0))} apart at 0°, at {pitchWords(sizeAcross(preset, 90))} at 90°.
        </p>
        <p className="text-13 text-quiet">
          Measured by: {MEASURED_WORDS[preset.measuredBy]}
          {preset.measuredAtDoseJPerMm2 !== null && ` (${preset.measuredAtDoseJPerMm2} J/mm²)`}
        </p>
        <div className="-ml-2 flex flex-wrap">
          <Button kind="text" onPress={onChange}>
            Change this preset
          </Button>
          <Button kind="text" onPress={() => remove.mutate()} isDisabled={remove.isPending}>
            Remove this preset
          </Button>
        </div>
        {remove.error && <ProblemNotice problem={problemOf(remove.error)} />}
      </div>
      <SpotLines preset={preset} />
    </li>
  );
}

function MachineEntry({ machine }: { machine: MachineView }) {
  const queries = useQueryClient();
  const [open, setOpen] = useState<'machine' | 'new-preset' | Preset | null>(null);
  const retire = useMutation({
    mutationFn: () =>
      call('PATCH /api/machines/:id', { params: { id: machine.id }, body: { retired: !machine.retired } }),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['machines'] }),
  });
  const close = () => setOpen(null);
  return (
    <section aria-label={machine.name} className="flex flex-col gap-4">
      <h2>
        {machine.name}
        {machine.retired && <span className="font-normal text-quiet">, retired</span>}
      </h2>
      <Pairs pairs={machinePairs(machine)} />
      <div className="-ml-2 flex flex-wrap">
        <Button kind="text" onPress={() => setOpen('machine')}>
          Change this machine
        </Button>
        <Button kind="text" onPress={() => retire.mutate()} isDisabled={retire.isPending}>
          {machine.retired ? 'Take it back into use' : 'Retire this machine'}
        </Button>
      </div>
      {retire.error && <ProblemNotice problem={problemOf(retire.error)} />}
      <h3>Spot presets</h3>
      <p className="text-13 text-quiet">
        Each spot to one scale, then four of its lines at pitch ratio 1, at 0° and at 90°.
      </p>
      <ul className="flex flex-col">
        {machine.spotPresets.map((preset) => (
          <PresetEntry key={preset.id} machine={machine} preset={preset} onChange={() => setOpen(preset)} />
        ))}
      </ul>
      <div>
        <Button onPress={() => setOpen('new-preset')}>Add a spot preset</Button>
      </div>
      {open === 'machine' && <MachineForm machine={machine} onClose={close} />}
      {open === 'new-preset' && <PresetForm machine={machine} preset={null} onClose={close} />}
      {open !== null && typeof open === 'object' && (
        <PresetForm machine={machine} preset={open} onClose={close} />
      )}
    </section>
  );
}

function List() {
  const [adding, setAdding] = useState(false);
  const { data, error, isPending } = useQuery({
    queryKey: ['machines'],
    queryFn: ({ signal }) => call('GET /api/machines', { signal }),
  });
  if (error) return <ProblemNotice problem={problemOf(error)} />;
  if (isPending) return <SkeletonTable columns={2} words="Fetching the machines" />;
  return (
    <div className="flex flex-col gap-16">
      {data.machines.length === 0 && <EmptyState words="No machine yet. Add the first one, then its spot." />}
      {data.machines.map((machine) => (
        <MachineEntry key={machine.id} machine={machine} />
      ))}
      <div>
        <Button onPress={() => setAdding(true)}>Add a machine</Button>
      </div>
      {adding && <MachineForm machine={null} onClose={() => setAdding(false)} />}
    </div>
  );
}

/** The shop's lasers, and the spots that each can make. */
export function Machines() {
  return (
    <Island>
      <List />
    </Island>
  );
}
