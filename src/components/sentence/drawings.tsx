import type { ScreenName } from '@/lib/prepare/settings';
import { lineExtent, sizeAcross, type Spot } from '@/lib/machines/spot';
import { bayerRanks } from '@/lib/prepare/screen/bayer';
import { diffuse } from '@/lib/prepare/screen/diffuse';
import { evenGrainRanks } from '@/lib/prepare/screen/even-grain';
import { FLOYD_STEINBERG, JARVIS_JUDICE_NINKE, STUCKI } from '@/lib/prepare/screen/kernels';
import { screenWhole, type Screener } from '@/lib/prepare/screen/screener';
import { compareWith } from '@/lib/prepare/screen/threshold-matrix';

const COLUMNS = 96;
const ROWS = 24;

/** The product's own screens, on a drawing's few pixels: the square of the even grain is a small one. */
function screenerOf(screen: ScreenName): Screener {
  switch (screen) {
    case 'even-grain':
      return compareWith(evenGrainRanks(32), COLUMNS);
    case 'published:bayer-1973':
      return compareWith(bayerRanks(16), COLUMNS);
    case 'published:floyd-steinberg-1976':
      return diffuse(FLOYD_STEINBERG, COLUMNS);
    case 'published:jarvis-judice-ninke-1976':
      return diffuse(JARVIS_JUDICE_NINKE, COLUMNS);
    case 'published:stucki-1981':
      return diffuse(STUCKI, COLUMNS);
  }
}

const RAMP = Float32Array.from({ length: COLUMNS * ROWS }, (_, i) => ((i % COLUMNS) + 0.5) / COLUMNS);
const paths = new Map<ScreenName, string>();

function rampPath(name: ScreenName): string {
  const known = paths.get(name);
  if (known) return known;
  const dots = Array.from(screenWhole(screenerOf(name), RAMP));
  const path = dots
    .map((dot, i) => (dot ? `M${i % COLUMNS} ${Math.floor(i / COLUMNS)}h1v1h-1z` : ''))
    .join('');
  paths.set(name, path);
  return path;
}

/** A ramp from light to dark in the dots of a screen. */
export function ScreenDrawing({ screen }: { screen: ScreenName }) {
  return (
    <svg
      viewBox={`0 0 ${COLUMNS} ${ROWS}`}
      aria-hidden="true"
      shapeRendering="crispEdges"
      className="w-full max-w-[336px] border border-hair bg-[#fff]"
    >
      <path d={rampPath(screen)} fill="#000" />
    </svg>
  );
}

interface LinesProps {
  spot: Spot;
  directionDeg: number;
  linePitchMm: number;
  /** px that one mm takes */
  pxPerMm?: number;
  lines?: number;
}

/** Neighbouring scan lines at their true width and distance, with the spot that burns them: overlap shows as darker. */
export function LinesDrawing({ spot, directionDeg, linePitchMm, pxPerMm = 220, lines = 4 }: LinesProps) {
  const extent = lineExtent(spot, directionDeg) * pxPerMm;
  const across = sizeAcross(spot, directionDeg) * pxPerMm;
  const pitch = linePitchMm * pxPerMm;
  const height = Math.min(220, (lines - 1) * pitch + extent + 4);
  const width = 240;
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      className="max-w-full text-ink"
      role="img"
      aria-label={`${lines} scan lines drawn to scale, ${linePitchMm.toFixed(3)} mm apart`}
    >
      {Array.from({ length: lines }, (_, i) => {
        const y = 2 + extent / 2 + i * pitch;
        return (
          <rect
            key={i}
            x="0"
            y={y - across / 2}
            width={width}
            height={across}
            fill="currentColor"
            fillOpacity="0.3"
            stroke="currentColor"
            strokeOpacity="0.55"
            strokeWidth="0.75"
          />
        );
      })}
      <g
        transform={`translate(24 ${2 + extent / 2}) rotate(${directionDeg})`}
        fill="var(--sheet)"
        stroke="currentColor"
      >
        {spot.shape === 'ellipse' ? (
          <ellipse rx={(spot.widthMm * pxPerMm) / 2} ry={(spot.heightMm * pxPerMm) / 2} />
        ) : (
          <rect
            x={(-spot.widthMm * pxPerMm) / 2}
            y={(-spot.heightMm * pxPerMm) / 2}
            width={spot.widthMm * pxPerMm}
            height={spot.heightMm * pxPerMm}
          />
        )}
      </g>
    </svg>
  );
}

