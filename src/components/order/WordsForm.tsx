import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm } from 'react-hook-form';
import { z } from 'zod';
import { problemOf } from '../api';
import { Button } from '../Button';
import { ProblemNotice } from '../Notice';
import { TextField } from '../TextField';

const wordsSchema = z.object({
  words: z
    .string()
    .trim()
    .min(3, 'Say it in a few words, so that the other side understands.')
    .max(1000, 'Up to 1000 characters.'),
});

interface Props {
  label: string;
  why?: string;
  /** verb and thing */
  button: string;
  kind?: 'outlined' | 'stop' | 'filled';
  error: Error | null;
  isPending: boolean;
  onSend: (words: string) => void;
}

/** A reason or a wish in words, as several events of an order ask for. */
export function WordsForm({ label, why, button, kind = 'outlined', error, isPending, onSend }: Props) {
  const form = useForm({ resolver: zodResolver(wordsSchema), defaultValues: { words: '' } });
  return (
    <form
      noValidate
      className="flex flex-col items-stretch gap-4"
      onSubmit={(event) => void form.handleSubmit(({ words }) => onSend(words))(event)}
    >
      {error && <ProblemNotice problem={problemOf(error)} />}
      <Controller
        control={form.control}
        name="words"
        render={({ field, fieldState }) => (
          <TextField
            label={label}
            why={why}
            rows={4}
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            wrong={fieldState.error?.message}
          />
        )}
      />
      <div>
        <Button type="submit" kind={kind} isDisabled={isPending}>
          {button}
        </Button>
      </div>
    </form>
  );
}
