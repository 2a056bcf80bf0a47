import { useState } from 'react';
import type { OrderView, PreparationView, TaskView } from '@/lib/orders/views';
import { problemOf } from '../api';
import { Button } from '../Button';
import { Notice, ProblemNotice } from '../Notice';
import { ProgressRule } from '../ProgressRule';
import { EventDialog } from './EventDialog';
import { isUnderWay, stageWords } from './task-state';

interface Props {
  order: OrderView;
  latest: PreparationView | null;
  liveTask: TaskView | null;
  /** choices differ from those of the latest preparation */
  isStale: boolean;
  isBusy: boolean;
  isDisabled: boolean;
  error: unknown;
  onPrepare: () => Promise<unknown>;
}

const VOIDING = ['passed', 'proof-sent', 'approved', 'released'] as const;

/** Starts a preparation, shows it on the rule, and says what to do where it failed. */
export function Prepare({ order, latest, liveTask, isStale, isBusy, isDisabled, error, onPrepare }: Props) {
  const [asking, setAsking] = useState(false);
  // The stream may still tell of the preparation before this one, which is over.
  const task = isUnderWay(liveTask) ? liveTask : (latest?.task ?? null);
  const running = isBusy || isUnderWay(task);
  const voids = VOIDING.some((state) => state === order.state);
  const name = latest ? 'Prepare again' : 'Prepare';
  return (
    <section aria-label="Preparation" className="flex flex-col gap-3">
      {running ? (
        <ProgressRule
          progress={task?.progress ?? null}
          words={task ? stageWords(task, 'Preparing') : 'Sending the choices'}
          mayLeave
        />
      ) : (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <Button
            kind={isStale ? 'filled' : 'outlined'}
            isDisabled={isDisabled}
            onPress={() => (voids ? setAsking(true) : void onPrepare().catch(() => undefined))}
          >
            {name}
          </Button>
          {isStale && latest && (
            <p className="text-15 text-quiet">The choices have changed since the pictures below were made.</p>
          )}
        </div>
      )}
      {!running && latest?.task.state === 'failed' && (
        <Notice title="This preparation failed." detail={latest.task.problem} action="Start it again." />
      )}
      {error !== null && error !== undefined && <ProblemNotice problem={problemOf(error)} />}
      {asking && (
        <EventDialog
          title="Prepare again?"
          intro="It voids the pass and the approval: the customer gets a new proof."
          fields={[]}
          confirm="Prepare again"
          stop
          onConfirm={onPrepare}
          onClose={() => setAsking(false)}
        />
      )}
    </section>
  );
}
