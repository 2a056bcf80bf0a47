import { config } from '../../config';
import { siteUrl } from '../address';
import { dress, type Mail } from '../letter';

/** Carries the link that sets a new password. */
export function resetMail(to: { name: string; token: string }): Mail {
  return dress('reset', {
    subject: `Set a new password for ${config().shopName}`,
    greeting: to.name,
    plate: { title: config().shopName, line: 'Your account' },
    sentence: 'You asked for a new password. Set it with the link below.',
    paragraphs: ['Setting it signs you out everywhere else.'],
    action: { label: 'Set a new password', url: siteUrl('/reset', { token: to.token }) },
    margin:
      'The link works once, for one hour. If you did not ask, leave this mail; your password stays as it is.',
  });
}
