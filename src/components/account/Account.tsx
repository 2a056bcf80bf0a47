import { useMutation } from '@tanstack/react-query';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { ConfirmAddress } from '../ConfirmAddress';
import { Island } from '../Island';
import { ProblemNotice } from '../Notice';
import { AccountForm } from './AccountForm';
import { changePasswordSchema, nameSchema } from './account-schemas';
import { NAME } from './fields';

interface Props {
  name: string;
  email: string;
  confirmed: boolean;
}

/** Own name, own password, own sessions. */
export default function Account({ name, email, confirmed }: Props) {
  return (
    <Island>
      <div className="flex max-w-form flex-col gap-10">
        {!confirmed && <ConfirmAddress email={email} />}
        <section aria-label="Name" className="flex flex-col gap-4">
          <h2>Name</h2>
          <AccountForm
            schema={nameSchema}
            fields={[NAME]}
            initial={{ name }}
            button="Keep name"
            send={(body) => call('PATCH /api/account', { body })}
            done="Kept."
            kind="outlined"
          />
        </section>
        <section aria-label="Password" className="flex flex-col gap-4">
          <h2>Password</h2>
          <AccountForm
            schema={changePasswordSchema}
            fields={[
              {
                name: 'currentPassword',
                label: 'Present password',
                type: 'password',
                autoComplete: 'current-password',
              },
              {
                name: 'newPassword',
                label: 'New password',
                type: 'password',
                autoComplete: 'new-password',
                why: 'At least 10 characters; a short sentence works well.',
              },
            ]}
            initial={{ currentPassword: '', newPassword: '' }}
            button="Change password"
            send={(body) => call('PATCH /api/account', { body })}
            done="Changed. Other devices are signed out."
            kind="outlined"
          />
        </section>
        <Sessions />
      </div>
    </Island>
  );
}

function Sessions() {
  const end = useMutation({
    mutationFn: () => call('POST /api/account/sign-out-everywhere', { body: {} }),
    onSuccess: () => window.location.assign('/?said=signed-out-everywhere'),
  });
  return (
    <section aria-label="Sessions" className="flex flex-col items-start gap-4">
      <h2>Sessions</h2>
      <p className="text-15 text-quiet">Signs you out here and on every other device.</p>
      {end.isError && <ProblemNotice problem={problemOf(end.error)} />}
      <Button onPress={() => end.mutate()} isDisabled={end.isPending}>
        Sign out everywhere
      </Button>
    </section>
  );
}