/** A sheet with its scan lines in a direction. */
export function DirectionDrawing({
  directionDeg,
  second = false,
}: {
  directionDeg: number;
  second?: boolean;
}) {
  const id = `direction-${directionDeg}-${second}`.replace(/\W/g, '');
  const lines = (turn: number) => (
    <g transform={`rotate(${turn} 32 24)`}>
      {Array.from({ length: 15 }, (_, i) => (
        <path key={i} d={`M-16 ${i * 6 - 18} H80`} stroke="currentColor" strokeWidth="1.25" />
      ))}
    </g>
  );
  return (
    <svg width="64" height="48" viewBox="0 0 64 48" aria-hidden="true" className="flex-none text-ink">
      <clipPath id={id}>
        <rect width="64" height="48" />
      </clipPath>
      <g clipPath={`url(#${id})`}>
        {lines(directionDeg)}
        {second && lines(directionDeg + 90)}
      </g>
      <rect x="0.5" y="0.5" width="63" height="47" fill="none" stroke="var(--edge)" />
    </svg>
  );
}

export function CornersDrawing({ corners }: { corners: 'kept' | 'eased' }) {
  return (
    <svg width="64" height="48" viewBox="0 0 64 48" aria-hidden="true" className="flex-none text-ink">
      <path
        d={corners === 'kept' ? 'M8 42 V8 H56' : 'M8 42 V24 Q8 8 24 8 H56'}
        fill="none"
        stroke="currentColor"
        strokeWidth="5"
        strokeLinejoin="miter"
      />
    </svg>
  );
}

export function MirrorDrawing({ mirror }: { mirror: boolean }) {
  return (
    <svg width="64" height="48" viewBox="0 0 64 48" aria-hidden="true" className="flex-none text-ink">
      <g transform={mirror ? 'translate(64 0) scale(-1 1)' : undefined}>
        <path d="M16 42 V6 H46 M16 22 H38" fill="none" stroke="currentColor" strokeWidth="5" />
      </g>
    </svg>
  );
}

/** Burn over lightness: what the points and gamma do. */
export function ToneDrawing({
  blackPoint,
  whitePoint,
  gamma,
}: {
  blackPoint: number;
  whitePoint: number;
  gamma: number;
}) {
  const width = 240;
  const height = 80;
  const points = Array.from({ length: 61 }, (_, i) => {
    const luminance = i / 60;
    const between = Math.min(
      1,
      Math.max(0, (luminance - blackPoint) / Math.max(0.001, whitePoint - blackPoint)),
    );
    return `${(luminance * width).toFixed(1)} ${(between ** gamma * height).toFixed(1)}`;
  });
  return (
    <svg
      viewBox={`-4 -4 ${width + 8} ${height + 24}`}
      className="w-full max-w-[260px] text-ink"
      role="img"
      aria-label="Burn over lightness: full at the left, untouched at the right"
    >
      <path d={`M0 0 V${height} H${width}`} fill="none" stroke="var(--edge)" />
      <path d={`M${points.join('L')}`} fill="none" stroke="currentColor" strokeWidth="2" />
      <text x="0" y={height + 16} fontSize="11" fill="var(--quiet)">
        dark
      </text>
      <text x={width} y={height + 16} fontSize="11" fill="var(--quiet)" textAnchor="end">
        light
      </text>
    </svg>
  );
}
