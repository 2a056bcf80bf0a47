import { cssPxToMm } from '@/lib/units';
import { plainNumber, ruleTicks, type Tick } from './rule-ticks';
import type { View } from './view';

interface Props {
  view: View;
  widthPx: number;
  extentMm: number;
  pitchMm: number;
}

const MIDDLE = 26;
const LENGTHS = [4, 7, 10] as const;

function Ticks({ ticks, up }: { ticks: readonly Tick[]; up: boolean }) {
  const side = up ? -1 : 1;
  return (
    <g>
      <path
        d={ticks.map((t) => `M${t.xPx.toFixed(1)} ${MIDDLE} v${side * LENGTHS[t.rank]}`).join('')}
        stroke="var(--ink)"
        strokeWidth="1"
      />
      {ticks.map((t) =>
        t.label === null ? null : (
          <text
            key={t.xPx}
            x={t.xPx}
            y={up ? MIDDLE - 14 : MIDDLE + 23}
            textAnchor="middle"
            fill="var(--quiet)"
            fontSize="13"
          >
            {t.label}
          </text>
        ),
      )}
    </g>
  );
}

/** The one rule below the plate: millimetres above the line, scan lines below it; it follows the zoom. */
export function Rule({ view, widthPx, extentMm, pitchMm }: Props) {
  if (widthPx < 40) return <div className="h-[56px]" />;
  const ticks = ruleTicks(view, widthPx, extentMm, pitchMm);
  const left = Math.max(0, widthPx / 2 - view.centreXMm * view.pxPerMm);
  const right = Math.min(widthPx, widthPx / 2 + (extentMm - view.centreXMm) * view.pxPerMm);
  const magnification = view.pxPerMm * cssPxToMm(1);
  return (
    <div className="rule">
      <svg
        height="56"
        viewBox={`0 0 ${widthPx} 56`}
        style={{ width: widthPx }}
        aria-hidden="true"
        className="overflow-hidden"
      >
        <path d={`M${left} ${MIDDLE} H${right}`} stroke="var(--ink)" strokeWidth="1" />
        <Ticks ticks={ticks.mm} up />
        <Ticks ticks={ticks.lines} up={false} />
      </svg>
      <p className="flex flex-wrap justify-between gap-x-6 text-13">
        <span>Above: mm. Below: scan lines{ticks.single ? ', each one drawn' : ', a tick per ten'}.</span>
        <span aria-live="polite">
          {ticks.single
            ? `Magnified about ${plainNumber(Math.round(magnification))} times; one scan line is ${plainNumber(Math.round(pitchMm * view.pxPerMm))} px`
            : `Shown at about ${plainNumber(Number(magnification.toPrecision(2)))} times its size`}
        </span>
      </p>
    </div>
  );
}
