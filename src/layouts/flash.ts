/** Sentences that a page may be opened with, by their name in `?said=`; nothing from the address is ever printed. */
const SAID = {
  'signed-out': 'You are signed out.',
  registered: 'We have sent you a mail: open its link to confirm your address. Sign in to begin meanwhile.',
  confirmed: 'Your address is confirmed.',
  'new-password': 'Your new password is set. Sign in with it.',
  joined: 'Welcome to the shop. Sign in with your new password.',
  submitted: 'Your order is with us. We look at it next.',
  'signed-out-everywhere': 'You are signed out on every device.',
} as const;

export type Said = keyof typeof SAID;

export function flashOf(url: URL): string | null {
  const name = url.searchParams.get('said');
  return name !== null && Object.hasOwn(SAID, name) ? SAID[name as Said] : null;
}
