import { scanFor } from '@/lib/prepare/settings';
import { pitchWords, spotWords } from '@/lib/orders/sentence';
import { Select } from '../Select';
import { RadioCards } from '../RadioCards';
import { SpotFigure } from '../SpotFigure';
import type { ChoiceProps } from './context';

export function MachineChoice({ design, context, onChange }: ChoiceProps) {
  const usable = context.machines.filter(
    (m) => (!m.retired && m.spotPresets.length > 0) || m.id === design.machineId,
  );
  const chooseMachine = (id: string) => {
    const machine = usable.find((m) => m.id === Number(id));
    if (machine && machine.id !== design.machineId)
      onChange({ ...design, machineId: machine.id, spotPresetId: machine.spotPresets[0].id });
  };
  const asked = scanFor(context.spot, design.scan.directionDeg).linePitchMm;
  const differs = Math.abs(asked - design.scan.linePitchMm) > 0.0005;
  return (
    <div className="flex flex-col gap-4">
      <Select
        label="Machine"
        value={String(design.machineId)}
        onChange={chooseMachine}
        choices={usable.map((m) => ({
          id: String(m.id),
          name: m.name,
          words: `${m.bedWidthMm} × ${m.bedHeightMm} mm, ${m.wattsAtFull} W, ${m.firing}`,
        }))}
      />
      <RadioCards
        label="Spot preset"
        why="Drawn to one scale. The spot sets pitch, hairlines and fill-in."
        columns={2}
        value={String(design.spotPresetId)}
        onChange={(id) => onChange({ ...design, spotPresetId: Number(id) })}
        choices={(context.machine?.spotPresets ?? []).map((preset) => ({
          id: String(preset.id),
          name: preset.name,
          words: `${spotWords(preset)}, ${preset.shape === 'ellipse' ? 'elliptical' : 'rectangular'}`,
          drawing: <SpotFigure spot={preset} pxPerMm={220} written={false} />,
        }))}
      />
      {differs && design.treatment !== 'linework' && (
        <p className="text-15">
          This spot asks for lines {pitchWords(asked)} apart; they are {pitchWords(design.scan.linePitchMm)}{' '}
          apart and stay so until you change them.
        </p>
      )}
    </div>
  );
}
