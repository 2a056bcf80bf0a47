import type { ReactNode } from 'react';

interface Props {
  title: string;
  /** one line below the heading */
  words?: ReactNode;
  /** stands to the right of the column where there is room */
  beside?: ReactNode;
  children: ReactNode;
}

/** One part of the order: a single column, with at most a drawing beside it. */
export function Part({ title, words, beside, children }: Props) {
  return (
    <section
      className="grid gap-6 border-t border-hair pt-6 lg:grid-cols-[34em_minmax(0,1fr)] lg:gap-16"
      aria-label={title}
    >
      <div className="flex max-w-form flex-col gap-4">
        <div>
          <h2>{title}</h2>
          {words && <p className="mt-1 text-15 text-quiet">{words}</p>}
        </div>
        {children}
      </div>
      {beside && <div className="min-w-0 lg:sticky lg:top-6 lg:self-start">{beside}</div>}
    </section>
  );
}
