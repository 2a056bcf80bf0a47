import { call } from '../api';
import { Island } from '../Island';
import { AccountForm } from './AccountForm';
import { registerSchema } from './account-schemas';
import { EMAIL, NAME, NEW_PASSWORD } from './fields';

/** Opens an account; the address is confirmed by mail before the first order is submitted. */
export default function Register({ next }: { next: string }) {
  return (
    <Island>
      <AccountForm
        schema={registerSchema}
        fields={[NAME, EMAIL, NEW_PASSWORD]}
        initial={{ name: '', email: '', password: '' }}
        button="Open account"
        send={async (body) => {
          await call('POST /api/account/register', { body });
          // Known or new, every address leads on in the same way: only its owner's mail tells which it was.
          window.location.assign(`/sign-in?${new URLSearchParams({ said: 'registered', next })}`);
        }}
      />
    </Island>
  );
}
