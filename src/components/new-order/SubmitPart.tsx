import { useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import type { OrderView } from '@/lib/orders/views';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { CautionList } from '../CautionList';
import { Checkbox } from '../Checkbox';
import { ConfirmAddress } from '../ConfirmAddress';
import { newestArtwork } from '../newest-artwork';
import { ProblemNotice } from '../Notice';
import { missingWords, type DraftForm } from './draft-form';
import { Part } from './Part';
import type { Draft } from './use-draft';

interface Props {
  draft: Draft;
  /** customer whose address is not confirmed, or null */
  unconfirmedEmail: string | null;
}

/** Cautions, rights, and the one filled button of the page. */
export function SubmitPart({ draft, unconfirmedEmail: unconfirmedAtFirst }: Props) {
  const unconfirmedEmail = useUnconfirmed(unconfirmedAtFirst);
  const [rights, setRights] = useState(false);
  const [asked, setAsked] = useState(false);
  const form = useWatch({ control: useFormContext<DraftForm>().control }) as DraftForm;
  const isSaid = form.blank.stockId !== null || form.blank.source === 'customer';
  const missing = missingWords(form, (draft.order?.artworks.length ?? 0) > 0);
  const waits = missing.length === 0 ? draft.order?.waitsFor.submit : undefined;
  const submit = useMutation({
    mutationFn: () => submitOrder(draft),
    onSuccess: ({ number }) => window.location.assign(`/orders/${number}?said=submitted`),
  });
  const press = () => {
    setAsked(true);
    if (rights && missing.length === 0) submit.mutate();
  };
  return (
    <Part title="Submit" beside={draft.order && isSaid && <CautionList cautions={draft.order.cautions} />}>
      <Checkbox
        isSelected={rights}
        onChange={setRights}
        wrong={
          asked && !rights
            ? 'Tick this first: without the right to the artwork we cannot engrave it.'
            : undefined
        }
      >
        The artwork is mine, or I have the right to have it engraved.
      </Checkbox>
      {missing.length > 0 && (asked || draft.order) && (
        <div role={asked ? 'alert' : undefined} className="text-15">
          <p className="font-semibold">Still missing:</p>
          <ul className="list-disc pl-6">
            {missing.map((words) => (
              <li key={words}>{words}</li>
            ))}
          </ul>
        </div>
      )}
      {unconfirmedEmail ? (
        <ConfirmAddress email={unconfirmedEmail} />
      ) : (
        waits && !submit.isPending && <p className="text-15 text-warning">{waits}</p>
      )}
      {submit.isError && <ProblemNotice problem={problemOf(submit.error)} />}
      {draft.problem && draft.keeping === 'not-kept' && <ProblemNotice problem={draft.problem} />}
      <div className="flex flex-wrap items-center gap-4">
        <Button kind="filled" onPress={press} isDisabled={submit.isPending || unconfirmedEmail !== null}>
          Submit order
        </Button>
        <p role="status" className="text-13 text-quiet">
          {submit.isPending
            ? 'Looking at the artwork at this size, then the order goes off'
            : keptWords(draft)}
        </p>
      </div>
    </Part>
  );
}

function keptWords({ order, keeping }: Draft): string {
  if (keeping === 'keeping') return 'Keeping what you entered';
  if (keeping === 'not-kept') return 'Not kept on the server yet. It stays on this page.';
  return order ? `Draft ${order.number} is kept. You can leave and come back.` : '';
}

const CHECK_AGAIN_MS = 400;
const PATIENCE_MS = 120_000;

/** The order once nothing is being looked at any more: a change of size just before submitting starts a check. */
async function whenChecked(number: string): Promise<OrderView> {
  const until = performance.now() + PATIENCE_MS;
  for (;;) {
    const { order } = await call('GET /api/orders/:number', { params: { number } });
    const state = newestArtwork(order.artworks)?.task.state;
    if ((state !== 'waiting' && state !== 'running') || performance.now() > until) return order;
    await new Promise((resolve) => setTimeout(resolve, CHECK_AGAIN_MS));
  }
}

async function submitOrder(draft: Draft): Promise<OrderView> {
  const kept = await draft.keep();
  const { number, version } = await whenChecked(kept.number);
  const answer = await call('POST /api/orders/:number/events', {
    params: { number },
    body: { event: 'submit', version, rightsConfirmed: true },
  });
  return answer.order;
}

/** The address while it is not confirmed; coming back from the mail's link in another tab, it is asked again. */
function useUnconfirmed(email: string | null): string | null {
  const account = useQuery({
    queryKey: ['account'],
    queryFn: ({ signal }) => call('GET /api/account', { signal }),
    enabled: email !== null,
    staleTime: 0,
    refetchOnWindowFocus: true,
  });
  return account.data?.person?.confirmed ? null : email;
}
