import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { OrderView, Problem } from '@/lib/orders/views';
import { problemOf } from '../api';
import { FileButton } from '../new-order/DropPlace';
import { refusalBeforeUpload } from '../new-order/file-refusal';
import { ProblemNotice } from '../Notice';
import { ProgressRule } from '../ProgressRule';
import { uploadArtwork, UploadCancelled } from '../upload-artwork';
import { orderKey } from '../use-order';

/** Sends mended or other artwork as a new version; the former ones stay. */
export function NewArtwork({ order }: { order: OrderView }) {
  const queries = useQueryClient();
  const [progress, setProgress] = useState<number | null>(null);
  const [problem, setProblem] = useState<Problem | null>(null);
  if (!order.events.includes('new-artwork')) return null;
  const send = async (file: File) => {
    const refused = refusalBeforeUpload(file);
    setProblem(refused);
    if (refused) return;
    setProgress(0);
    try {
      queries.setQueryData(orderKey(order.number), await uploadArtwork(order.number, file, setProgress).done);
    } catch (error) {
      if (!(error instanceof UploadCancelled)) setProblem(problemOf(error));
    } finally {
      setProgress(null);
    }
  };
  return (
    <div className="flex flex-col items-start gap-3 pt-2">
      {progress === null ? (
        <FileButton words="Send a new version" onFile={(file) => void send(file)} />
      ) : (
        <div className="w-full">
          <ProgressRule progress={progress} words={progress < 1 ? `Sending, ${Math.round(progress * 100)} %` : 'It has arrived. Reading it.'} />
        </div>
      )}
      <p className="text-13 text-quiet">A new version is checked again, and voids a pass and an approval.</p>
      {problem && <ProblemNotice problem={problem} />}
    </div>
  );
}
