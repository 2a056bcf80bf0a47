import { NumberField } from '../NumberField';
import { RadioCards } from '../RadioCards';
import { Slider } from '../Slider';
import type { ChoiceProps } from './context';
import { ToneDrawing } from './drawings';

const percent = (ratio: number): number => Number((ratio * 100).toFixed(1));

export function ToneChoice({ design, context, onChange }: ChoiceProps) {
  const { tone } = design;
  const set = (part: Partial<typeof tone>) => onChange({ ...design, tone: { ...tone, ...part } });
  return (
    <div className="flex flex-col gap-4">
      <ToneDrawing {...tone} />
      <RadioCards
        label="Tones"
        columns={2}
        small
        value={tone.mode}
        onChange={(id) => set({ mode: id === 'scaled' ? 'scaled' : 'absolute' })}
        choices={[
          {
            id: 'absolute',
            name: 'Absolute',
            words: context.stockName
              ? 'As dark as asked, where the stock can.'
              : 'Coverage as dark as the artwork.',
          },
          { id: 'scaled', name: 'Scaled', words: 'Into what the stock can show, so that no tone is lost.' },
        ]}
      />
      <NumberField
        label="Black point"
        unit="%"
        decimals={1}
        minValue={0}
        maxValue={95}
        value={percent(tone.blackPoint)}
        onChange={(v) =>
          v !== null && v >= 0 && v <= 95 && v / 100 < tone.whitePoint && set({ blackPoint: v / 100 })
        }
        why="Luminance that gets the full burn. Stays below the white point."
      />
      <NumberField
        label="White point"
        unit="%"
        decimals={1}
        minValue={5}
        maxValue={100}
        value={percent(tone.whitePoint)}
        onChange={(v) =>
          v !== null && v >= 5 && v <= 100 && v / 100 > tone.blackPoint && set({ whitePoint: v / 100 })
        }
        why="Luminance that stays untouched."
      />
      <Slider
        label="Gamma"
        min={0.2}
        max={5}
        step={0.05}
        decimals={2}
        value={tone.gamma}
        onChange={(gamma) => set({ gamma })}
      />
      <p className="text-13 text-quiet">Above 1 the middle tones get darker, below 1 lighter.</p>
    </div>
  );
}

export function DividingLevelChoice({ design, onChange }: ChoiceProps) {
  const level = design.dividingLstar;
  return (
    <div className="flex flex-col gap-4">
      <svg viewBox="0 0 240 40" aria-hidden="true" className="w-full max-w-[300px] text-ink">
        {Array.from({ length: 48 }, (_, i) => {
          const lstar = (i + 0.5) * (100 / 48);
          return <rect key={i} x={i * 5} y="0" width="5.2" height="20" fill={`lab(${lstar}% 0 0)`} />;
        })}
        <rect x="0" y="24" width={level * 2.4} height="12" fill="currentColor" />
        <rect x="0.5" y="24.5" width="239" height="11" fill="none" stroke="var(--edge)" />
      </svg>
      <Slider
        label="Burned below"
        unit="L*"
        min={1}
        max={99}
        step={0.1}
        decimals={1}
        value={level}
        onChange={(dividingLstar) => onChange({ ...design, dividingLstar })}
      />
      <p className="text-13 text-quiet">
        Darker than this is burned, lighter stays untouched. L* 53.4 is an edge pixel half covered by black.
        From 1 to 99.
      </p>
    </div>
  );
}
