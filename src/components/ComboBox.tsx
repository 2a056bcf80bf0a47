import { ComboBox as AriaComboBox, type ComboBoxProps } from 'react-aria-components/ComboBox';
import { Button } from 'react-aria-components/Button';
import { FieldError } from 'react-aria-components/FieldError';
import { Input } from 'react-aria-components/Input';
import { Label } from 'react-aria-components/Label';
import { ListBox } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import { Text } from 'react-aria-components/Text';
import { DropArrow } from './DropArrow';
import { ChoiceItem, type Choice } from './Select';

interface Props extends Pick<ComboBoxProps<Choice>, 'name' | 'isDisabled' | 'isRequired' | 'onInputChange'> {
  label: string;
  choices: readonly Choice[];
  value: string | null;
  onChange: (id: string | null) => void;
  why?: string;
  wrong?: string;
  placeholder?: string;
}

/** A list that is narrowed by typing: people, stocks. */
export function ComboBox({ label, choices, value, onChange, why, wrong, placeholder, ...props }: Props) {
  return (
    <AriaComboBox
      {...props}
      defaultItems={choices}
      value={value}
      onChange={(id) => onChange(id === null ? null : String(id))}
      isInvalid={Boolean(wrong)}
      validationBehavior="aria"
      menuTrigger="focus"
      className="field"
    >
      <Label className="field-label">{label}</Label>
      {why && (
        <Text slot="description" className="field-why">
          {why}
        </Text>
      )}
      <div className="entry">
        <Input placeholder={placeholder} />
        <Button className="entry-drop">
          <DropArrow />
        </Button>
      </div>
      <FieldError className="field-wrong">{wrong}</FieldError>
      <Popover className="raised min-w-[--trigger-width]" offset={4}>
        <ListBox<Choice>
          className="list-box"
          renderEmptyState={() => <p className="px-3 py-2 text-15 text-quiet">Nothing by that name.</p>}
        >
          {(choice) => <ChoiceItem choice={choice} />}
        </ListBox>
      </Popover>
    </AriaComboBox>
  );
}
