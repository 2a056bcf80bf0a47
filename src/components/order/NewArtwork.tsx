import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { OrderView, Problem } from '@/lib/orders/views';
import { problemOf } from '../api';
import { FileButton } from '../new-order/DropPlace';
import { refusalBeforeUpload } from '../new-order/file-refusal';
import { ProblemNotice } from '../Notice';
import { ProgressRule } from '../ProgressRule';
import { uploadArtwork } from '../upload-artwork';
import { orderKey } from '../use-order';

const VOIDS = ['passed', 'proof-sent', 'approved', 'released'] as const;

/** Sends a new version of the artwork; past the designer's pass, it says what that undoes. */
export function NewArtwork({ order }: { order: OrderView }) {
  const queries = useQueryClient();
  const [progress, setProgress] = useState<number | null>(null);
  const [problem, setProblem] = useState<Problem | null>(null);
  const send = (file: File) => {
    const refused = refusalBeforeUpload(file);
    setProblem(refused);
    if (refused) return;
    setProgress(0);
    uploadArtwork(order.number, file, setProgress)
      .done.then((next) => queries.setQueryData(orderKey(order.number), next))
      .catch((error: unknown) => setProblem(problemOf(error)))
      .finally(() => setProgress(null));
  };
  return (
    <div className="flex max-w-form flex-col gap-2">
      {problem && <ProblemNotice problem={problem} />}
      {progress !== null ? (
        <ProgressRule progress={progress} words="Sending the new artwork" />
      ) : (
        <FileButton words="Send new artwork" onFile={send} />
      )}
      {VOIDS.some((state) => state === order.state) && (
        <p className="text-13 text-quiet">New artwork is prepared anew and needs a new proof.</p>
      )}
    </div>
  );
}
