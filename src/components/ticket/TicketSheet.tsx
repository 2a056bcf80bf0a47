import type { ReactNode } from 'react';
import { CHECKLIST } from '@/lib/orders/checklist';
import { blankWords } from '@/lib/orders/ticket';
import type { OrderView, PreparationView } from '@/lib/orders/views';
import type { Report } from '@/lib/prepare/report';
import { CautionList } from '../CautionList';
import { PlacementFigure } from '../PlacementFigure';
import { dayWords, durationWords } from '../time-words';
import { ROUTE_WORDS } from '../words';
import { fileWords, frameWords, lineworkLine, passLine } from './pass-lines';
import { paperScale, scaleWords, standsInColumn } from './paper-scale';
import type { QrDrawing } from './qr-path';

interface Props {
  order: OrderView;
  preparation: PreparationView;
  report: Report;
  sentence: string;
  placementWords: string;
  qr: QrDrawing;
  speedUnit: 'mm/s' | 'mm/min';
}

function Head({ order, qr }: Pick<Props, 'order' | 'qr'>) {
  const { fields } = order;
  return (
    <header className="ticket-head">
      <div>
        <p className="ticket-number">{order.number}</p>
        <p className="ticket-number">{fields.dueOn ? `Due ${dayWords(fields.dueOn)}` : 'No due date'}</p>
        <p className="ticket-title">
          {fields.title || 'Without a title'}, for {order.customer.name}
        </p>
        <p className="ticket-title">
          {fields.quantity.toLocaleString('en-GB')} {fields.quantity === 1 ? 'piece' : 'pieces'},{' '}
          {ROUTE_WORDS[fields.route]}
        </p>
      </div>
      <svg
        viewBox={`0 0 ${qr.size} ${qr.size}`}
        role="img"
        aria-label="QR code with the address of this ticket"
        className="ticket-qr"
        shapeRendering="crispEdges"
      >
        <rect width={qr.size} height={qr.size} fill="#ffffff" />
        <path d={qr.path} fill="#000000" />
      </svg>
    </header>
  );
}

function Plate({ preparation, report }: Pick<Props, 'preparation' | 'report'>) {
  const scale = paperScale(report.widthMm, report.heightMm);
  const picture = preparation.pictures.screened ?? preparation.pictures.sent;
  return (
    <figure className="ticket-plate">
      {picture && (
        <img
          src={picture}
          alt={`The prepared artwork, ${scaleWords(scale).toLowerCase()}`}
          style={{
            width: `${report.widthMm / scale}mm`,
            aspectRatio: `${report.widthMm} / ${report.heightMm}`,
          }}
        />
      )}
      <figcaption>
        {Number(report.widthMm.toFixed(2))} × {Number(report.heightMm.toFixed(2))} mm. {scaleWords(scale)}
        {report.settings.mirror ? ', mirrored' : ''}.
      </figcaption>
      <div className="ticket-bar">
        <svg width="50mm" height="4mm" viewBox="0 0 50 4" role="img" aria-label="A bar of 50 mm">
          <path
            d="M0.1 0V4 M0 2H50 M49.9 0V4 M10 1V3 M20 1V3 M30 1V3 M40 1V3"
            fill="none"
            stroke="currentColor"
            strokeWidth="0.2"
          />
        </svg>
        <span>This bar is 50 mm on paper. If it is not, print again at 100 %.</span>
      </div>
    </figure>
  );
}

function Passes({ report, speedUnit }: Pick<Props, 'report' | 'speedUnit'>) {
  const linework = lineworkLine(report, speedUnit);
  const role = linework ? 'linework' : 'raster';
  const fileOf = (pass: number) =>
    fileWords(report.files.filter((f) => f.pass === pass && f.role === role).map((f) => f.name));
  return (
    <section>
      <h2>Passes</h2>
      <ol className="ticket-passes">
        {linework && <li>{linework}.</li>}
        {!linework &&
          report.passes.map((pass) => (
            <li key={pass.pass}>
              {passLine(pass, report, speedUnit)}.
              {frameWords(pass) && <span className="block">{frameWords(pass)}</span>}
              <span className="block break-all">{fileOf(pass.pass)}</span>
            </li>
          ))}
      </ol>
      {linework && <p className="break-all">{fileOf(1)}</p>}
      <p className="ticket-box">
        {linework
          ? 'Run the paths at their own size; do not rescale.'
          : 'Run one image row per scan line; do not rescale.'}
      </p>
    </section>
  );
}

