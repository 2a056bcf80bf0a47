import { Slider as AriaSlider, SliderOutput, SliderThumb, SliderTrack } from 'react-aria-components/Slider';
import { Label } from 'react-aria-components/Label';

interface Props {
  label: string;
  value: number;
  onChange: (value: number) => void;
  min: number;
  max: number;
  step: number;
  unit?: string;
  decimals?: number;
  isDisabled?: boolean;
  onChangeEnd?: (value: number) => void;
}

export function Slider({
  label,
  value,
  onChange,
  onChangeEnd,
  min,
  max,
  step,
  unit,
  decimals = 2,
  isDisabled,
}: Props) {
  return (
    <AriaSlider<number>
      value={value}
      onChange={onChange}
      onChangeEnd={onChangeEnd}
      minValue={min}
      maxValue={max}
      step={step}
      isDisabled={isDisabled}
      formatOptions={{ minimumFractionDigits: decimals, maximumFractionDigits: decimals }}
      className="grid grid-cols-[1fr_auto] gap-x-4"
    >
      <Label className="field-label">{label}</Label>
      <SliderOutput className="figure text-15 font-semibold">
        {({ state }) => (
          <>
            {state.getThumbValueLabel(0)}
            {unit && <span className="unit">{unit}</span>}
          </>
        )}
      </SliderOutput>
      <SliderTrack className="col-span-2 flex h-[44px] items-center">
        {({ state }) => (
          <>
            <span className="absolute h-px w-full bg-edge" />
            <span
              className="absolute h-[3px] bg-action"
              style={{ width: `${state.getThumbPercent(0) * 100}%` }}
            />
            <SliderThumb className="top-1/2 h-6 w-6 rounded-full border border-action bg-sheet data-[dragging]:bg-action" />
          </>
        )}
      </SliderTrack>
    </AriaSlider>
  );
}
