import type { Finding, Severity } from '@/lib/preflight/finding';
import { toFrame, type FrameSize, type View } from './view';

interface Props {
  findings: readonly Finding[];
  view: View;
  frame: FrameSize;
  lit: string | null;
  onLight: (id: string | null) => void;
  onChoose: (id: string) => void;
}

const RADIUS = 6;
/** Places drawn of a finding that is not lit, and of the one that is; the note says how many there are. */
const QUIET_PLACES = 6;
const LIT_PLACES = 200;

const MARK_COLOUR: Record<Severity, string> = {
  blocker: 'var(--mark-stop)',
  warning: 'var(--mark-warning)',
  note: 'var(--mark-quiet)',
};

/** How full the spot is says how severe it is; a halo keeps it readable on any picture. */
function Spot({ severity, lit }: { severity: Severity; lit: boolean }) {
  return (
    <g style={{ color: MARK_COLOUR[severity] }}>
      <circle r={RADIUS + (lit ? 5 : 2)} fill="#ffffff" opacity={lit ? 1 : 0.85} />
      <circle
        r={RADIUS}
        fill={severity === 'blocker' ? 'currentColor' : '#ffffff'}
        stroke="currentColor"
        strokeWidth="1.5"
      />
      {severity === 'warning' && (
        <path d={`M0 ${-RADIUS} A${RADIUS} ${RADIUS} 0 0 0 0 ${RADIUS} Z`} fill="currentColor" />
      )}
      {lit && <circle r={RADIUS + 4} fill="none" stroke="currentColor" strokeWidth="1.5" />}
    </g>
  );
}

/** Where the findings are, over the picture. The margin's notes are the same findings in words, so these are for pointers only. */
export function Places({ findings, view, frame, lit, onLight, onChoose }: Props) {
  const inFrame = (xPx: number, yPx: number) =>
    xPx >= -20 && yPx >= -20 && xPx <= frame.widthPx + 20 && yPx <= frame.heightPx + 20;
  const drawn = [...findings].sort((a, b) => Number(a.id === lit) - Number(b.id === lit));
  /** the note's leader ends at the place that lies nearest to the margin */
  const placesOf = (finding: Finding) =>
    finding.places.slice(0, finding.id === lit ? LIT_PLACES : QUIET_PLACES);
  const leaderPlace = (finding: Finding): number => {
    const inView = placesOf(finding).map((place, index) => ({
      index,
      at: toFrame(view, frame, place.xMm, place.yMm),
    }));
    const visible = inView.filter(
      ({ at }) => at.xPx >= 0 && at.yPx >= 0 && at.xPx <= frame.widthPx && at.yPx <= frame.heightPx,
    );
    return visible.sort((a, b) => b.at.xPx - a.at.xPx)[0]?.index ?? -1;
  };
  return (
    <svg aria-hidden="true" className="pointer-events-none absolute inset-0 h-full w-full overflow-hidden">
      {drawn.map((finding) => {
        const leader = leaderPlace(finding);
        return (
          <g key={finding.id}>
            {placesOf(finding).map((place, index) => {
              const at = toFrame(view, frame, place.xMm, place.yMm);
              if (!inFrame(at.xPx, at.yPx)) return null;
              const width = place.widthMm * view.pxPerMm;
              const height = place.heightMm * view.pxPerMm;
              const outlined = finding.id === lit && Math.max(width, height) > RADIUS * 4;
              return (
                <g
                  key={index}
                  data-place={index === leader ? finding.id : undefined}
                  transform={`translate(${at.xPx} ${at.yPx})`}
                  className="pointer-events-auto cursor-pointer"
                  onPointerEnter={() => onLight(finding.id)}
                  onPointerLeave={() => onLight(null)}
                  onPointerDown={(event) => event.stopPropagation()}
                  onClick={() => onChoose(finding.id)}
                >
                  <circle r="14" fill="transparent" />
                  {outlined && (
                    <rect
                      x={-width / 2}
                      y={-height / 2}
                      width={width}
                      height={height}
                      fill="none"
                      stroke="#ffffff"
                      strokeWidth="3"
                    />
                  )}
                  {outlined && (
                    <rect
                      x={-width / 2}
                      y={-height / 2}
                      width={width}
                      height={height}
                      fill="none"
                      stroke="#000000"
                      strokeWidth="1"
                    />
                  )}
                  <Spot severity={finding.severity} lit={finding.id === lit} />
                </g>
              );
            })}
          </g>
        );
      })}
    </svg>
  );
}