function Times({ report, quantity }: { report: Report; quantity: number }) {
  const { totalSeconds } = report;
  const { recipe } = report.settings;
  return (
    <p>
      {recipe
        ? `Power, speed and focus: typed by ${recipe.typedBy}, not measured. `
        : 'No power and speed are named. '}
      {totalSeconds === null
        ? ''
        : `About ${durationWords(totalSeconds)} a piece${quantity > 1 ? `, ${durationWords(totalSeconds * quantity)} for ${quantity.toLocaleString('en-GB')}` : ''}, without loading.`}
    </p>
  );
}

function Waivers({ order, preparation }: Pick<Props, 'order' | 'preparation'>) {
  const waivers = order.waivers.filter((waiver) => waiver.artworkVersion === preparation.artworkVersion);
  if (waivers.length === 0) return null;
  return (
    <section>
      <h2>Waived findings</h2>
      <ul>
        {waivers.map((waiver) => (
          <li key={waiver.findingId}>
            {waiver.findingId.replace('-', ' ')}: {waiver.reason} ({waiver.by}, {dayWords(waiver.at)})
          </li>
        ))}
      </ul>
    </section>
  );
}

function Signature({ words }: { words: string }) {
  return (
    <p className="ticket-sign">
      <span>{words}</span>
      <span>Name</span>
      <span>Date, time</span>
    </p>
  );
}

function Column({ children }: { children: ReactNode }) {
  return <div className="flex min-w-0 flex-col gap-4">{children}</div>;
}

/** The operator's sheet: everything needed to run the order without asking, on paper or screen. */
export function TicketSheet(props: Props) {
  const { order, preparation, report, sentence, placementWords } = props;
  const { blank, placement, widthMm, heightMm } = order.fields;
  const inColumn = standsInColumn(report.widthMm, report.heightMm);
  return (
    <article className="ticket" aria-label={`Job ticket ${order.number}`}>
      <Head {...props} />
      <p className="ticket-sentence">{sentence}</p>
      {!inColumn && <Plate {...props} />}
      <div className="ticket-columns">
        <Column>
          {inColumn && <Plate {...props} />}
          <Passes {...props} />
          <Times report={report} quantity={order.fields.quantity} />
          <Waivers {...props} />
        </Column>
        <Column>
          <section>
            <h2>Placement</h2>
            <p>{blank ? `${blankWords(blank, order.stock?.name ?? null)}.` : 'The blank is not named.'}</p>
            <p>{placementWords}</p>
          </section>
          {blank && widthMm !== null && heightMm !== null && (
            <PlacementFigure blank={blank} placement={placement} artworkMm={{ widthMm, heightMm }} />
          )}
          {order.fields.notes && (
            <section>
              <h2>Notes</h2>
              <p>{order.fields.notes}</p>
            </section>
          )}
        </Column>
      </div>
      <CautionList cautions={order.cautions} />
      <section className="ticket-ticks">
        <h2>Before it runs</h2>
        <ul>
          {CHECKLIST.map(({ id, words }) => (
            <li key={id}>{words}</li>
          ))}
        </ul>
        <Signature words="On the machine" />
        <Signature words="Done" />
        <Signature words="Spoiled, and why" />
      </section>
      <p className="ticket-small">
        Artwork version {preparation.artworkVersion}.{' '}
        {order.passed && `Passed by ${order.passed.by}, ${dayWords(order.passed.at)}. `}
        {order.approved && `Approved by ${order.approved.by}, ${dayWords(order.approved.at)}. `}Manifest{' '}
        {report.manifestSha256.slice(0, 16)}.
      </p>
    </article>
  );
}
