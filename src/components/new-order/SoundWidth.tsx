import type { CheckReport } from '@/lib/prepare/report';
import { Button } from '../Button';
import { shownLength, type LengthUnit } from '../LengthField';
import { soundWidth } from './draft-form';

interface Props {
  check: CheckReport;
  unit: LengthUnit;
  onUse: (widthMm: number) => void;
}

/** The smallest width at which every line and every gap holds, with one press to use it. */
export function SoundWidth({ check, unit, onUse }: Props) {
  if (check.smallestSoundWidthMm === null) return null;
  const width = soundWidth(check.smallestSoundWidthMm);
  const holds = check.widthMm >= check.smallestSoundWidthMm;
  return (
    <div className="flex flex-col items-start gap-2 border-t border-hair pt-4">
      <p className="text-15">
        {holds ? 'Every line and gap holds down to ' : 'Every line and gap holds from '}
        <strong className="figure font-semibold">
          {shownLength(width, unit)}
          <span className="unit">{unit}</span>
        </strong>
        {' wide.'}
      </p>
      {!holds && <Button onPress={() => onUse(width)}>Use this size</Button>}
    </div>
  );
}
