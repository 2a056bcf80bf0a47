import type { Problem } from '../orders/views';

interface Refusal {
  status: number;
  /** what happened */
  title: string;
  /** why */
  detail: string;
  /** what to do */
  action: string;
}

/** Every refusal that a person may be shown, with its status: the one table. */
// prettier-ignore
export const REFUSALS = {
  'not-signed-in': { status: 401, title: 'You are not signed in.', detail: 'This needs to know who you are.', action: 'Sign in and try again.' },
  'not-allowed': { status: 403, title: 'This is not yours to do.', detail: 'Your role does not include it.', action: 'Ask an admin of the shop.' },
  'address-not-confirmed': { status: 403, title: 'Your address is not confirmed yet.', detail: 'We write to you about your order, so the address must be right.', action: 'Open the link in the mail we sent, or have it sent again.' },
  'cross-site': { status: 403, title: 'This request came from another site.', detail: 'Changes are taken from our own pages only.', action: 'Open the page here and try again.' },
  'not-found': { status: 404, title: 'There is nothing here.', detail: 'The address is wrong, or the thing is not yours to see.', action: 'Check the address, or start from your orders.' },
  'malformed': { status: 422, title: 'Something in the form does not fit.', detail: 'The marked fields could not be read.', action: 'Correct them and send again.' },
  'unreadable-body': { status: 400, title: 'The request could not be read.', detail: 'Its body is not well-formed JSON.', action: 'Reload the page and try again.' },
  'too-large': { status: 413, title: 'That is too large.', detail: 'It is over the limit for this address.', action: 'Send less, or a smaller file.' },
  'wrong-media-type': { status: 415, title: 'The request is of the wrong kind.', detail: 'This address takes another media type.', action: 'Use the site’s own pages.' },
  'too-many': { status: 429, title: 'Too many attempts.', detail: 'We slow down repeated attempts to keep accounts safe.', action: 'Wait a few minutes and try again.' },
  'broken': { status: 500, title: 'Something broke on our side.', detail: 'It has been written down; nothing of yours is lost.', action: 'Try again in a minute.' },

  'conflict': { status: 409, title: 'This changed meanwhile.', detail: 'Somebody else, or another tab, was quicker.', action: 'Look at the present state and decide again.' },
  'not-now': { status: 409, title: 'That cannot happen now.', detail: 'The order is not in a state that allows it.', action: 'Look at the present state of the order.' },

  'artwork-refused': { status: 422, title: 'This file cannot be used.', detail: 'It could not be read as artwork.', action: 'Export it again as PNG, TIFF or SVG and drop it here.' },
  'artwork-too-large': { status: 413, title: 'This file is too large.', detail: 'It is over what we take.', action: 'Export it at the size at which it will be engraved and drop it here.' },

  'wrong-password': { status: 422, title: 'The present password is not right.', detail: 'A new password needs the present one.', action: 'Type it again, or have a new one set by mail.' },
  'link-spent': { status: 422, title: 'This link no longer works.', detail: 'It was used already, replaced by a newer one, or is too old.', action: 'Have a new one sent.' },
  'address-known': { status: 409, title: 'This address is already known here.', detail: 'One person has one address.', action: 'Find the person in the list and change their role there.' },
  'customers-register': { status: 422, title: 'Customers are not invited.', detail: 'Invitations are for staff; customers register themselves.', action: 'Choose designer, operator or admin, or enter a walk-in customer.' },
  'last-admin': { status: 409, title: 'This is the last admin.', detail: 'Without one nobody could manage the shop.', action: 'Make somebody else an admin first.' },
  'preset-in-use': { status: 409, title: 'This spot preset is in use.', detail: 'An order refers to it.', action: 'Keep it, or choose another spot for that order first.' },
  'wash-without-sheet': { status: 422, title: 'The darkening wash cannot be offered yet.', detail: 'It needs the shop’s own product with its safety data sheet.', action: 'Enter the wash and the address of its sheet first.' },
  'name-taken': { status: 409, title: 'This name is taken.', detail: 'Two things of the same name would be mistaken for each other.', action: 'Choose another name.' },
  'order-waits': { status: 409, title: 'Not yet.', detail: 'Something is missing first.', action: 'Put it right and try again.' },
  'no-artwork': { status: 422, title: 'No artwork arrived.', detail: 'The request holds no file in the field “artwork”.', action: 'Choose a file and send it again.' },
  'too-many-streams': { status: 429, title: 'Too many pages are open.', detail: 'Each open order keeps a line to the shop, and yours are all in use.', action: 'Close a few tabs; this page goes on by itself.' },
  'no-room': { status: 507, title: 'The shop’s disk is nearly full.', detail: 'New artwork is refused first, so that nothing stored is lost.', action: 'Tell the shop, and send it again later.' },
} as const satisfies Record<string, Refusal>;

export type RefusalCode = keyof typeof REFUSALS;

/** What a person must be told: what happened, why, what to do. */
export class AppError extends Error {
  override readonly name = 'AppError';
  readonly code: RefusalCode;
  readonly status: number;
  readonly problem: Problem;

  /** @param words replaces the table's words where the case knows better; `fields` names what was wrong by field */
  constructor(code: RefusalCode, words: Partial<Omit<Problem, 'code'>> = {}, options?: ErrorOptions) {
    const { status, ...told } = REFUSALS[code];
    super(`${code}: ${words.title ?? told.title}`, options);
    this.code = code;
    this.status = status;
    this.problem = { code, ...told, ...words };
  }
}
