import { useRef, useState, type ComponentProps, type ReactNode } from 'react';
import type { Finding } from '@/lib/preflight/finding';
import { Leaders } from './Leaders';
import { MarginNotes } from './MarginNotes';
import { Plate } from './Plate';

interface Props extends Omit<ComponentProps<typeof Plate>, 'findings' | 'lit' | 'onLit'> {
  findings: readonly Finding[];
  action?: (finding: Finding) => ReactNode;
  /** above and below the notes */
  before?: ReactNode;
  after?: ReactNode;
  clear?: string;
}

/** Plate, rule and margin together. */
export function AnnotatedPlate({ findings, action, before, after, clear, ...plate }: Props) {
  const container = useRef<HTMLDivElement>(null);
  const [lit, setLit] = useState<string | null>(null);
  return (
    <div ref={container} className="relative grid gap-6 lg:grid-cols-[minmax(0,1fr)_300px]">
      <Plate {...plate} findings={findings} lit={lit} onLit={setLit} />
      <aside aria-label="Notes on the artwork" className="flex min-w-0 flex-col gap-4">
        {before}
        <MarginNotes findings={findings} lit={lit} onLit={setLit} action={action} clear={clear} />
        {after}
      </aside>
      <Leaders container={container} lit={lit} revision={findings.map((finding) => finding.id).join()} />
    </div>
  );
}
