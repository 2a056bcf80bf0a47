import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { ArtworkView, OrderView, TaskView } from '@/lib/orders/views';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { Notice, ProblemNotice } from '../Notice';
import { ProgressRule } from '../ProgressRule';
import { isUnderWay, stageWords } from './task-state';
import { orderKey } from '../use-order';

interface Props {
  order: OrderView;
  artwork: ArtworkView;
  liveTask: TaskView | null;
}

/** The check of the newest artwork while it runs, and the way to start it again where it failed. */
export function ArtworkCheck({ order, artwork, liveTask }: Props) {
  const queries = useQueryClient();
  const again = useMutation({
    mutationFn: () =>
      call('POST /api/orders/:number/artwork/:artworkVersion/check', {
        params: { number: order.number, artworkVersion: artwork.version },
        body: {},
      }),
    onSuccess: (answer) => queries.setQueryData(orderKey(order.number), answer.order),
  });
  const task = liveTask && isUnderWay(liveTask) ? liveTask : artwork.task;
  if (isUnderWay(task)) {
    return (
      <ProgressRule progress={task.progress} words={stageWords(task, 'Checking the artwork')} mayLeave />
    );
  }
  if (task.state !== 'failed') return null;
  return (
    <Notice title="The artwork could not be checked." detail={task.problem}>
      <Button onPress={() => again.mutate()} isDisabled={again.isPending}>
        Check it again
      </Button>
      {again.error && <ProblemNotice problem={problemOf(again.error)} />}
    </Notice>
  );
}
