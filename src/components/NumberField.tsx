import { NumberField as AriaNumberField, type NumberFieldProps } from 'react-aria-components/NumberField';
import { FieldError } from 'react-aria-components/FieldError';
import { Group } from 'react-aria-components/Group';
import { Input } from 'react-aria-components/Input';
import { Label } from 'react-aria-components/Label';
import { Text } from 'react-aria-components/Text';

interface Props extends Omit<NumberFieldProps, 'className' | 'style' | 'children' | 'value' | 'onChange'> {
  label: string;
  /** written behind the figure, such as mm, mm/s, J/mm², % */
  unit?: string;
  why?: string;
  wrong?: string;
  /** null: nothing entered */
  value: number | null;
  onChange: (value: number | null) => void;
  /** decimal places that can be entered */
  decimals?: number;
}

function rangeWords(min: number, max: number, unit = ''): string {
  if (max === Infinity) return `Enter at least ${min} ${unit}.`.replace(' .', '.');
  if (min === -Infinity) return `Enter at most ${max} ${unit}.`.replace(' .', '.');
  return `Enter a figure from ${min} to ${max} ${unit}.`.replace(' .', '.');
}

/** A figure with its unit. Out of range it stays as typed and says so. Empty is null, never 0. */
export function NumberField({
  label,
  unit,
  why,
  wrong,
  value,
  onChange,
  decimals = 2,
  minValue = -Infinity,
  maxValue = Infinity,
  ...props
}: Props) {
  const outside = value !== null && (value < minValue || value > maxValue);
  const wording = wrong ?? (outside ? rangeWords(minValue, maxValue, unit) : undefined);
  return (
    <AriaNumberField
      {...props}
      minValue={minValue}
      maxValue={maxValue}
      commitBehavior="validate"
      value={value ?? NaN}
      onChange={(next) => onChange(Number.isNaN(next) ? null : next)}
      formatOptions={{ maximumFractionDigits: decimals, useGrouping: false }}
      isInvalid={Boolean(wording)}
      validationBehavior="aria"
      className="field"
    >
      <Label className="field-label">
        {label}
        {unit && <span className="hidden-words"> in {unit}</span>}
      </Label>
      {why && (
        <Text slot="description" className="field-why">
          {why}
        </Text>
      )}
      <Group className="entry">
        <Input />
        {unit && (
          <span className="entry-unit" aria-hidden="true">
            {unit}
          </span>
        )}
      </Group>
      <FieldError className="field-wrong">{wording}</FieldError>
    </AriaNumberField>
  );
}
