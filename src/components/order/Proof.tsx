import type { Role } from '@/lib/orders/state';
import type { OrderView } from '@/lib/orders/views';
import { useState } from 'react';
import { problemOf } from '../api';
import { Button } from '../Button';
import { Dialog } from '../Dialog';
import { ProblemNotice } from '../Notice';
import { Plate } from '../Plate';
import { useOrderEvent } from '../use-order';
import { shadeWords, sizeWords, timeWords, TREATMENT_NAMES } from '../words';
import type { ProofFacts } from './proof-of';
import { TrueSize } from './TrueSize';
import { WordsForm } from './WordsForm';

interface Props {
  order: OrderView;
  proof: ProofFacts;
  role: Role;
}

/** What will come out: the forecast on its stock, the sentence, the true size; and the decision. */
export function Proof({ order, proof, role }: Props) {
  const { report } = proof;
  const { settings } = report;
  return (
    <section aria-label="Proof" className="grid gap-6 lg:grid-cols-[minmax(0,1fr)_300px]">
      <Plate
        src={proof.forecastUrl}
        alt={`Burn forecast of ${order.fields.title || order.number}`}
        widthMm={settings.widthMm}
        heightMm={settings.heightMm}
        linePitchMm={settings.scan.linePitchMm}
        laidDown
      />
      <aside className="flex flex-col gap-6" aria-label="Decision">
        <div className="flex flex-col gap-2">
          <h2>Proof</h2>
          <p>
            Engraved as <strong className="font-semibold">{TREATMENT_NAMES[settings.treatment]}</strong>,{' '}
            <strong className="font-semibold">{sizeWords(settings.widthMm, settings.heightMm)}</strong>
            {order.stock && (
              <>
                , on <strong className="font-semibold">{order.stock.name}</strong>
              </>
            )}
            , shade <strong className="font-semibold">{shadeWords(order.fields.shadeLstar)}</strong>.
          </p>
          <p className="text-13 text-quiet">
            This is a forecast, computed from the very file that will be run. Wood differs from board to
            board, so the brown will differ a little.
          </p>
          <TrueSize src={proof.forecastUrl} widthMm={settings.widthMm} heightMm={settings.heightMm} />
        </div>
        <Decision order={order} proof={proof} role={role} />
      </aside>
    </section>
  );
}

function Decision({ order, proof, role }: Props) {
  const [asking, setAsking] = useState(false);
  const approve = useOrderEvent(order);
  const changes = useOrderEvent(order);
  if (order.approved) {
    return (
      <p className="text-15 text-good">
        Approved by {order.approved.by}, {timeWords(order.approved.at)}.
      </p>
    );
  }
  // Staff record an approval given in person on the designer’s page or the ticket’s.
  if (role !== 'customer' || !order.events.includes('approve')) return null;
  return (
    <div className="flex flex-col gap-4 border-t border-hair pt-6">
      {approve.error && <ProblemNotice problem={problemOf(approve.error)} />}
      <Button
        kind="filled"
        isDisabled={approve.isPending}
        onPress={() =>
          approve.mutate({ event: 'approve', manifestSha256: proof.manifestSha256, inPerson: null })
        }
      >
        Approve proof
      </Button>
      <Button onPress={() => setAsking(true)}>Ask for changes</Button>
      <p className="text-13 text-quiet">
        Your approval is for exactly this file. If anything in it changes, we ask again.
      </p>
      <Dialog title="Ask for changes" isOpen={asking} onClose={() => setAsking(false)}>
        <WordsForm
          label="What should be different"
          why="As plainly as you can: larger, lighter, this line thicker, that word gone."
          button="Send to the shop"
          error={changes.error}
          isPending={changes.isPending}
          onSend={(words) =>
            changes.mutate({ event: 'ask-for-changes', words }, { onSuccess: () => setAsking(false) })
          }
        />
      </Dialog>
    </div>
  );
}
