import { config } from '../../config';
import { siteUrl } from '../address';
import { dress, type Mail } from '../letter';

/** Invites somebody to work in the shop. */
export function invitationMail(to: { role: string; invitedBy: string; token: string }): Mail {
  return dress('invitation', {
    subject: `${config().shopName} invites you to its workshop`,
    greeting: '',
    plate: { title: config().shopName, line: `Invitation as ${to.role}` },
    sentence: `${to.invitedBy} invites you to work with ${config().shopName} as ${to.role}.`,
    paragraphs: ['Choose a name and a password, and you can begin.'],
    action: { label: 'Accept the invitation', url: siteUrl('/invitation', { token: to.token }) },
    margin: 'The link works once, for seven days. If you do not know the shop, leave this mail.',
  });
}
