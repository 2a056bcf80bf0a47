import { useMutation } from '@tanstack/react-query';
import type { ArtworkView, OrderView, TaskView } from '@/lib/orders/views';
import { AnnotatedPlate } from '../AnnotatedPlate';
import { call } from '../api';
import { Button } from '../Button';
import { Notice, ProblemNotice } from '../Notice';
import { ProgressRule } from '../ProgressRule';
import { newestArtwork, pictureOf } from '../newest-artwork';
import { DropPlace, FileButton } from './DropPlace';
import { SoundWidth } from './SoundWidth';
import { isWorking, taskWords } from './task-words';
import type { UploadState } from './use-upload';

interface Props {
  order: OrderView | null;
  upload: UploadState;
  take: (order: OrderView) => void;
  /** the check as it goes on; null until its first news */
  liveTask: TaskView | null;
  unit: 'mm' | 'in';
  sizeIsSaid: boolean;
  onUseWidth: (widthMm: number) => void;
}

/** The artwork: dropped, sent, looked at; its findings in the margin. */
export function ArtworkPart({ order, upload, take, liveTask, unit, sizeIsSaid, onUseWidth }: Props) {
  const artwork = order ? newestArtwork(order.artworks) : null;
  return (
    <section aria-label="Artwork" className="flex flex-col gap-4">
      {upload.problem && <ProblemNotice problem={upload.problem} />}
      {upload.progress !== null && <Sending upload={upload} />}
      {!artwork && upload.progress === null && <DropPlace onFile={upload.start} />}
      {artwork && upload.progress === null && (
        <>
          <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
            <p className="min-w-0 truncate text-15">
              <span className="font-semibold">{artwork.fileName}</span>
              <span className="text-quiet"> · version {artwork.version}, kept as you sent it</span>
            </p>
            <FileButton words="Send other artwork" onFile={upload.start} />
          </div>
          <CheckedArtwork
            {...{ artwork, take, liveTask, unit, sizeIsSaid, onUseWidth }}
            orderNumber={order!.number}
            previewUrl={upload.previewUrl}
          />
        </>
      )}
    </section>
  );
}

function Sending({ upload }: { upload: UploadState }) {
  const percent = Math.round((upload.progress ?? 0) * 100);
  return (
    <div className="flex flex-col gap-4 border border-edge bg-sheet p-6">
      <ProgressRule
        progress={upload.progress}
        words={
          percent < 100
            ? `Sending ${upload.fileName}: ${percent} %`
            : `${upload.fileName} has arrived. Reading it.`
        }
      />
      <div>
        <Button onPress={upload.cancel}>Cancel sending</Button>
      </div>
    </div>
  );
}

interface CheckedProps extends Omit<Props, 'order' | 'upload'> {
  artwork: ArtworkView;
  orderNumber: string;
  previewUrl: string | null;
}

function CheckedArtwork({
  artwork,
  orderNumber,
  previewUrl,
  take,
  liveTask,
  unit,
  sizeIsSaid,
  onUseWidth,
}: CheckedProps) {
  const { check } = artwork;
  const task = liveTask && isWorking(liveTask) ? liveTask : artwork.task;
  const again = useMutation({
    mutationFn: () =>
      call('POST /api/orders/:number/artwork/:artworkVersion/check', {
        params: { number: orderNumber, artworkVersion: artwork.version },
        body: {},
      }),
    onSuccess: ({ order }) => take(order),
  });
  const working = isWorking(task);
  const status = (
    <>
      {working && (
        <ProgressRule
          progress={task.state === 'running' ? task.progress : null}
          words={taskWords(task)}
          mayLeave
        />
      )}
      {task.state === 'failed' && (
        <Notice title="The check did not finish." detail={task.problem}>
          <Button onPress={() => again.mutate()} isDisabled={again.isPending}>
            Check again
          </Button>
        </Notice>
      )}
      {check && !sizeIsSaid && (
        <p className="text-13 text-quiet">
          Looked at {Number(check.widthMm.toFixed(1))} mm wide for now. Say the size below, and it is looked
          at again.
        </p>
      )}
      {check?.artwork.remarks.map((remark) => (
        <p key={remark} className="text-13 text-quiet">
          {remark}
        </p>
      ))}
    </>
  );
  if (!check) {
    return (
      <div className="grid gap-6 lg:grid-cols-[minmax(0,1fr)_300px]">
        <div className="plate-well">
          {previewUrl && (
            <img
              src={previewUrl}
              alt={`Preview of ${artwork.fileName}`}
              className="max-h-[480px] max-w-full bg-[#fff]"
            />
          )}
        </div>
        <aside className="flex flex-col gap-4">{status}</aside>
      </div>
    );
  }
  return (
    <AnnotatedPlate
      src={pictureOf(artwork) ?? previewUrl}
      alt={`Your artwork ${artwork.fileName}`}
      widthMm={check.widthMm}
      heightMm={check.heightMm}
      unit={unit}
      linePitchMm={check.sizeAcrossMm}
      findings={check.findings}
      before={status}
      clear={working ? '' : undefined}
      after={<SoundWidth check={check} unit={unit} onUse={onUseWidth} />}
    />
  );
}
