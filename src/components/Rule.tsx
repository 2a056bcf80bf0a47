import { useRef } from 'react';
import { lineTicks, mmTicks, tickPositions } from './rule-ticks';
import { useWidth } from './use-width';

interface Props {
  widthMm: number;
  /** distance between scan lines; without it only millimetres are drawn */
  linePitchMm?: number | null;
}

const BASE = 22;

/** The rule below a plate: millimetres above the line, scan lines below it. */
export function Rule({ widthMm, linePitchMm }: Props) {
  const ref = useRef<HTMLDivElement>(null);
  const widthPx = useWidth(ref, 640);
  const mm = mmTicks(widthMm, widthPx);
  const lines = linePitchMm ? Math.round(widthMm / linePitchMm) : 0;
  const per = lineTicks(lines || 1, widthPx);
  const words = `Rule: ${widthMm} mm${lines ? `, ${lines} scan lines at ${linePitchMm} mm` : ''}`;
  const percent = (at: number, extent: number) => `${(100 * at) / extent}%`;
  return (
    <div ref={ref} className="rule">
      <svg height={linePitchMm ? 56 : 30} role="img" aria-label={words}>
        {tickPositions(widthMm, mm).map(({ at, isLong }) => (
          <g key={at}>
            <line
              x1={percent(at, widthMm)}
              x2={percent(at, widthMm)}
              y1={BASE}
              y2={BASE - (isLong ? 8 : 4)}
              stroke="currentColor"
            />
            {isLong && widthMm - at >= mm.long * 0.5 && (
              <text
                x={percent(at, widthMm)}
                y={BASE - 12}
                textAnchor="middle"
                fill="currentColor"
                fontSize="11"
              >
                {at}
              </text>
            )}
          </g>
        ))}
        <text x="100%" y={BASE - 12} textAnchor="middle" fill="currentColor" fontSize="11">
          mm
        </text>
        <line x1="0" x2="100%" y1={BASE} y2={BASE} stroke="var(--ink)" />
        {lines > 0 &&
          tickPositions(lines, per).map(({ at, isLong }) => (
            <line
              key={at}
              x1={percent(at, lines)}
              x2={percent(at, lines)}
              y1={BASE}
              y2={BASE + (isLong ? 9 : 4)}
              stroke="currentColor"
            />
          ))}
        {lines > 0 && (
          <text x="0" y={BASE + 26} fill="currentColor" fontSize="11">
            {lines.toLocaleString('en-GB')} scan lines in this width, one tick per {per.short}
          </text>
        )}
      </svg>
    </div>
  );
}
