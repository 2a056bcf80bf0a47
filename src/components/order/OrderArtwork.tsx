import type { OrderView, ProgressEvent } from '@/lib/orders/views';
import { AnnotatedPlate } from '../AnnotatedPlate';
import { isWorking, taskWords } from '../new-order/task-words';
import { newestArtwork, pictureOf } from '../newest-artwork';
import { Notice } from '../Notice';
import { ProgressRule } from '../ProgressRule';

interface Props {
  order: OrderView;
  tasks: ProgressEvent['tasks'];
}

/** The artwork as it was sent, with what was found in it. */
export function OrderArtwork({ order, tasks }: Props) {
  const artwork = newestArtwork(order.artworks);
  if (!artwork) return <p className="text-quiet">No artwork yet.</p>;
  const news = tasks.find((task) => task.kind === 'check' && isWorking(task));
  const live = news ?? artwork.task;
  const working = isWorking(live);
  const status = (
    <>
      <p className="min-w-0 break-words text-15">
        <a className="link" href={artwork.originalUrl}>
          {artwork.fileName}
        </a>
        <span className="text-quiet">, version {artwork.version}</span>
      </p>
      {working && (
        <ProgressRule
          progress={live.state === 'running' ? live.progress : null}
          words={taskWords(live)}
          mayLeave
        />
      )}
      {artwork.task.state === 'failed' && (
        <Notice title="The check did not finish." detail={artwork.task.problem} />
      )}
    </>
  );
  const { check } = artwork;
  if (!check) return <div className="flex flex-col gap-4">{status}</div>;
  return (
    <AnnotatedPlate
      src={pictureOf(artwork)}
      alt={`Artwork ${artwork.fileName}`}
      widthMm={check.widthMm}
      heightMm={check.heightMm}
      linePitchMm={check.sizeAcrossMm}
      findings={check.findings}
      before={status}
    />
  );
}
