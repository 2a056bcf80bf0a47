import { call } from '../api';
import { Island } from '../Island';
import { AccountForm } from './AccountForm';
import { invitationSchema } from './account-schemas';
import { NAME, NEW_PASSWORD } from './fields';

export default function Invitation({ token }: { token: string }) {
  return (
    <Island>
      <AccountForm
        schema={invitationSchema}
        fields={[NAME, NEW_PASSWORD]}
        initial={{ name: '', password: '' }}
        button="Join the shop"
        send={async (body) => {
          await call('POST /api/account/invitation', { body: { token, ...body } });
          window.location.assign('/sign-in?said=joined');
        }}
      />
    </Island>
  );
}
