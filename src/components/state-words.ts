import type { OrderState } from '@/lib/orders/state';

/** Names of an order's states as people read them. */
export const STATE_WORDS: Record<OrderState, string> = {
  draft: 'Draft',
  submitted: 'Submitted',
  'in-preparation': 'In preparation',
  passed: 'Passed',
  'proof-sent': 'Proof sent',
  approved: 'Approved',
  released: 'Released',
  running: 'Running',
  finished: 'Finished',
  'handed-over': 'Handed over',
  'on-hold': 'On hold',
  cancelled: 'Cancelled',
};

/** The straight life of an order, in its order. */
export const LIFE: readonly OrderState[] = [
  'draft',
  'submitted',
  'in-preparation',
  'passed',
  'proof-sent',
  'approved',
  'released',
  'running',
  'finished',
  'handed-over',
];

/** What happens next, in a customer's words. */
export const NEXT_WORDS: Record<OrderState, string> = {
  draft: 'Not submitted yet.',
  submitted: 'We look at it next.',
  'in-preparation': 'We are preparing your artwork.',
  passed: 'The proof comes next.',
  'proof-sent': 'Your proof is ready: look at it and approve it, or ask for changes.',
  approved: 'Approved. We put it on the machine’s list next.',
  released: 'It waits for the machine.',
  running: 'It is on the machine now.',
  finished: 'Finished. Collect it, or we send it.',
  'handed-over': 'It is with you.',
  'on-hold': 'It waits. The reason stands below.',
  cancelled: 'Cancelled. Nothing more happens with it.',
};
