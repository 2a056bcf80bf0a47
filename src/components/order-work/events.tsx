import type { ReactNode } from 'react';
import { CHECKLIST } from '@/lib/orders/checklist';
import type { OrderEvent } from '@/lib/orders/state';
import type { OrderView } from '@/lib/orders/views';
import type { EventInput } from '../use-order';
import type { Answers, AskedField } from './EventDialog';

export interface EventForm {
  /** verb and thing on the button that opens it */
  name: string;
  title: string;
  intro?: ReactNode;
  fields: readonly AskedField[];
  stop?: boolean;
  /** null: nothing is asked, the button acts at once */
  ask: boolean;
  body: (answers: Answers, order: OrderView) => EventInput;
}

const text = (value: Answers[string]): string => String(value ?? '').trim();
const reason: AskedField = {
  name: 'reason',
  label: 'Reason',
  kind: 'long-words',
  least: 3,
  why: 'It is kept in the record.',
};

/** Every step that staff can take from an order's page: its words, what it asks, and what is sent. */
export const EVENT_FORMS: Partial<Record<OrderEvent, EventForm>> = {
  take: {
    name: 'Take this order',
    title: 'Take this order',
    ask: false,
    fields: [],
    body: () => ({ event: 'take' }),
  },
  pass: {
    name: 'Pass the prepared file',
    title: 'Pass the prepared file',
    intro: 'Your name and the time go with it. Any change to artwork or choices voids the pass.',
    ask: true,
    fields: [],
    body: (_, order) => ({ event: 'pass', preparationId: order.preparations[0]?.id ?? 0 }),
  },
  'send-proof': {
    name: 'Send proof',
    title: 'Send the proof',
    intro: 'The customer gets a mail with a link to the proof.',
    ask: true,
    fields: [{ name: 'words', label: 'Words to the customer, if any', kind: 'long-words' }],
    body: (answers) => ({ event: 'send-proof', words: text(answers.words) }),
  },
  approve: {
    name: 'Record an approval in person',
    title: 'Record an approval given in person',
    intro: 'It binds to exactly what was passed, as the customer’s own would.',
    ask: true,
    fields: [
      { name: 'who', label: 'Who gave it', kind: 'words', least: 1, most: 120 },
      {
        name: 'how',
        label: 'How it was given',
        kind: 'words',
        least: 1,
        most: 200,
        why: 'Such as: at the counter, looking at the proof on the screen.',
      },
    ],
    body: (answers, order) => ({
      event: 'approve',
      manifestSha256: order.passed?.manifestSha256 ?? '',
      inPerson: { who: text(answers.who), how: text(answers.how) },
    }),
  },
  'approve-without-proof': {
    name: 'Approve without a proof',
    title: 'Approve without a proof',
    intro: 'The customer has agreed to go without. The pass and this reason stand in for the approval.',
    ask: true,
    fields: [reason],
    body: (answers) => ({ event: 'approve-without-proof', reason: text(answers.reason) }),
  },
  'ask-for-changes': {
    name: 'Record changes asked for',
    title: 'Record changes that the customer asked for',
    ask: true,
    fields: [{ name: 'words', label: 'What is to change', kind: 'long-words', least: 3, most: 2000 }],
    body: (answers) => ({ event: 'ask-for-changes', words: text(answers.words) }),
  },
  release: {
    name: 'Release to the machine',
    title: 'Release to the machine',
    intro: 'The ticket appears on the operators’ list. Stock, route and use are checked once more.',
    ask: true,
    fields: [],
    body: () => ({ event: 'release' }),
  },
  recall: {
    name: 'Recall the ticket',
    title: 'Recall the ticket',
    ask: true,
    fields: [reason],
    body: (answers) => ({ event: 'recall', reason: text(answers.reason) }),
  },
  'on-the-machine': {
    name: 'On the machine',
    title: 'On the machine',
    intro: 'Umberline records this; it never drives the machine.',
    ask: true,
    fields: CHECKLIST.map(({ id, words }) => ({ name: id, label: words, kind: 'tick' as const })),
    body: () => ({ event: 'on-the-machine', checklist: CHECKLIST.map(({ id }) => id) }),
  },
  done: {
    name: 'Done',
    title: 'Done: how did it come out?',
    ask: true,
    fields: [
      {
        name: 'words',
        label: 'What you saw, if anything',
        kind: 'long-words',
        most: 2000,
        why: 'Evenness, edges, scorch, smell: what the next recipe should know.',
      },
      { name: 'lstar', label: 'Measured shade, if measured', kind: 'figure', unit: 'L*' },
    ],
    body: (answers) => ({
      event: 'done',
      words: text(answers.words),
      measuredLstar: typeof answers.lstar === 'number' ? answers.lstar : null,
    }),
  },
  spoiled: {
    name: 'Spoiled',
    title: 'Spoiled: what happened?',
    intro: 'The order goes back to the list with a new blank.',
    ask: true,
    stop: true,
    fields: [
      { ...reason, label: 'What happened', most: 2000 },
      {
        name: 'newBlank',
        label: 'New blank',
        kind: 'words',
        least: 1,
        most: 200,
        why: 'Where it comes from: the shelf, the customer’s spare, one to be ordered.',
      },
      { name: 'cost', label: 'Cost, if known', kind: 'words', most: 60 },
    ],
    body: (answers) => ({
      event: 'spoiled',
      reason: text(answers.reason),
      newBlank: text(answers.newBlank),
      cost: text(answers.cost),
    }),
  },
  'hand-over': {
    name: 'Hand over',
    title: 'Hand over',
    ask: true,
    fields: [
      {
        name: 'how',
        label: 'How it leaves',
        kind: 'choice',
        choices: [
          { id: 'collected', name: 'Collected' },
          { id: 'sent', name: 'Sent' },
        ],
      },
      {
        name: 'byWhom',
        label: 'By whom',
        kind: 'words',
        least: 1,
        most: 120,
        why: 'Who collected it, or who sent it.',
      },
    ],
    body: (answers) => ({
      event: 'hand-over',
      how: answers.how === 'sent' ? 'sent' : 'collected',
      byWhom: text(answers.byWhom),
    }),
  },
  hold: {
    name: 'Put on hold',
    title: 'Put on hold',
    intro: 'The customer gets a mail with the reason.',
    ask: true,
    fields: [reason],
    body: (answers) => ({ event: 'hold', reason: text(answers.reason) }),
  },
  resume: { name: 'Resume', title: 'Resume', ask: false, fields: [], body: () => ({ event: 'resume' }) },
  cancel: {
    name: 'Cancel the order',
    title: 'Cancel the order',
    stop: true,
    ask: true,
    fields: [reason],
    body: (answers) => ({ event: 'cancel', reason: text(answers.reason) }),
  },
};

/** Steps that carry an order on, in the order in which they are offered; the others stand below as words. */
export const ONWARD: readonly OrderEvent[] = [
  'take',
  'resume',
  'pass',
  'send-proof',
  'approve',
  'approve-without-proof',
  'release',
  'on-the-machine',
  'done',
  'hand-over',
];
