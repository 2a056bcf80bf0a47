import type { ReactNode } from 'react';
import type { Problem } from '@/lib/orders/views';
import { SeverityMark } from './SeverityMark';

interface Props {
  /** what happened */
  title: string;
  /** why */
  detail?: string;
  /** what to do */
  action?: string;
  kind?: 'blocker' | 'warning' | 'note';
  children?: ReactNode;
}

/** Where it happened: what, then why, then what to do. */
export function Notice({ title, detail, action, kind = 'blocker', children }: Props) {
  const tone = kind === 'blocker' ? 'text-stop' : kind === 'warning' ? 'text-warning' : 'text-quiet';
  return (
    <div
      role={kind === 'note' ? 'status' : 'alert'}
      className="flex gap-3 border-l-2 border-current py-1 pl-4"
      style={{
        borderColor: `var(--${kind === 'blocker' ? 'stop' : kind === 'warning' ? 'warning' : 'edge'})`,
      }}
    >
      <span className={`pt-1 ${tone}`}>
        <SeverityMark severity={kind} wordless />
      </span>
      <div className="flex flex-col items-start gap-2">
        <p>
          <strong className={`font-semibold ${tone}`}>{title}</strong>
          {detail && <> {detail}</>}
          {action && <> {action}</>}
        </p>
        {children}
      </div>
    </div>
  );
}

/** A refusal from the server, as a notice. */
export function ProblemNotice({ problem, children }: { problem: Problem; children?: ReactNode }) {
  return (
    <Notice title={problem.title} detail={problem.detail} action={problem.action}>
      {children}
    </Notice>
  );
}
