import { useEffect, useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import type { CheckReport } from '@/lib/prepare/report';
import { Button } from '../Button';
import { Checkbox } from '../Checkbox';
import { LengthField, shownLength, type LengthUnit } from '../LengthField';
import { aspectOf, lockedSize, type DraftForm } from './draft-form';
import { Part } from './Part';
import { UnitChoice } from './UnitChoice';

interface Props {
  check: CheckReport | null;
  unit: LengthUnit;
  onUnit: (unit: LengthUnit) => void;
}

/** How big the engraving shall be. A file that states no size is asked about, never guessed for. */
export function SizePart({ check, unit, onUnit }: Props) {
  const form = useFormContext<DraftForm>();
  const [widthMm, heightMm] = useWatch({ control: form.control, name: ['widthMm', 'heightMm'] });
  const [locked, setLocked] = useState(true);
  const aspect = aspectOf(check);
  const set = (size: { widthMm: number | null; heightMm: number | null }) => {
    form.setValue('widthMm', size.widthMm, { shouldDirty: true });
    form.setValue('heightMm', size.heightMm, { shouldDirty: true, shouldTouch: true });
  };
  // A side typed before the proportions were known: the other follows as soon as they are.
  const { setValue } = form;
  useEffect(() => {
    if (!locked || aspect === null || (widthMm === null) === (heightMm === null)) return;
    const size =
      widthMm !== null ? lockedSize('width', widthMm, aspect) : lockedSize('height', heightMm, aspect);
    setValue('widthMm', size.widthMm, { shouldDirty: true });
    setValue('heightMm', size.heightMm, { shouldDirty: true, shouldTouch: true });
  }, [aspect, heightMm, locked, setValue, widthMm]);
  const change = (side: 'width' | 'height') => (value: number | null) => {
    if (locked && aspect !== null) return set(lockedSize(side, value, aspect));
    set(side === 'width' ? { widthMm: value, heightMm } : { widthMm, heightMm: value });
  };
  const own =
    check?.artwork.ownWidthMm && check.artwork.ownHeightMm
      ? { widthMm: check.artwork.ownWidthMm, heightMm: check.artwork.ownHeightMm }
      : null;
  return (
    <Part title="Size" words={<OwnSizeWords check={check} own={own} unit={unit} />}>
      {own && own.widthMm !== widthMm && (
        <div>
          <Button onPress={() => set(own)}>Use the file’s own size</Button>
        </div>
      )}
      <div className="grid grid-cols-2 gap-4">
        <LengthField
          label="Width"
          unit={unit}
          valueMm={widthMm}
          onChangeMm={change('width')}
          minMm={1}
          maxMm={3000}
        />
        <LengthField
          label="Height"
          unit={unit}
          valueMm={heightMm}
          onChangeMm={change('height')}
          minMm={1}
          maxMm={3000}
        />
      </div>
      <div className="flex flex-wrap items-center justify-between gap-x-6">
        <Checkbox isSelected={locked} onChange={setLocked}>
          Keep the proportions
        </Checkbox>
        <UnitChoice unit={unit} onUnit={onUnit} />
      </div>
    </Part>
  );
}

function OwnSizeWords({
  check,
  own,
  unit,
}: {
  check: CheckReport | null;
  own: { widthMm: number; heightMm: number } | null;
  unit: LengthUnit;
}) {
  if (!check) return <>How wide and high the engraving shall be on the piece.</>;
  if (!own)
    return <>The file does not say how big it is meant to be. Say the width, and the height follows.</>;
  return (
    <>
      The file says {shownLength(own.widthMm, unit)} × {shownLength(own.heightMm, unit)} {unit}.
    </>
  );
}
