import { Label } from 'react-aria-components/Label';
import { Radio, RadioGroup } from 'react-aria-components/RadioGroup';

export const COMPARE_WAYS = ['sweep', 'side-by-side', 'hold'] as const;
export type CompareWay = (typeof COMPARE_WAYS)[number];

const WORDS: Record<CompareWay, string> = {
  sweep: 'sweep',
  'side-by-side': 'side by side',
  hold: 'hold to see the other',
};

interface Props {
  value: CompareWay;
  onChange: (way: CompareWay) => void;
}

/** How two pictures are compared, as a sentence with three words to choose from. */
export function CompareWayChoice({ value, onChange }: Props) {
  return (
    <RadioGroup
      value={value}
      onChange={(way) => onChange(COMPARE_WAYS.find((known) => known === way) ?? 'sweep')}
      orientation="horizontal"
      className="flex flex-wrap items-center gap-x-4"
    >
      <Label className="text-15 text-quiet">Compare by</Label>
      {COMPARE_WAYS.map((way) => (
        <Radio
          key={way}
          value={way}
          className="flex min-h-target cursor-pointer items-center border-b-2 border-transparent text-15 text-action data-[selected]:border-action data-[selected]:font-semibold"
        >
          {WORDS[way]}
        </Radio>
      ))}
    </RadioGroup>
  );
}
