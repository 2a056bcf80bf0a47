import { call } from '../api';
import { Island } from '../Island';
import { AccountForm } from './AccountForm';
import { resetSchema } from './account-schemas';
import { NEW_PASSWORD } from './fields';

export default function Reset({ token }: { token: string }) {
  return (
    <Island>
      <AccountForm
        schema={resetSchema}
        fields={[{ ...NEW_PASSWORD, label: 'New password' }]}
        initial={{ password: '' }}
        button="Set password"
        send={async ({ password }) => {
          await call('POST /api/account/reset', { body: { token, password } });
          window.location.assign('/sign-in?said=new-password');
        }}
      />
    </Island>
  );
}
