import { useCallback, useMemo, useRef, useState, type ReactNode } from 'react';
import type { Finding } from '@/lib/preflight/finding';
import type { PassagePicture } from '@/lib/prepare/report';
import { inReadingOrder } from '../finding-words';
import { Button } from '../Button';
import { Leaders } from '../Leaders';
import { MarginNotes } from '../MarginNotes';
import { CompareWayChoice, type CompareWay } from './CompareWay';
import { needsDetail } from './Pane';
import { Passage } from './Passage';
import { chooseTwo, PICTURE_WORDS, type ViewerPicture } from './pictures';
import { Plate } from './Plate';
import { Rule } from './Rule';
import { TrueSize } from './TrueSize';
import { useGestures } from './use-gestures';
import { useImages } from './use-images';
import { useKeys } from './use-keys';
import { useLaidDown } from './use-laid-down';
import { useView } from './use-view';
import { nextIndex, showPlace } from './view';
import { ViewWords } from './ViewWords';

interface Props {
  pictures: readonly ViewerPicture[];
  widthMm: number;
  heightMm: number;
  /** distance between scan lines, also the size of one prepared pixel for the zoom */
  pitchMm: number;
  findings: readonly Finding[];
  /** identifies the result; a new one is laid down once */
  resultKey: string | null;
  /** what can be done about a finding, below its note */
  action?: (finding: Finding) => ReactNode;
  clear?: string;
  /** above and below the margin's notes */
  before?: ReactNode;
  after?: ReactNode;
}

/** The pair shown until someone chooses: what was sent against the last picture there is. */
function firstPair(pictures: readonly ViewerPicture[]): PassagePicture[] {
  const names = pictures.map((p) => p.name);
  return names.length > 1 ? [names[0], names[names.length - 1]] : names;
}

