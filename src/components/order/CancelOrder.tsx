import type { OrderView } from '@/lib/orders/views';
import { useState } from 'react';
import { Button } from '../Button';
import { Dialog } from '../Dialog';
import { useOrderEvent } from '../use-order';
import { WordsForm } from './WordsForm';

/** Cancels with a reason, asked for in front of the page. */
export function CancelOrder({ order }: { order: OrderView }) {
  const [asking, setAsking] = useState(false);
  const cancel = useOrderEvent(order);
  return (
    <>
      <Button kind="stop" onPress={() => setAsking(true)}>
        Cancel order
      </Button>
      <Dialog
        title={`Cancel ${order.number}`}
        isOpen={asking}
        onClose={() => setAsking(false)}
        role="alertdialog"
      >
        <p className="text-15">
          Nothing is engraved, and the order stays in your list as cancelled. This cannot be taken back.
        </p>
        <WordsForm
          label="Why"
          button="Cancel order"
          kind="stop"
          error={cancel.error}
          isPending={cancel.isPending}
          onSend={(reason) =>
            cancel.mutate({ event: 'cancel', reason }, { onSuccess: () => setAsking(false) })
          }
        />
      </Dialog>
    </>
  );
}
