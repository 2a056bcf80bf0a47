import { useQuery } from '@tanstack/react-query';
import { firstDesign, placedSize } from '@/lib/orders/settings';
import type { OrderEvent } from '@/lib/orders/state';
import type { Design, MachineView, OrderView, TaskView } from '@/lib/orders/views';
import { call, problemOf } from '../api';
import { Island } from '../Island';
import { LifeRule } from '../LifeRule';
import { History } from '../order/History';
import { NewArtwork } from '../order/NewArtwork';
import { newestArtwork } from '../newest-artwork';
import { Notice, ProblemNotice } from '../Notice';
import { choiceContext } from '../sentence/context';
import { Sentence } from '../sentence/Sentence';
import { dayWords } from '../time-words';
import { useOrder } from '../use-order';
import { useProgress } from '../use-progress';
import { picturesOf } from '../viewer/pictures';
import { Viewer } from '../viewer/Viewer';
import { ArtworkCheck } from './ArtworkCheck';
import { ChangeOrder } from './ChangeOrder';
import { ArtworkVersions, OrderFacts } from './OrderFacts';
import { Prepare } from './Prepare';
import { PreparationFacts } from './PreparationFacts';
import { standingOf } from './standing';
import { isUnderWay } from './task-state';
import { Steps } from './Steps';
import { useDesign } from './use-design';
import { Waive } from './Waive';

const OFFERED: readonly OrderEvent[] = [
  'take',
  'pass',
  'send-proof',
  'approve',
  'approve-without-proof',
  'ask-for-changes',
  'release',
  'recall',
  'hand-over',
  'hold',
  'resume',
  'cancel',
];
const ON_TICKET = ['released', 'running', 'finished', 'handed-over'];

/** The choices a designer starts from where none are kept yet: the shop's first machine, the suggested treatment. */
function startingDesign(order: OrderView, machines: readonly MachineView[]): Design | null {
  const machine = machines.find((m) => !m.retired && m.spotPresets.length > 0);
  if (!machine) return null;
  const treatment =
    order.fields.treatment ?? newestArtwork(order.artworks)?.check?.artwork.suggestedTreatment ?? 'halftone';
  return firstDesign(
    { machineId: machine.id, spotPresetId: machine.spotPresets[0].id },
    machine.spotPresets[0],
    treatment,
  );
}

/** The state that an order on hold or cancelled had reached, from its history. */
function reachedState(order: OrderView) {
  return [...order.history].reverse().find((entry) => entry.to === order.state)?.from ?? null;
}

function clearWords(isChecked: boolean, isChecking: boolean): string {
  if (isChecking) return 'Notes follow once it is checked.';
  return isChecked ? 'Nothing to note on this artwork.' : 'It has not been checked yet.';
}

function Head({ order }: { order: OrderView }) {
  const { fields } = order;
  return (
    <header className="flex flex-col gap-2">
      <h1>
        <span className="figure">{order.number}</span> {fields.title || 'Without a title'}
      </h1>
      <p className="max-w-none text-quiet">
        {order.customer.name}, {fields.quantity.toLocaleString('en-GB')}{' '}
        {fields.quantity === 1 ? 'piece' : 'pieces'}
        {fields.dueOn ? `, due ${dayWords(fields.dueOn)}` : ', no due date'}
      </p>
      {order.state === 'on-hold' && <Notice kind="warning" title="On hold." detail={order.heldBecause} />}
    </header>
  );
}

function Work({ number, initial }: { number: string; initial?: OrderView }) {
  const { data: order, error } = useOrder(number, initial);
  const machines = useQuery({
    queryKey: ['machines'],
    queryFn: ({ signal }) => call('GET /api/machines', { signal }),
  });
  const tasks = useProgress(number);
  if (!order)
    return error ? <ProblemNotice problem={problemOf(error)} /> : <p role="status">Fetching the order.</p>;
  if (!machines.data)
    return machines.error ? (
      <ProblemNotice problem={problemOf(machines.error)} />
    ) : (
      <p role="status">Fetching the machines.</p>
    );
  const newest = (kind: 'check' | 'prepare') => tasks.filter((task) => task.kind === kind).at(-1) ?? null;
  return (
    <LoadedWork
      order={order}
      machines={machines.data.machines}
      prepareTask={newest('prepare')}
      checkTask={newest('check')}
    />
  );
}

function LoadedWork({
  order,
  machines,
  prepareTask,
  checkTask,
}: {
  order: OrderView;
  machines: readonly MachineView[];
  prepareTask: TaskView | null;
  checkTask: TaskView | null;
}) {
  const first = startingDesign(order, machines);
  const work = useDesign(order, first);
  const { design } = work;
  const context = design && choiceContext(design, machines, order);
  const { artwork, latest, finished, findings, size, isOpen, isStale } = standingOf(order, design, context);
  const before = latest?.design ?? first ?? design;
  return (
    <div className="flex flex-col gap-10">
      <div className="flex flex-col gap-6">
        <Head order={order} />
        <LifeRule state={order.state} reached={reachedState(order)} />
        <Steps order={order} offered={OFFERED} quiet={isStale} />
        {ON_TICKET.includes(order.state) && (
          <p>
            <a href={`/tickets/${order.number}`} className="link">
              See the job ticket
            </a>
          </p>
        )}
      </div>
      {design && context && before ? (
        <div className="flex flex-col gap-4">
          <Sentence
            design={design}
            before={before}
            context={context}
            onChange={work.change}
            isDisabled={!isOpen}
          />
          {work.keep.error && <ProblemNotice problem={problemOf(work.keep.error)} />}
          {isOpen && (
            <Prepare
              order={order}
              latest={latest}
              liveTask={prepareTask}
              isStale={isStale}
              isBusy={work.prepare.isPending}
              isDisabled={!artwork || !placedSize(order.fields)}
              error={work.prepare.error}
              onPrepare={() => work.prepare.mutateAsync()}
            />
          )}
        </div>
      ) : (
        <Notice
          kind="warning"
          title="There is no machine with a spot preset."
          action="An admin adds one under Machines."
        />
      )}
      {artwork && size ? (
        <Viewer
          pictures={picturesOf(finished, artwork.pictureUrl)}
          widthMm={size.widthMm}
          heightMm={size.heightMm}
          pitchMm={finished?.report?.settings.scan.linePitchMm ?? design?.scan.linePitchMm ?? 0.1}
          findings={findings ?? []}
          resultKey={finished?.key ?? null}
          clear={clearWords(findings !== null, isUnderWay(artwork.task))}
          before={
            <>
              <h2>Notes</h2>
              <ArtworkCheck order={order} artwork={artwork} liveTask={checkTask} />
            </>
          }
          action={(finding) => (
            <Waive order={order} finding={finding} artworkVersion={artwork.version} mayWaive={isOpen} />
          )}
        />
      ) : (
        <p>There is no artwork yet.</p>
      )}
      {finished && <PreparationFacts preparation={finished} />}
      <OrderFacts order={order} />
      <ChangeOrder order={order} />
      <section aria-label="Artwork versions" className="flex flex-col gap-2">
        <h2>Artwork as it was sent</h2>
        <ArtworkVersions order={order} />
        {order.events.includes('new-artwork') && <NewArtwork order={order} />}
      </section>
      <History entries={order.history} />
    </div>
  );
}

/** A designer's page of one order: its life, the instruction, the pictures, the findings, and what can be done next. */
export function OrderWork(props: { number: string; initial?: OrderView }) {
  return (
    <Island>
      <Work {...props} />
    </Island>
  );
}
