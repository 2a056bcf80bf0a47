import { config } from '../../config';
import { siteUrl } from '../address';
import { dress, type Mail } from '../letter';

/** Asks whoever registered to confirm the address. */
export function confirmMail(to: { name: string; token: string }): Mail {
  return dress('confirm', {
    subject: `Confirm your address for ${config().shopName}`,
    greeting: to.name,
    plate: { title: config().shopName, line: 'Your account' },
    sentence: 'Confirm this address, so that we can write to you about your orders.',
    paragraphs: ['You can draw up an order at once; it can be sent in when the address is confirmed.'],
    action: { label: 'Confirm this address', url: siteUrl('/confirm', { token: to.token }) },
    margin:
      'The link works once, for seven days. If you did not register, leave this mail; nothing will happen.',
  });
}
