import { zodResolver } from '@hookform/resolvers/zod';
import { keepPreviousData, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { roleSchema, type Role } from '@/lib/orders/state';
import type { PersonView } from '@/lib/orders/views';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { EmptyState } from '../EmptyState';
import { Island } from '../Island';
import { ProblemNotice } from '../Notice';
import { Select } from '../Select';
import { SkeletonTable } from '../SkeletonTable';
import { TextField } from '../TextField';
import { Pick, Words } from './controlled';
import { FormDialog } from './FormDialog';

const ROLE_WORDS: Record<Role, string> = {
  customer: 'Customer',
  designer: 'Designer',
  operator: 'Operator',
  admin: 'Admin',
};
const inviteSchema = z.object({
  email: z.email('Enter a whole address, such as name@example.org.').max(254),
  role: roleSchema,
});
type Invitation = z.infer<typeof inviteSchema>;
const ROLE_CHOICES = roleSchema.options.map((id) => ({ id, name: ROLE_WORDS[id] }));

function InviteForm({ onClose, onSent }: { onClose: () => void; onSent: (email: string) => void }) {
  const form = useForm<Invitation>({
    resolver: zodResolver(inviteSchema),
    defaultValues: { email: '', role: 'designer' },
  });
  const send = useMutation({
    mutationFn: (body: Invitation) => call('POST /api/people/invitations', { body }),
    onSuccess: (_, { email }) => {
      onSent(email);
      onClose();
    },
  });
  return (
    <FormDialog
      title="Invite staff"
      confirm="Send invitation"
      isBusy={send.isPending}
      error={send.error}
      onSubmit={() => void form.handleSubmit((body) => send.mutate(body))()}
      onClose={onClose}
    >
      <Words control={form.control} name="email" type="email" label="E-mail address" />
      <Pick
        control={form.control}
        name="role"
        label="Role"
        choices={ROLE_CHOICES.filter(({ id }) => id !== 'customer')}
      />
    </FormDialog>
  );
}

function PersonEntry({ person, isSelf }: { person: PersonView; isSelf: boolean }) {
  const queries = useQueryClient();
  const change = useMutation({
    mutationFn: (body: { role?: Role; disabled?: boolean }) =>
      call('PATCH /api/people/:id', { params: { id: person.id }, body }),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['people'] }),
  });
  return (
    <li className="grid items-center gap-x-6 gap-y-2 border-b border-hair py-3 text-15 md:grid-cols-[minmax(0,1fr)_180px_180px]">
      <div className="min-w-0">
        <p className="font-semibold">
          {person.name}
          {isSelf && <span className="font-normal text-quiet">, you</span>}
        </p>
        <p className="break-all text-13 text-quiet">
          {person.email}
          {!person.confirmed && ', address not confirmed'}
          {person.disabled && <span className="stop">, disabled</span>}
        </p>
        {change.error && <ProblemNotice problem={problemOf(change.error)} />}
      </div>
      <Select
        label={`Role of ${person.name}`}
        hideLabel
        value={person.role}
        onChange={(id) => change.mutate({ role: roleSchema.parse(id) })}
        choices={ROLE_CHOICES}
        isDisabled={change.isPending}
      />
      <Button
        kind={person.disabled ? 'outlined' : 'text'}
        isDisabled={change.isPending}
        onPress={() => change.mutate({ disabled: !person.disabled })}
      >
        {person.disabled ? 'Enable again' : 'Disable'}
        <span className="hidden-words"> {person.name}</span>
      </Button>
    </li>
  );
}

function List({ selfId }: { selfId: number }) {
  const [q, setQ] = useState('');
  const [role, setRole] = useState<Role | 'any'>('any');
  const [inviting, setInviting] = useState(false);
  const [sent, setSent] = useState<string | null>(null);
  const query = { q, role: role === 'any' ? undefined : role };
  const { data, error, isPending } = useQuery({
    queryKey: ['people', query],
    queryFn: ({ signal }) => call('GET /api/people', { query, signal }),
    placeholderData: keepPreviousData,
  });
  return (
    <div className="flex flex-col gap-6">
      <div className="flex flex-wrap items-center gap-4">
        <Button kind="filled" onPress={() => setInviting(true)}>
          Invite staff
        </Button>
        {sent && <p role="status">An invitation is on its way to {sent}.</p>}
      </div>
      <form
        role="search"
        className="grid items-end gap-4 md:grid-cols-[minmax(0,1fr)_180px]"
        onSubmit={(event) => event.preventDefault()}
      >
        <TextField
          label="Search"
          type="search"
          value={q}
          onChange={(words) => setQ(words.slice(0, 100))}
          placeholder="Name or address"
        />
        <Select
          label="Role"
          value={role}
          onChange={(id) => setRole(roleSchema.options.find((known) => known === id) ?? 'any')}
          choices={[{ id: 'any', name: 'Any role' }, ...ROLE_CHOICES]}
        />
      </form>
      {error && <ProblemNotice problem={problemOf(error)} />}
      {isPending && !error && <SkeletonTable columns={3} words="Fetching people" />}
      {data?.people.length === 0 && <EmptyState words="Nobody fits this search." />}
      <ul className="flex flex-col">
        {data?.people.map((person) => (
          <PersonEntry key={person.id} person={person} isSelf={person.id === selfId} />
        ))}
      </ul>
      {inviting && <InviteForm onClose={() => setInviting(false)} onSent={setSent} />}
    </div>
  );
}

/** Customers and staff: invite, change a role, disable. The last admin stays one; the server sees to it. */
export function People(props: { selfId: number }) {
  return (
    <Island>
      <List {...props} />
    </Island>
  );
}
