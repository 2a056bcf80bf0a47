import { useQuery } from '@tanstack/react-query';
import type { OrderEvent } from '@/lib/orders/state';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { Island } from '../Island';
import { LifeRule } from '../LifeRule';
import { LinkButton } from '../LinkButton';
import { Notice, ProblemNotice } from '../Notice';
import { FileList } from '../order-work/PreparationFacts';
import { Steps } from '../order-work/Steps';
import { useOrder } from '../use-order';
import { PAPERS, type Paper } from './paper-scale';
import type { QrDrawing } from './qr-path';
import { TicketSheet } from './TicketSheet';
import { Outcomes } from './Outcomes';

interface Props {
  number: string;
  paper: Paper;
  qr: QrDrawing;
}

const OFFERED: readonly OrderEvent[] = [
  'approve',
  'ask-for-changes',
  'on-the-machine',
  'done',
  'spoiled',
  'hand-over',
  'hold',
  'resume',
];

function PaperWords({ number, paper }: { number: string; paper: Paper }) {
  const other: Paper = paper === 'a4' ? 'letter' : 'a4';
  return (
    <div className="flex flex-wrap items-center gap-2">
      <Button onPress={() => window.print()}>Print the ticket on {PAPERS[paper].name}</Button>
      <LinkButton kind="text" href={`/tickets/${number}${other === 'letter' ? '?paper=letter' : ''}`}>
        Use {PAPERS[other].name} instead
      </LinkButton>
    </div>
  );
}

function Loaded({ number, paper, qr }: Props) {
  const { data: order, error } = useOrder(number);
  const machines = useQuery({
    queryKey: ['machines'],
    queryFn: ({ signal }) => call('GET /api/machines', { signal }),
  });
  const ticket = useQuery({
    queryKey: ['ticket', number, order?.version],
    queryFn: ({ signal }) => call('GET /api/orders/:number/ticket', { params: { number }, signal }),
    enabled: order !== undefined,
    placeholderData: (former) => former,
  });
  if (error) return <ProblemNotice problem={problemOf(error)} />;
  if (!order) return <p role="status">Fetching the ticket.</p>;
  const sheet = ticket.data;
  const report = sheet?.preparation.report ?? null;
  const machine = machines.data?.machines.find((m) => m.id === sheet?.preparation.design.machineId);
  return (
    <div className="flex flex-col gap-10">
      <div className="flex flex-col gap-6 print:hidden">
        <h1>
          <span className="figure">{order.number}</span> {order.fields.title || 'Without a title'}
        </h1>
        {order.state === 'on-hold' && <Notice kind="warning" title="On hold." detail={order.heldBecause} />}
        <LifeRule state={order.state} />
        <Steps order={order} offered={OFFERED} />
      </div>
      {ticket.error && <ProblemNotice problem={problemOf(ticket.error)} />}
      {sheet && report && (
        <>
          <section aria-label="Files for the machine" className="flex flex-col gap-2 print:hidden">
            <h2>Files for the machine</h2>
            <FileList files={sheet.preparation.files} />
          </section>
          <Outcomes outcomes={order.outcomes} />
          <div className="print:hidden">
            <PaperWords number={number} paper={paper} />
          </div>
          <TicketSheet
            order={order}
            preparation={sheet.preparation}
            report={report}
            sentence={sheet.sentence}
            placementWords={sheet.placementWords}
            qr={qr}
            speedUnit={machine?.speedUnit ?? 'mm/s'}
          />
        </>
      )}
    </div>
  );
}

/** One job ticket: what to run, the files, the sheet to print, and the record of how it came out. */
export function Ticket(props: Props) {
  return (
    <Island>
      <Loaded {...props} />
    </Island>
  );
}
