import type { Role } from '@/lib/orders/state';
import type { OrderView } from '@/lib/orders/views';
import { CautionList } from '../CautionList';
import { Island } from '../Island';
import { LifeRule } from '../LifeRule';
import { LinkButton } from '../LinkButton';
import { Notice } from '../Notice';
import { newestArtwork, pictureOf } from '../newest-artwork';
import { PlacementFigure } from '../PlacementFigure';
import { NEXT_WORDS } from '../state-words';
import { useOrder } from '../use-order';
import { useProgress } from '../use-progress';
import { fieldPairs } from '../words';
import { CancelOrder } from './CancelOrder';
import { History } from './History';
import { NewArtwork } from './NewArtwork';
import { OrderArtwork } from './OrderArtwork';
import { Proof } from './Proof';
import { proofOf, reachedState } from './proof-of';

interface Props {
  initial: OrderView;
  role: Role;
}

export default function OrderPage(props: Props) {
  return (
    <Island>
      <Order {...props} />
    </Island>
  );
}

/** One order: its life on the rule, the plate, what can be decided now, and all that was said. */
function Order({ initial, role }: Props) {
  const tasks = useProgress(initial.number);
  const order = useOrder(initial.number, initial).data ?? initial;
  const proof = proofOf(order);
  const { fields } = order;
  return (
    <div className="flex flex-col gap-10">
      <header className="flex flex-col gap-4">
        <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-2">
          <h1>
            {order.number}
            {fields.title && <span className="font-normal"> {fields.title}</span>}
          </h1>
          <StaffLink order={order} role={role} />
        </div>
        <LifeRule state={order.state} reached={reachedState(order)} />
        <p>{NEXT_WORDS[order.state]}</p>
        {order.heldBecause && <Notice kind="warning" title="On hold." detail={order.heldBecause} />}
        {order.state === 'draft' && (
          <div>
            <LinkButton kind="filled" href={`/orders/new?draft=${order.number}`}>
              Go on with this draft
            </LinkButton>
          </div>
        )}
      </header>
      {proof ? (
        <Proof order={order} proof={proof} role={role} />
      ) : (
        <OrderArtwork order={order} tasks={tasks} />
      )}
      <section aria-label="What was ordered" className="grid gap-10 border-t border-hair pt-6 lg:grid-cols-2">
        <div>
          <h2 className="mb-4">What was ordered</h2>
          <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-2 text-15">
            {fieldPairs(fields, order.stock?.name ?? null).map(([name, words]) => (
              <div key={name} className="contents">
                <dt className="text-quiet">{name}</dt>
                <dd className="min-w-0 break-words">{words}</dd>
              </div>
            ))}
          </dl>
        </div>
        {fields.blank && fields.widthMm !== null && fields.heightMm !== null && (
          <PlacementFigure
            blank={fields.blank}
            placement={fields.placement}
            artworkMm={{ widthMm: fields.widthMm, heightMm: fields.heightMm }}
            pictureUrl={pictureOf(newestArtwork(order.artworks))}
            groundColour={order.stock?.groundColour}
          />
        )}
      </section>
      <CautionList cautions={order.cautions} />
      <History entries={order.history} />
      <div className="flex flex-wrap items-start gap-4">
        {order.events.includes('new-artwork') && order.state !== 'draft' && <NewArtwork order={order} />}
        {order.events.includes('cancel') && <CancelOrder order={order} />}
      </div>
    </div>
  );
}

function StaffLink({ order, role }: { order: OrderView; role: Role }) {
  if (role === 'customer' || order.state === 'draft') return null;
  const at = role === 'operator' ? `/tickets/${order.number}` : `/queue/${order.number}`;
  return <LinkButton href={at}>{role === 'operator' ? 'Open the ticket' : 'Open in the queue'}</LinkButton>;
}
