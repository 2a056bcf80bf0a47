import { config } from '../../config';
import { siteUrl } from '../address';
import { dress, type Mail } from '../letter';

/** Tells the owner of an address that somebody tried to register with it again; the page itself says nothing. */
export function knownAddressMail(to: { name: string }): Mail {
  return dress('known-address', {
    subject: `You already have an account at ${config().shopName}`,
    greeting: to.name,
    plate: { title: config().shopName, line: 'Your account' },
    sentence: 'Somebody, perhaps you, tried to register with this address, which already has an account.',
    paragraphs: [
      'Nothing was changed. Sign in as before, or set a new password if you have lost the old one.',
    ],
    action: { label: 'Set a new password', url: siteUrl('/forgotten') },
    margin: 'If it was not you, leave this mail: whoever tried was told nothing about your account.',
  });
}
