import { blankWords, placementWords } from '@/lib/orders/ticket';
import type { OrderView } from '@/lib/orders/views';
import { newestArtwork } from '../newest-artwork';
import { PlacementFigure } from '../PlacementFigure';
import { CautionList } from '../CautionList';
import { dayWords } from '../time-words';
import { ROUTE_WORDS, shadeWords, USE_WORDS } from '../words';
import { Pairs } from './PreparationFacts';

/** What the customer asked for: blank, placement, route, use, words; and the cautions that follow. */
export function OrderFacts({ order }: { order: OrderView }) {
  const { fields, stock } = order;
  const { blank } = fields;
  const sized = blank && fields.widthMm !== null && fields.heightMm !== null;
  return (
    <section aria-label="What was ordered" className="flex flex-col gap-6">
      <h2>What was ordered</h2>
      <div className="grid gap-x-10 gap-y-6 lg:grid-cols-2">
        <Pairs
          pairs={[
            ['Pieces', fields.quantity.toLocaleString('en-GB')],
            ['Blank', blank ? blankWords(blank, stock?.name ?? null) : 'not named'],
            ['Placement', placementWords(fields)],
            ['Shade', shadeWords(fields.shadeLstar)],
            ['Route', ROUTE_WORDS[fields.route]],
            ['Use', USE_WORDS[fields.use]],
            ['Proof', fields.withoutProof ? 'the customer goes without' : 'wanted'],
            ...(blank?.condition ? [['Condition of the blank', blank.condition] as const] : []),
            ...(fields.notes ? [['Notes', fields.notes] as const] : []),
          ]}
        />
        {sized && (
          <PlacementFigure
            blank={blank}
            placement={fields.placement}
            artworkMm={{ widthMm: fields.widthMm!, heightMm: fields.heightMm! }}
            pictureUrl={newestArtwork(order.artworks)?.pictureUrl}
            groundColour={stock?.groundColour}
          />
        )}
      </div>
      <CautionList cautions={order.cautions} />
    </section>
  );
}

/** Every version of the artwork, unchanged, newest first. */
export function ArtworkVersions({ order }: { order: OrderView }) {
  const versions = [...order.artworks].sort((a, b) => b.version - a.version);
  return (
    <ul className="flex flex-col">
      {versions.map((artwork) => (
        <li
          key={artwork.version}
          className="flex flex-wrap items-baseline justify-between gap-x-6 border-b border-hair py-2.5 text-15"
        >
          <a href={artwork.originalUrl} download className="link py-1">
            Version {artwork.version}, {artwork.fileName}
          </a>
          <span className="text-13 text-quiet">
            {artwork.uploadedBy}, {dayWords(artwork.uploadedAt)}
            {artwork.task.state === 'failed' && (
              <span className="stop">. Could not be checked: {artwork.task.problem}</span>
            )}
          </span>
        </li>
      ))}
    </ul>
  );
}
