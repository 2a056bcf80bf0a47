import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { ComboBox } from '../ComboBox';
import { Dialog } from '../Dialog';
import { ProblemNotice } from '../Notice';
import { Part } from './Part';
import { WalkInForm } from './WalkInForm';

interface Props {
  value: number | null;
  onChange: (customerId: number | null) => void;
}

/** For staff: whose order it is. A walk-in customer can be entered on the spot. */
export function CustomerChoice({ value, onChange }: Props) {
  const [entering, setEntering] = useState(false);
  const people = useQuery({
    queryKey: ['people', 'customer'],
    queryFn: async ({ signal }) =>
      (await call('GET /api/people', { query: { role: 'customer' }, signal })).people,
  });
  const choices = (people.data ?? []).map((person) => ({
    id: String(person.id),
    name: person.name,
    words: person.email,
  }));
  return (
    <Part title="Customer" words="Whose order this is. It cannot be changed once the draft is open.">
      {people.isError && <ProblemNotice problem={problemOf(people.error)} />}
      <ComboBox
        key={choices.length}
        label="Customer"
        choices={choices}
        value={value === null ? null : String(value)}
        onChange={(id) => onChange(id === null ? null : Number(id))}
        placeholder="Name"
      />
      <div>
        <Button onPress={() => setEntering(true)}>Enter a walk-in customer</Button>
      </div>
      <Dialog title="Walk-in customer" isOpen={entering} onClose={() => setEntering(false)}>
        <WalkInForm
          onEntered={async (person) => {
            await people.refetch();
            onChange(person.id);
            setEntering(false);
          }}
        />
      </Dialog>
    </Part>
  );
}
