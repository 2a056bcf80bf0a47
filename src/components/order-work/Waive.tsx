import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Finding } from '@/lib/preflight/finding';
import type { OrderView } from '@/lib/orders/views';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { ProblemNotice } from '../Notice';
import { dayWords } from '../time-words';
import { orderKey } from '../use-order';
import { EventDialog } from './EventDialog';

interface Props {
  order: OrderView;
  finding: Finding;
  artworkVersion: number;
  /** the person may decide, and the order is still open to it */
  mayWaive: boolean;
}

/** Below a finding: waive it with a reason, or the waiver that stands and the way to take it back. */
export function Waive({ order, finding, artworkVersion, mayWaive }: Props) {
  const [asking, setAsking] = useState(false);
  const queries = useQueryClient();
  const params = { number: order.number };
  const keep = (answer: { order: OrderView }) => queries.setQueryData(orderKey(order.number), answer.order);
  const waive = useMutation({
    mutationFn: (reason: string) =>
      call('POST /api/orders/:number/waivers', {
        params,
        body: { version: order.version, findingId: finding.id, reason },
      }),
    onSuccess: keep,
  });
  const takeBack = useMutation({
    mutationFn: () =>
      call('DELETE /api/orders/:number/waivers/:findingId', { params: { ...params, findingId: finding.id } }),
    onSuccess: keep,
  });
  const waiver = order.waivers.find((w) => w.findingId === finding.id && w.artworkVersion === artworkVersion);
  if (waiver) {
    return (
      <div className="mt-2 text-13 text-ink">
        <p className="pl-2">
          <span className="font-semibold">Waived</span> by {waiver.by}, {dayWords(waiver.at)}: {waiver.reason}
        </p>
        {mayWaive && (
          <Button kind="text" onPress={() => takeBack.mutate()} isDisabled={takeBack.isPending}>
            Take the waiver back
          </Button>
        )}
        {takeBack.error && <ProblemNotice problem={problemOf(takeBack.error)} />}
      </div>
    );
  }
  if (finding.severity === 'note' || !mayWaive) return null;
  if (!finding.waivable) return <p className="mt-1 pl-2 text-13 text-quiet">This cannot be waived.</p>;
  return (
    <>
      <Button kind="text" onPress={() => setAsking(true)}>
        Waive with a reason
      </Button>
      {asking && (
        <EventDialog
          title={`Waive: ${finding.title.toLowerCase()}`}
          intro="Your name, the time and the reason stay with the order and on the ticket."
          fields={[{ name: 'reason', label: 'Reason', kind: 'long-words', least: 3 }]}
          confirm="Waive this finding"
          onConfirm={(answers) => waive.mutateAsync(String(answers.reason ?? '').trim())}
          onClose={() => setAsking(false)}
        />
      )}
    </>
  );
}
