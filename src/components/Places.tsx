import type { Finding } from '@/lib/preflight/finding';
import { SEVERITY_CLASS } from './SeverityMark';

interface Props {
  findings: readonly Finding[];
  widthMm: number;
  heightMm: number;
  lit: string | null;
  onLit?: (findingId: string | null) => void;
}

/** Places shown of a finding that is not lit; the lit one shows all that it lists. */
const QUIET_PLACES = 6;

/** Rings around the places of findings, over a picture. A note's leader ends at the one nearest to it. */
export function Places({ findings, widthMm, heightMm, lit, onLit }: Props) {
  return (
    <div className="absolute inset-0" aria-hidden="true">
      {findings.flatMap((finding) =>
        finding.places.slice(0, lit === finding.id ? undefined : QUIET_PLACES).map((place, index) => (
          <span
            key={`${finding.id}-${index}`}
            data-place={finding.id}
            data-lit={lit === finding.id}
            className={`place ${SEVERITY_CLASS[finding.severity]}`}
            onPointerEnter={() => onLit?.(finding.id)}
            onPointerLeave={() => onLit?.(null)}
            onClick={() => onLit?.(finding.id)}
            style={{
              left: `${(100 * place.xMm) / widthMm}%`,
              top: `${(100 * place.yMm) / heightMm}%`,
              width: `max(14px, ${(100 * place.widthMm) / widthMm}%)`,
              height: `max(14px, ${(100 * place.heightMm) / heightMm}%)`,
            }}
          />
        )),
      )}
    </div>
  );
}
