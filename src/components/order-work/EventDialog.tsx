import { useState, type ReactNode } from 'react';
import { problemOf } from '../api';
import { Button } from '../Button';
import { Checkbox } from '../Checkbox';
import { Dialog } from '../Dialog';
import { NumberField } from '../NumberField';
import { ProblemNotice } from '../Notice';
import { Select } from '../Select';
import { TextField } from '../TextField';

export interface AskedField {
  name: string;
  label: string;
  why?: string;
  kind: 'words' | 'long-words' | 'figure' | 'tick' | 'choice';
  /** fewest characters; 0 where it may stay empty */
  least?: number;
  most?: number;
  unit?: string;
  choices?: readonly { id: string; name: string }[];
}

export type Answers = Record<string, string | number | boolean | null>;

interface Props {
  title: string;
  intro?: ReactNode;
  fields: readonly AskedField[];
  /** verb and thing on the button */
  confirm: string;
  stop?: boolean;
  onConfirm: (answers: Answers) => Promise<unknown>;
  onClose: () => void;
}

function missing(field: AskedField, value: Answers[string]): string | null {
  if (field.kind === 'tick') return value === true ? null : 'Tick this first.';
  if (field.kind === 'choice') return value ? null : 'Choose one.';
  if (field.kind === 'figure') return null;
  const length = String(value ?? '').trim().length;
  return length >= (field.least ?? 0)
    ? null
    : field.least === 1
      ? 'Fill this in.'
      : `Write at least ${field.least} characters.`;
}

function Field({
  field,
  value,
  wrong,
  onChange,
}: {
  field: AskedField;
  value: Answers[string];
  wrong?: string;
  onChange: (value: Answers[string]) => void;
}) {
  const { label, why, kind } = field;
  if (kind === 'tick') {
    return (
      <Checkbox isSelected={value === true} onChange={onChange} wrong={wrong}>
        {label}
      </Checkbox>
    );
  }
  if (kind === 'choice')
    return (
      <Select
        label={label}
        why={why}
        wrong={wrong}
        value={value ? String(value) : null}
        onChange={onChange}
        choices={field.choices ?? []}
      />
    );
  if (kind === 'figure')
    return (
      <NumberField
        label={label}
        why={why}
        unit={field.unit}
        decimals={1}
        minValue={0}
        maxValue={100}
        value={typeof value === 'number' ? value : null}
        onChange={onChange}
      />
    );
  return (
    <TextField
      label={label}
      why={why}
      wrong={wrong}
      rows={kind === 'long-words' ? 3 : undefined}
      value={String(value ?? '')}
      onChange={onChange}
      maxLength={field.most ?? 1000}
    />
  );
}

/** A step of an order's life that needs words or ticks: asks for exactly those, keeps them when the server refuses. */
export function EventDialog({ title, intro, fields, confirm, stop = false, onConfirm, onClose }: Props) {
  const [answers, setAnswers] = useState<Answers>({});
  const [tried, setTried] = useState(false);
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<unknown>(null);
  const faults = fields.map((field) => missing(field, answers[field.name] ?? null));
  const submit = async () => {
    setTried(true);
    if (busy || faults.some(Boolean)) return;
    setBusy(true);
    setFailure(null);
    try {
      await onConfirm(answers);
      onClose();
    } catch (error) {
      setFailure(error);
    } finally {
      setBusy(false);
    }
  };
  return (
    <Dialog title={title} isOpen onClose={onClose}>
      <form
        className="flex flex-col gap-4"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          void submit();
        }}
      >
        {intro && <div className="text-15">{intro}</div>}
        {fields.map((field, index) => (
          <Field
            key={field.name}
            field={field}
            value={answers[field.name] ?? null}
            wrong={tried ? (faults[index] ?? undefined) : undefined}
            onChange={(value) => setAnswers((known) => ({ ...known, [field.name]: value }))}
          />
        ))}
        {failure !== null && <ProblemNotice problem={problemOf(failure)} />}
        <div className="flex flex-wrap gap-2">
          <Button type="submit" kind={stop ? 'stop' : 'filled'} isDisabled={busy}>
            {confirm}
          </Button>
          <Button kind="text" onPress={onClose}>
            Go back
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
