import { signIn } from 'auth-astro/client';
import { Refusal } from '../api';
import { Island } from '../Island';
import { AccountForm } from './AccountForm';
import { signInSchema } from './account-schemas';
import { EMAIL, PASSWORD } from './fields';

const WRONG = {
  code: 'wrong-sign-in',
  title: 'That did not match.',
  detail: 'Address and password do not belong together, or there is no such account.',
  action: 'Type them again, or have a new password set by mail.',
};
const TOO_MANY = {
  code: 'too-many',
  title: 'Too many attempts.',
  detail: 'We slow down repeated attempts to keep accounts safe.',
  action: 'Wait a few minutes and try again.',
};

const BROKEN = {
  code: 'sign-in-broke',
  title: 'Signing in did not work just now.',
  detail: 'Something broke on our side; your password was not looked at.',
  action: 'Try again in a minute.',
};

function refusalOf(search: URLSearchParams): Refusal {
  if (search.get('error') !== 'CredentialsSignin') return new Refusal(500, BROKEN);
  return search.get('code') === 'too-many' ? new Refusal(429, TOO_MANY) : new Refusal(401, WRONG);
}

/** Signs in and goes where the person was heading. */
export default function SignIn({ next }: { next: string }) {
  return (
    <Island>
      <AccountForm
        schema={signInSchema}
        fields={[EMAIL, PASSWORD]}
        initial={{ email: '', password: '' }}
        button="Sign in"
        send={async ({ email, password }) => {
          const answer = await signIn('credentials', {
            email,
            password,
            redirect: false,
            callbackUrl: next,
          } as Parameters<typeof signIn>[1]);
          if (!answer) return;
          const { url } = (await answer.json()) as { url: string };
          throw refusalOf(new URL(url, window.location.href).searchParams);
        }}
      />
    </Island>
  );
}
