import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { NumberField } from '../NumberField';
import { Select } from '../Select';
import { TextField } from '../TextField';

interface Common<T extends FieldValues> {
  control: Control<T>;
  name: FieldPath<T>;
  label: string;
  why?: string;
}

/** Fields of the shop's forms: bound to react-hook-form, each with what is wrong below it. */
export function Words<T extends FieldValues>({
  control,
  name,
  rows,
  ...props
}: Common<T> & { rows?: number; type?: 'text' | 'email' | 'url' | 'color' }) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <TextField
          {...props}
          rows={rows}
          value={String(field.value ?? '')}
          onChange={field.onChange}
          onBlur={field.onBlur}
          wrong={fieldState.error?.message}
        />
      )}
    />
  );
}

export function Num<T extends FieldValues>({
  control,
  name,
  ...props
}: Common<T> & { unit?: string; decimals?: number; minValue?: number; maxValue?: number }) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => {
        const value: unknown = field.value;
        return (
          <NumberField
            {...props}
            value={typeof value === 'number' ? value : null}
            onChange={field.onChange}
            onBlur={field.onBlur}
            wrong={fieldState.error ? 'Enter a figure here.' : undefined}
          />
        );
      }}
    />
  );
}

export function Pick<T extends FieldValues>({
  control,
  name,
  ...props
}: Common<T> & { choices: readonly { id: string; name: string; words?: string }[] }) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <Select
          {...props}
          value={String(field.value ?? '')}
          onChange={field.onChange}
          wrong={fieldState.error?.message}
        />
      )}
    />
  );
}
