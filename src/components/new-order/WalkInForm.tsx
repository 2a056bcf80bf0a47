import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation } from '@tanstack/react-query';
import { Controller, useForm } from 'react-hook-form';
import type { PersonView } from '@/lib/orders/views';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { ProblemNotice } from '../Notice';
import { TextField } from '../TextField';
import { walkInSchema, type WalkIn } from '../account/account-schemas';

/** Name and address of a customer who stands at the counter. */
export function WalkInForm({ onEntered }: { onEntered: (person: PersonView) => void }) {
  const form = useForm<WalkIn>({
    resolver: zodResolver(walkInSchema),
    defaultValues: { name: '', email: '' },
  });
  const enter = useMutation({
    mutationFn: (body: WalkIn) => call('POST /api/people/walk-ins', { body }),
    onSuccess: ({ person }) => onEntered(person),
  });
  return (
    <form
      noValidate
      className="flex flex-col gap-4"
      onSubmit={(event) => void form.handleSubmit((values) => enter.mutate(values))(event)}
    >
      {enter.isError && <ProblemNotice problem={problemOf(enter.error)} />}
      <Controller
        control={form.control}
        name="name"
        render={({ field, fieldState }) => (
          <TextField
            label="Name"
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            wrong={fieldState.error?.message}
          />
        )}
      />
      <Controller
        control={form.control}
        name="email"
        render={({ field, fieldState }) => (
          <TextField
            label="E-mail address"
            type="email"
            value={field.value}
            onChange={field.onChange}
            onBlur={field.onBlur}
            wrong={fieldState.error?.message}
          />
        )}
      />
      <div>
        <Button type="submit" isDisabled={enter.isPending}>
          Enter customer
        </Button>
      </div>
    </form>
  );
}
