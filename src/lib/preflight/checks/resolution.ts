import { MM_PER_INCH } from '../../units';
import type { Check, CheckResult } from '../check';
import type { Facts } from '../facts';
import { burnsTones, type Limits } from '../limits';
import { counted, mm } from '../words';

/** Pixels of the artwork, in line pitches, above which a photograph looks soft and drawn edges show steps. */
const COARSE_PITCHES = { tones: 2.5, lines: 1.5 } as const;

function unresolved(facts: Facts): CheckResult | null {
  const { count, places } = facts.source.unresolved;
  if (count === 0 || facts.source.pxPerMm === null) return null;
  return {
    severity: 'warning',
    count,
    places,
    minMm: null,
    limitMm: 1.5 / facts.source.pxPerMm,
    measured: { value: facts.source.pxPerMm * MM_PER_INCH, limit: null, unit: 'px/inch' },
    advice:
      `${counted(count, 'line')} ${count === 1 ? 'is' : 'are'} so fine that the picture's pixels (${mm(1 / facts.source.pxPerMm)} each at ` +
      'this size) do not tell how wide. Send the original drawing (SVG) or a picture with more pixels.',
  };
}

function tooFew(facts: Facts, limits: Limits): CheckResult | null {
  const { pxPerMm } = facts.source;
  if (pxPerMm === null) return null;
  const most = burnsTones(limits) && limits.photograph ? COARSE_PITCHES.tones : COARSE_PITCHES.lines;
  const pitches = 1 / pxPerMm / facts.linePitchMm;
  if (pitches <= most) return null;
  const wanted = MM_PER_INCH / facts.linePitchMm / most;
  return {
    severity: pitches > 2 * most ? 'warning' : 'note',
    count: 1,
    places: [],
    minMm: null,
    limitMm: facts.linePitchMm * most,
    measured: { value: pxPerMm * MM_PER_INCH, limit: wanted, unit: 'px/inch' },
    advice:
      `At this size the picture has ${Math.round(pxPerMm * MM_PER_INCH)} pixels to the inch; ${Math.ceil(wanted)} or more would ` +
      `use what the machine can draw. It will look ${limits.photograph ? 'soft' : 'stepped'}: send a larger picture, or make it ` +
      `${mm((facts.placement.widthMm * most) / pitches)} wide.`,
  };
}

/** Too few pixels for the size, or lines that the pixels do not resolve. */
export const resolution: Check = {
  id: 'resolution',
  title: 'Too few pixels',
  check: (facts, limits) => unresolved(facts) ?? tooFew(facts, limits),
};
