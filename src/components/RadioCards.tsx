import { Radio, RadioGroup, type RadioGroupProps } from 'react-aria-components/RadioGroup';
import { FieldError } from 'react-aria-components/FieldError';
import { Label } from 'react-aria-components/Label';
import { Text } from 'react-aria-components/Text';
import type { Choice } from './Select';

interface Props extends Pick<RadioGroupProps, 'name' | 'isDisabled' | 'isRequired'> {
  label: string;
  choices: readonly Choice[];
  value: string | null;
  onChange: (id: string) => void;
  why?: string;
  wrong?: string;
  /** columns where there is room; one on phones, unless the cards are small */
  columns?: 2 | 3 | 4 | 5;
  small?: boolean;
}

const COLUMNS = {
  2: 'md:grid-cols-2',
  3: 'md:grid-cols-3',
  4: 'md:grid-cols-4',
  5: 'md:grid-cols-5',
} as const;

/** Drawn choices: one of a few, each with a drawing, a name and a line of why. */
export function RadioCards({
  label,
  choices,
  value,
  onChange,
  why,
  wrong,
  columns = 3,
  small = false,
  ...props
}: Props) {
  return (
    <RadioGroup
      {...props}
      value={value}
      onChange={onChange}
      isInvalid={Boolean(wrong)}
      validationBehavior="aria"
      className="field"
    >
      <Label className="field-label">{label}</Label>
      {why && (
        <Text slot="description" className="field-why">
          {why}
        </Text>
      )}
      <div className={`mt-1 grid gap-2 ${small ? 'grid-cols-2' : 'grid-cols-1'} ${COLUMNS[columns]}`}>
        {choices.map((choice) => (
          <Radio key={choice.id} value={choice.id} isDisabled={choice.disabled} className="card">
            {choice.drawing}
            <span>
              <span className="block text-15 font-semibold">{choice.name}</span>
              {choice.words && <span className="block text-13 text-quiet">{choice.words}</span>}
            </span>
          </Radio>
        ))}
      </div>
      <FieldError className="field-wrong">{wrong}</FieldError>
    </RadioGroup>
  );
}
