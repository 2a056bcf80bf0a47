import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { Controller, useForm, type DefaultValues, type FieldValues, type Path } from 'react-hook-form';
import type { z } from 'zod';
import type { Problem } from '@/lib/orders/views';
import { problemOf, Refusal } from '../api';
import { Button } from '../Button';
import { ProblemNotice } from '../Notice';
import { TextField } from '../TextField';
import { useHydrated } from '../use-hydrated';

export interface AccountField<V> {
  name: keyof V & string;
  label: string;
  type?: 'text' | 'email' | 'password';
  autoComplete: string;
  why?: string;
}

interface Props<V extends FieldValues> {
  schema: z.ZodType<V, V>;
  fields: readonly AccountField<V>[];
  initial: DefaultValues<V>;
  /** verb and thing */
  button: string;
  kind?: 'filled' | 'outlined';
  send: (values: V) => Promise<unknown>;
  /** said where it is done and the page stays */
  done?: string;
}

/** A short form of text fields: checked before it is sent, refusals shown where they belong, nothing typed is lost. */
export function AccountForm<V extends FieldValues>({
  schema,
  fields,
  initial,
  button,
  kind = 'filled',
  send,
  done,
}: Props<V>) {
  const form = useForm<V, unknown, V>({ resolver: zodResolver(schema), defaultValues: initial });
  const [problem, setProblem] = useState<Problem | null>(null);
  const submit = async (values: V) => {
    setProblem(null);
    try {
      await send(values);
    } catch (error) {
      if (!(error instanceof Refusal)) throw error;
      for (const [name, message] of Object.entries(error.problem.fields ?? {})) {
        if (fields.some((field) => field.name === name)) form.setError(name as Path<V>, { message });
      }
      setProblem(error.problem);
      throw error;
    }
  };
  const hydrated = useHydrated();
  const { isSubmitting, isSubmitSuccessful } = form.formState;
  const onSubmit = form.handleSubmit(submit);
  return (
    // post: should the browser ever send it itself, no password ends up in an address.
    <form
      noValidate
      method="post"
      onSubmit={(event) => void onSubmit(event).catch((error: unknown) => setProblem(problemOf(error)))}
    >
      <fieldset disabled={!hydrated} className="flex max-w-form flex-col gap-4">
        {problem && <ProblemNotice problem={problem} />}
        {fields.map(({ name, label, type = 'text', autoComplete, why }) => (
          <Controller
            key={name}
            control={form.control}
            name={name as unknown as Path<V>}
            render={({ field, fieldState }) => (
              <TextField
                label={label}
                type={type}
                autoComplete={autoComplete}
                why={why}
                name={name}
                value={field.value}
                onChange={field.onChange}
                onBlur={field.onBlur}
                wrong={fieldState.error?.message}
              />
            )}
          />
        ))}
        <div className="flex flex-wrap items-center gap-4">
          <Button type="submit" kind={kind} isDisabled={isSubmitting}>
            {button}
          </Button>
          {isSubmitSuccessful && done && !problem && (
            <p role="status" className="text-15 text-good">
              {done}
            </p>
          )}
        </div>
      </fieldset>
    </form>
  );
}
