import type { ReactNode } from 'react';
import type { Finding } from '@/lib/preflight/finding';
import { countWords, inReadingOrder, shortfallWords } from './finding-words';
import { SeverityMark, SEVERITY_CLASS } from './SeverityMark';

interface Props {
  findings: readonly Finding[];
  lit: string | null;
  onLit: (findingId: string | null) => void;
  /** what can be done about a finding, below its advice */
  action?: (finding: Finding) => ReactNode;
  /** said where there is nothing to note */
  clear?: string;
}

/** Findings as notes in the margin, each tied to its places: hover, focus or tap lights both. */
export function MarginNotes({
  findings,
  lit,
  onLit,
  action,
  clear = 'Nothing to note. The laser can hold it.',
}: Props) {
  if (findings.length === 0) return <p className="text-15 text-quiet">{clear}</p>;
  return (
    <ul className="flex flex-col gap-2">
      {inReadingOrder(findings).map((finding) => (
        <li key={finding.id} data-note={finding.id}>
          <div className={`note ${SEVERITY_CLASS[finding.severity]}`} data-lit={lit === finding.id}>
            <button
              type="button"
              className="block min-h-target w-full cursor-pointer text-left"
              aria-pressed={lit === finding.id}
              onPointerEnter={() => onLit(finding.id)}
              onPointerLeave={() => onLit(null)}
              onFocus={() => onLit(finding.id)}
              onClick={() => onLit(finding.id)}
            >
              <SeverityMark severity={finding.severity} />
              <span className="block text-15 font-semibold text-ink">{finding.title}</span>
              <span className="block text-13 text-quiet">
                {[shortfallWords(finding), finding.places.length > 0 ? countWords(finding.count) : '']
                  .filter(Boolean)
                  .join(' · ')}
              </span>
            </button>
            <p className="mt-1 text-13 text-ink">{finding.advice}</p>
            {action?.(finding)}
          </div>
        </li>
      ))}
    </ul>
  );
}
