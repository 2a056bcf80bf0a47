import { Select as AriaSelect, SelectValue, type SelectProps } from 'react-aria-components/Select';
import { Button } from 'react-aria-components/Button';
import { FieldError } from 'react-aria-components/FieldError';
import { Label } from 'react-aria-components/Label';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import { Text } from 'react-aria-components/Text';
import type { ReactNode } from 'react';
import { DropArrow } from './DropArrow';

export interface Choice {
  id: string;
  name: string;
  /** a second, quieter line */
  words?: string;
  /** a swatch or drawing before the name */
  drawing?: ReactNode;
  disabled?: boolean;
}

interface Props extends Pick<SelectProps<Choice>, 'name' | 'isDisabled' | 'isRequired'> {
  label: string;
  choices: readonly Choice[];
  value: string | null;
  onChange: (id: string) => void;
  why?: string;
  wrong?: string;
  placeholder?: string;
  /** the label is read out, not shown: where what stands beside it says the same */
  hideLabel?: boolean;
}

export function Select({
  label,
  choices,
  value,
  onChange,
  why,
  wrong,
  placeholder = 'Choose',
  hideLabel = false,
  ...props
}: Props) {
  return (
    <AriaSelect
      {...props}
      value={value}
      onChange={(id) => id !== null && onChange(String(id))}
      placeholder={placeholder}
      isInvalid={Boolean(wrong)}
      validationBehavior="aria"
      className="field"
    >
      <Label className={hideLabel ? 'hidden-words' : 'field-label'}>{label}</Label>
      {why && (
        <Text slot="description" className="field-why">
          {why}
        </Text>
      )}
      <Button className="entry entry-button">
        <SelectValue className="flex min-w-0 items-center gap-3 [&_.choice-words]:hidden" />
        <DropArrow />
      </Button>
      <FieldError className="field-wrong">{wrong}</FieldError>
      <Popover className="raised min-w-[--trigger-width]" offset={4}>
        <ListBox items={choices} className="list-box">
          {(choice) => <ChoiceItem choice={choice} />}
        </ListBox>
      </Popover>
    </AriaSelect>
  );
}

export function ChoiceItem({ choice }: { choice: Choice }) {
  return (
    <ListBoxItem id={choice.id} textValue={choice.name} isDisabled={choice.disabled} className="list-item">
      {choice.drawing}
      <span className="min-w-0">
        {choice.name}
        {choice.words && (
          <span className="choice-words block text-13 font-normal text-quiet">{choice.words}</span>
        )}
      </span>
    </ListBoxItem>
  );
}
