import type { Severity } from '@/lib/preflight/finding';

const WORDS = { blocker: 'Blocker', warning: 'Warning', note: 'Note' } as const satisfies Record<
  Severity,
  string
>;
export const SEVERITY_CLASS = {
  blocker: 'stop',
  warning: 'warning',
  note: 'quiet',
} as const satisfies Record<Severity, string>;

interface Props {
  severity: Severity;
  /** where the word already stands beside it */
  wordless?: boolean;
}

/** How full the spot is: full disc blocker, half disc warning, ring note; the word always beside it. */
export function SeverityMark({ severity, wordless = false }: Props) {
  return (
    <span className={`inline-flex items-center gap-2 ${SEVERITY_CLASS[severity]}`}>
      <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true" className="flex-none">
        <circle
          cx="7"
          cy="7"
          r="5.75"
          fill={severity === 'blocker' ? 'currentColor' : 'none'}
          stroke="currentColor"
          strokeWidth="1.5"
        />
        {severity === 'warning' && <path d="M7 1.25 A5.75 5.75 0 0 0 7 12.75 Z" fill="currentColor" />}
      </svg>
      {wordless ? null : <span className="text-13 font-semibold">{WORDS[severity]}</span>}
    </span>
  );
}
