import { useState } from 'react';
import { speedWords } from '@/lib/orders/sentence';
import { NumberField } from '../NumberField';
import type { ChoiceProps } from './context';
import { completeRecipe, draftOf, type RecipeDraft } from './recipe-draft';
import { recipeOutcome } from './recipe-outcome';

interface PairProps {
  label: string;
  power: number | null;
  speed: number | null;
  context: ChoiceProps['context'];
  onPower: (percent: number | null) => void;
  onSpeed: (mmPerS: number | null) => void;
}

function PowerAndSpeed({ label, power, speed, context, onPower, onSpeed }: PairProps) {
  const factor = context.speedUnit === 'mm/min' ? 60 : 1;
  const fastest = context.machine?.maxSpeedMmPerS ?? 20_000;
  const threshold = context.machine?.lasingThresholdPercent ?? 0;
  return (
    <fieldset className="grid grid-cols-2 items-start gap-4">
      <legend className="field-label pb-1">{label}</legend>
      <NumberField
        label="Power"
        unit="%"
        decimals={1}
        minValue={1}
        maxValue={100}
        value={power}
        onChange={onPower}
        why={threshold > 0 ? `Below ${threshold} % it does not lase.` : 'From 1 to 100 %.'}
      />
      <NumberField
        label="Speed"
        unit={context.speedUnit}
        decimals={2}
        minValue={0.1 * factor}
        maxValue={fastest * factor}
        value={speed === null ? null : Number((speed * factor).toFixed(4))}
        onChange={(value) => onSpeed(value === null ? null : value / factor)}
        why={`At most ${speedWords(fastest, context.speedUnit)}.`}
      />
    </fieldset>
  );
}

export function RecipeChoice({ design, context, onChange }: ChoiceProps) {
  const [draft, setDraft] = useState(() => draftOf(design.recipe));
  const fastest = context.machine?.maxSpeedMmPerS ?? 20_000;
  const set = (part: Partial<RecipeDraft>) => {
    const next = { ...draft, ...part };
    setDraft(next);
    const recipe = completeRecipe(next, design.perpendicular, fastest);
    if (recipe) onChange({ ...design, recipe });
  };
  const complete = completeRecipe(draft, design.perpendicular, fastest);
  return (
    <div className="flex flex-col gap-4">
      <p className="text-15">Typed by you, not measured: the ticket says so.</p>
      <PowerAndSpeed
        label={design.perpendicular ? 'First pass' : 'Pass'}
        power={draft.powerPercent}
        speed={draft.speedMmPerS}
        context={context}
        onPower={(powerPercent) => set({ powerPercent })}
        onSpeed={(speedMmPerS) => set({ speedMmPerS })}
      />
      {design.perpendicular && (
        <PowerAndSpeed
          label="Perpendicular pass"
          power={draft.secondPowerPercent}
          speed={draft.secondSpeedMmPerS}
          context={context}
          onPower={(secondPowerPercent) => set({ secondPowerPercent })}
          onSpeed={(secondSpeedMmPerS) => set({ secondSpeedMmPerS })}
        />
      )}
      <NumberField
        label="Focus offset, above focus"
        unit="mm"
        decimals={2}
        minValue={-20}
        maxValue={50}
        value={draft.focusOffsetMm}
        onChange={(focusOffsetMm) => set({ focusOffsetMm })}
        why="0 is in focus. A few mm upward can darken."
      />
      <p className="text-15 font-semibold" role="status">
        {complete
          ? recipeOutcome({ ...design, recipe: complete }, context)
          : 'Dose and time follow once every figure is typed.'}
      </p>
    </div>
  );
}