/** Passage, plate, rule and margin: any two pictures of a preparation compared down to one prepared pixel. */
export function Viewer({
  pictures,
  widthMm,
  heightMm,
  pitchMm,
  findings,
  resultKey,
  action,
  clear,
  before,
  after,
}: Props) {
  const container = useRef<HTMLDivElement>(null);
  const element = useRef<HTMLDivElement>(null);
  const [chosen, setChosen] = useState<PassagePicture[] | null>(null);
  const [way, setWay] = useState<CompareWay>('sweep');
  const [sweep, setSweep] = useState(0.5);
  const [lit, setLit] = useState<string | null>(null);
  const visited = useRef<{ finding: number | null; place: number }>({ finding: null, place: 0 });

  const plate = useMemo(() => ({ widthMm, heightMm }), [widthMm, heightMm]);
  const control = useView(plate, pitchMm);
  const existing = pictures.map((p) => p.name);
  const kept = chosen?.filter((name) => existing.includes(name)) ?? [];
  const compared = kept.length > 0 ? kept : firstPair(pictures);
  const shown = pictures.filter((p) => compared.includes(p.name));
  const ordered = inReadingOrder(findings).filter((f) => f.places.length > 0);

  // The prepared raster can be many megapixels: it is fetched only once someone looks that closely.
  const [wanted, setWanted] = useState<string | null>(null);
  const loaded = useImages([...shown.map((p) => p.url), wanted]);
  const ratio = typeof window === 'undefined' ? 1 : window.devicePixelRatio || 1;
  const closer = shown.find((p) => {
    const layer = { picture: p, image: loaded(p.url), detail: loaded(null), from: 0, to: 1 };
    return needsDetail(layer, control.view, plate, ratio);
  });
  const detailUrl = closer?.detail?.url ?? null;
  if (detailUrl && detailUrl !== wanted) setWanted(detailUrl);

  const laid = useLaidDown(
    resultKey,
    shown.every((p) => loaded(p.url).image !== null),
  );
  const goTo = useCallback(
    (finding: Finding, placeIndex: number) => {
      const place = finding.places[placeIndex % finding.places.length];
      setLit(finding.id);
      if (place) control.change((view, frame) => showPlace(view, frame, place, control.limits, pitchMm));
    },
    [control, pitchMm],
  );
  const nextFinding = () => {
    const next = nextIndex(visited.current.finding, ordered.length);
    if (next === null) return;
    visited.current = { finding: next, place: 0 };
    goTo(ordered[next], 0);
  };
  const nextPlace = (finding: Finding) => {
    const index = ordered.findIndex((f) => f.id === finding.id);
    const place = visited.current.finding === index ? visited.current.place + 1 : 0;
    visited.current = { finding: index, place };
    goTo(finding, place);
  };
  const { held, setHeld, keys } = useKeys(control, nextFinding);
  const gestures = useGestures(element, control);
  const names = shown.map((p) => PICTURE_WORDS[p.name].name).join(' and ');
  const failed = shown.find((p) => loaded(p.url).failed);

  return (
    <section aria-label="Artwork and findings" className="flex flex-col gap-4">
      <Passage
        pictures={pictures}
        compared={compared}
        onChoose={(name) => setChosen(chooseTwo(compared, name, existing))}
      />
      <div ref={container} className="relative grid gap-6 lg:grid-cols-[minmax(0,1fr)_300px]">
        <div className="min-w-0">
          <Plate
            element={element}
            shown={shown}
            loaded={loaded}
            way={way}
            held={held}
            sweep={sweep}
            onSweep={setSweep}
            control={control}
            plate={plate}
            laid={laid}
            findings={ordered}
            lit={lit}
            onLit={setLit}
            label={`${names || 'No picture yet'}. Arrows pan, plus and minus zoom, 0 shows the whole, space holds to see the other, f goes to the next finding.`}
            handlers={{ ...keys, ...gestures }}
          />
          <Rule view={control.view} widthPx={control.frame.widthPx} extentMm={widthMm} pitchMm={pitchMm} />
          <p role="status" className="text-13 text-quiet">
            {failed
              ? `“${PICTURE_WORDS[failed.name].name}” could not be fetched. Load the page again.`
              : detailUrl && !loaded(detailUrl).image && !loaded(detailUrl).failed
                ? 'Fetching the prepared file itself.'
                : ''}
          </p>
          <div className="flex flex-wrap items-center justify-between gap-x-6">
            <ViewWords control={control} pitchMm={pitchMm}>
              <TrueSize onScale={(pxPerMm) => control.change((view) => ({ ...view, pxPerMm }))} />
              {ordered.length > 0 && (
                <Button kind="text" onPress={nextFinding}>
                  Next finding
                </Button>
              )}
            </ViewWords>
            {shown.length === 2 && (
              <div className="flex flex-wrap items-center gap-x-4">
                <CompareWayChoice value={way} onChange={setWay} />
                {way === 'hold' && (
                  <Button onPressStart={() => setHeld(true)} onPressEnd={() => setHeld(false)}>
                    Hold to see {PICTURE_WORDS[shown[1].name].name}
                  </Button>
                )}
              </div>
            )}
          </div>
        </div>
        <aside aria-label="Notes on the artwork" className="flex min-w-0 flex-col gap-4">
          {before}
          <MarginNotes
            findings={findings}
            lit={lit}
            onLit={setLit}
            clear={clear}
            action={(finding) => (
              <div className="-ml-2">
                {finding.places.length > 0 && (
                  <Button kind="text" onPress={() => nextPlace(finding)}>
                    {finding.places.length === 1 ? 'Show the place' : 'Show the next place'}
                  </Button>
                )}
                {action?.(finding)}
              </div>
            )}
          />
          {after}
        </aside>
        <Leaders
          container={container}
          lit={lit}
          revision={`${ordered.map((f) => f.id).join()} ${control.view.centreXMm} ${control.view.centreYMm} ${control.view.pxPerMm} ${way}`}
        />
      </div>
    </section>
  );
}
