import type { ReactNode } from 'react';

interface Props {
  /** one sentence */
  words: string;
  /** one action */
  children?: ReactNode;
}

/** A bare rule, one sentence, one action. */
export function EmptyState({ words, children }: Props) {
  return (
    <div className="flex flex-col items-start gap-6 py-10">
      <svg height="12" width="100%" aria-hidden="true" className="text-edge">
        <line x1="0" x2="100%" y1="11.5" y2="11.5" stroke="currentColor" />
        {Array.from({ length: 41 }, (_, i) => (
          <line
            key={i}
            x1={`${i * 2.5}%`}
            x2={`${i * 2.5}%`}
            y1="11"
            y2={i % 10 ? 7 : 2}
            stroke="currentColor"
          />
        ))}
      </svg>
      <p className="text-20">{words}</p>
      {children}
    </div>
  );
}
