import type { Facts, WidthFacts } from '../facts';
import type { CheckResult } from '../check';
import type { Limits } from '../limits';
import { counted, mm, roundUpMm } from '../words';

/** Share of the line extent below which a stroke or gap is lost for certain. */
const LOST_SHARE = 0.5;
/** Share of the line extent that sound widths keep to, as measured. */
const SOUND_SHARE = 0.98;

interface Wording {
  one: string;
  many: string;
  /** what happens to it */
  fate: string;
  /** what to do about it, given the width that is enough */
  mend: (enough: string) => string;
}

/** Result of a check on strokes or gaps that are thinner than the line extent. */
export function judgeThin(
  found: WidthFacts,
  facts: Facts,
  { smallestSoundWidthMm }: Limits,
  wording: Wording,
): CheckResult | null {
  const [first] = found.places;
  if (found.count === 0 || !first || found.worstRatio === null) return null;
  const severity = found.worstRatio < LOST_SHARE ? 'blocker' : 'warning';
  const short = first.limitMm - first.minMm;
  const width = smallestSoundWidthMm ?? (facts.placement.widthMm * SOUND_SHARE) / found.worstRatio;
  const enough = found.places.reduce((most, { limitMm }) => Math.max(most, limitMm), 0);
  return {
    severity,
    count: found.count,
    places: found.places.map(({ xMm, yMm, widthMm, heightMm, minMm }) => ({
      xMm,
      yMm,
      widthMm,
      heightMm,
      minMm,
    })),
    minMm: first.minMm,
    limitMm: first.limitMm,
    advice:
      `${counted(found.count, wording.one, wording.many)} ${found.count === 1 ? 'is' : 'are'} too thin, the thinnest by ` +
      `${mm(short)}: ${wording.fate}. Make the artwork about ${roundUpMm(width)} wide, or ${wording.mend(mm(enough))}.`,
  };
}
