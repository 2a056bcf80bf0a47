import { TextField as AriaTextField, type TextFieldProps } from 'react-aria-components/TextField';
import { FieldError } from 'react-aria-components/FieldError';
import { Input } from 'react-aria-components/Input';
import { Label } from 'react-aria-components/Label';
import { Text } from 'react-aria-components/Text';
import { TextArea } from 'react-aria-components/TextArea';

interface Props extends Omit<TextFieldProps, 'className' | 'style' | 'children'> {
  label: string;
  /** one line of why or how */
  why?: string;
  /** what is wrong with the entry and what to do; shown in place of nothing */
  wrong?: string;
  /** rows of a longer text */
  rows?: number;
  placeholder?: string;
}

export function TextField({ label, why, wrong, rows, placeholder, ...props }: Props) {
  return (
    <AriaTextField {...props} isInvalid={Boolean(wrong)} validationBehavior="aria" className="field">
      <Label className="field-label">{label}</Label>
      {why && (
        <Text slot="description" className="field-why">
          {why}
        </Text>
      )}
      {rows ? (
        <TextArea className="entry" rows={rows} placeholder={placeholder} />
      ) : (
        <Input className="entry" placeholder={placeholder} />
      )}
      <FieldError className="field-wrong">{wrong}</FieldError>
    </AriaTextField>
  );
}
