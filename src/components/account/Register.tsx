import { signIn } from 'auth-astro/client';
import { call } from '../api';
import { Island } from '../Island';
import { AccountForm } from './AccountForm';
import { registerSchema } from './account-schemas';
import { EMAIL, NAME, NEW_PASSWORD } from './fields';

/** Opens an account and goes on signed in; the address is confirmed by mail before the first order is submitted. */
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
          const { email, password } = body;
          await signIn('credentials', { email, password, redirect: false, callbackUrl: next } as Parameters<
            typeof signIn
          >[1]);
          // An address that is known already is not given away: whoever owns it finds a mail, the other a sign-in page.
          window.location.assign(next);
        }}
      />
    </Island>
  );
}
