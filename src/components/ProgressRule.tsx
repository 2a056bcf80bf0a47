import { useEffect, useState } from 'react';

interface Props {
  /** 0–1; null while it is not known */
  progress: number | null;
  /** what is happening, such as "Screening, row 1,204 of 3,333" */
  words: string;
  /** after ten seconds: whether the person may leave the page */
  mayLeave?: boolean;
}

const LEAVE_AFTER_MS = 10_000;

/** The rule as a progress bar: it fills from the left, and text says what is happening. */
export function ProgressRule({ progress, words, mayLeave = false }: Props) {
  const [long, setLong] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLong(true), LEAVE_AFTER_MS);
    return () => clearTimeout(timer);
  }, []);
  const percent = Math.round((progress ?? 0) * 100);
  return (
    <div className="flex flex-col gap-1">
      <div
        role="progressbar"
        aria-label={words}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={progress === null ? undefined : percent}
        className="rule"
      >
        <svg height="18">
          {Array.from({ length: 51 }, (_, i) => (
            <line
              key={i}
              x1={`${i * 2}%`}
              x2={`${i * 2}%`}
              y1="12"
              y2={i % 5 ? 8 : 4}
              stroke="currentColor"
              opacity={i * 2 <= percent ? 1 : 0.45}
            />
          ))}
          <line x1="0" x2="100%" y1="12.5" y2="12.5" stroke="var(--edge)" />
          <rect
            x="0"
            y="11"
            width={`${percent}%`}
            height="3"
            fill="var(--ink)"
            style={{ transition: 'width 120ms ease-out' }}
          />
        </svg>
      </div>
      <p className="text-15" role="status">
        {words}
        {long && mayLeave && <span className="text-quiet"> You can leave; we’ll write when it is done.</span>}
      </p>
    </div>
  );
}
