import { changedChoices, type SentenceContext } from '@/lib/orders/sentence';
import { placedSize } from '@/lib/orders/settings';
import type { ArtworkView, Design, OrderView, PreparationView } from '@/lib/orders/views';
import type { Finding } from '@/lib/preflight/finding';
import { newestArtwork } from '../newest-artwork';

/** States in which a designer may choose and prepare. */
const PREPARABLE = ['in-preparation', 'passed', 'proof-sent', 'approved', 'released'];

/** How an order's preparation stands: what there is to show, and whether it still is what is asked for. */
export interface Standing {
  isOpen: boolean;
  artwork: ArtworkView | null;
  /** newest preparation, whatever became of it */
  latest: PreparationView | null;
  /** newest finished preparation of the newest artwork */
  finished: PreparationView | null;
  /** findings of that preparation, else of the artwork's check; null until there is either */
  findings: readonly Finding[] | null;
  size: { widthMm: number; heightMm: number } | null;
  /** artwork, size or choices are no longer those of the newest preparation */
  isStale: boolean;
}

const differs = (a: number, b: number): boolean => Math.abs(a - b) > 0.005;

function sizeChanged(order: OrderView, preparation: PreparationView): boolean {
  const asked = placedSize(order.fields);
  const { report } = preparation;
  if (!asked || !report) return false;
  return differs(asked.widthMm, report.widthMm) || differs(asked.heightMm, report.heightMm);
}

export function standingOf(
  order: OrderView,
  design: Design | null,
  context: SentenceContext | null,
): Standing {
  const artwork = newestArtwork(order.artworks);
  const latest = order.preparations[0] ?? null;
  const finished =
    order.preparations.find(
      (p) => p.task.state === 'done' && p.report !== null && p.artworkVersion === artwork?.version,
    ) ?? null;
  const isOpen = PREPARABLE.includes(order.state);
  const asked = design !== null && context !== null && artwork !== null;
  const isSame =
    latest !== null &&
    asked &&
    latest.artworkVersion === artwork.version &&
    !sizeChanged(order, latest) &&
    changedChoices(latest.design, design, context).length === 0;
  return {
    isOpen,
    artwork,
    latest,
    finished,
    findings: (finished?.report ?? artwork?.check)?.findings ?? null,
    size: finished?.report ?? placedSize(order.fields) ?? artwork?.check ?? null,
    isStale: isOpen && asked && !isSame,
  };
}
