import { useState } from 'react';
import type { OrderEvent } from '@/lib/orders/state';
import type { OrderView } from '@/lib/orders/views';
import { problemOf } from '../api';
import { Button } from '../Button';
import { ProblemNotice } from '../Notice';
import { useOrderEvent } from '../use-order';
import { EventDialog } from './EventDialog';
import { EVENT_FORMS, ONWARD } from './events';

interface Props {
  order: OrderView;
  /** events offered on this page; the server decides which of them can happen */
  offered: readonly OrderEvent[];
  /** the page's one filled button is elsewhere */
  quiet?: boolean;
}

/** What can be done with the order now: the next step filled, why a step must wait said beside it, the rest as words. */
export function Steps({ order, offered, quiet = false }: Props) {
  const [open, setOpen] = useState<OrderEvent | null>(null);
  const move = useOrderEvent(order);
  const possible = offered.filter((event) => order.events.includes(event) && EVENT_FORMS[event]);
  const onward = ONWARD.filter((event) => possible.includes(event));
  const others = possible.filter((event) => !onward.includes(event));
  const waiting = onward.filter((event) => order.waitsFor[event]);
  const act = (event: OrderEvent) => {
    const form = EVENT_FORMS[event];
    if (form?.ask) setOpen(event);
    else if (form) move.mutate(form.body({}, order));
  };
  const form = open ? EVENT_FORMS[open] : undefined;
  return (
    <section aria-label="Next steps" className="flex flex-col gap-3">
      <div className="flex flex-wrap items-center gap-2">
        {onward.map((event, index) => (
          <Button
            key={event}
            kind={index === 0 && !quiet && !order.waitsFor[event] ? 'filled' : 'outlined'}
            isDisabled={move.isPending || Boolean(order.waitsFor[event])}
            onPress={() => act(event)}
          >
            {EVENT_FORMS[event]?.name}
          </Button>
        ))}
        {others.map((event) => (
          <Button
            key={event}
            kind="text"
            isDisabled={move.isPending || Boolean(order.waitsFor[event])}
            onPress={() => act(event)}
          >
            {EVENT_FORMS[event]?.name}
          </Button>
        ))}
      </div>
      {waiting.map((event) => (
        <p key={event} className="text-15 text-quiet">
          <span className="font-semibold">{EVENT_FORMS[event]?.name}:</span> {order.waitsFor[event]}
        </p>
      ))}
      {move.error && !open && <ProblemNotice problem={problemOf(move.error)} />}
      {open && form && (
        <EventDialog
          key={open}
          title={form.title}
          intro={form.intro}
          fields={form.fields}
          confirm={form.name}
          stop={form.stop}
          onConfirm={(answers) => move.mutateAsync(form.body(answers, order))}
          onClose={() => setOpen(null)}
        />
      )}
    </section>
  );
}
