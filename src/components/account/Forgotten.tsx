import { call } from '../api';
import { Island } from '../Island';
import { AccountForm } from './AccountForm';
import { forgottenSchema } from './account-schemas';
import { EMAIL } from './fields';

export default function Forgotten() {
  return (
    <Island>
      <AccountForm
        schema={forgottenSchema}
        fields={[EMAIL]}
        initial={{ email: '' }}
        button="Send the link"
        send={(body) => call('POST /api/account/forgotten', { body })}
        done="If there is an account with this address, a mail is on its way."
      />
    </Island>
  );
}
