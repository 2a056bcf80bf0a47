import type { MachineDay } from './day-plan';
import { orderSeconds } from './day-plan';
import { durationWords } from '../time-words';

/** Steps of the hours' ticks: enough for a day, few enough for a week. */
const STEPS_S = [900, 1800, 3600, 7200, 14_400, 28_800, 86_400] as const;

/** The machine's work on one rule: hours above the line, each order as long as it takes below it. */
export function DayRule({ day }: { day: MachineDay }) {
  if (day.seconds <= 0) return null;
  const step = STEPS_S.find((s) => day.seconds / s <= 8) ?? STEPS_S[STEPS_S.length - 1];
  const extent = Math.ceil(day.seconds / step) * step;
  const percent = (seconds: number) => `${(100 * seconds) / extent}%`;
  const timed = day.rows.flatMap((row) => {
    const seconds = orderSeconds(row);
    return seconds === null ? [] : [{ row, seconds }];
  });
  const starts = timed.map((_, i) => timed.slice(0, i).reduce((sum, t) => sum + t.seconds, 0));
  return (
    <div className="rule overflow-hidden">
      <svg
        height="46"
        role="img"
        aria-label={`${durationWords(day.seconds)} of scanning in ${day.rows.length} orders`}
      >
        {Array.from({ length: Math.round(extent / step) + 1 }, (_, i) => (
          <g key={i}>
            <line x1={percent(i * step)} x2={percent(i * step)} y1="22" y2="14" stroke="var(--ink)" />
            <text
              x={percent(i * step)}
              y="10"
              fontSize="12"
              fill="currentColor"
              textAnchor={i === 0 ? 'start' : i * step === extent ? 'end' : 'middle'}
            >
              {i === 0 ? 'now' : durationWords(i * step)}
            </text>
          </g>
        ))}
        <line x1="0" x2="100%" y1="22" y2="22" stroke="var(--ink)" />
        {timed.map(({ row, seconds }, i) => (
          <g key={row.number}>
            <rect
              x={percent(starts[i])}
              y="22"
              width={percent(seconds)}
              height="6"
              fill={row.state === 'running' ? 'var(--ink)' : 'none'}
              stroke="var(--ink)"
              strokeWidth="1"
            />
            {seconds / extent > 0.09 && (
              <text x={percent(starts[i])} dx="3" y="42" fontSize="12" fill="currentColor">
                {row.number}
              </text>
            )}
          </g>
        ))}
      </svg>
    </div>
  );
}
