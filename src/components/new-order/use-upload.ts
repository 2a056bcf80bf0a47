import { useRef, useState } from 'react';
import type { Problem } from '@/lib/orders/views';
import { problemOf } from '../api';
import { uploadArtwork, UploadCancelled } from '../upload-artwork';
import { refusalBeforeUpload } from './file-refusal';
import type { Draft } from './use-draft';

export interface UploadState {
  fileName: string | null;
  /** 0–1 while it is sent, else null */
  progress: number | null;
  problem: Problem | null;
  /** what the browser itself can show of the file until our own picture is drawn */
  previewUrl: string | null;
  start: (file: File) => void;
  cancel: () => void;
}

/** One artwork on its way to the draft: progress, cancel, refusal. */
export function useUpload(draft: Draft): UploadState {
  const [fileName, setFileName] = useState<string | null>(null);
  const [progress, setProgress] = useState<number | null>(null);
  const [problem, setProblem] = useState<Problem | null>(null);
  const [previewUrl, setPreviewUrl] = useState<string | null>(null);
  const running = useRef<{ cancel: () => void } | null>(null);

  const send = async (file: File) => {
    let stopped = false;
    running.current = { cancel: () => (stopped = true) };
    const order = await draft.open();
    if (stopped) throw new UploadCancelled();
    const upload = uploadArtwork(order.number, file, setProgress);
    running.current = upload;
    draft.take(await upload.done);
    if (previewUrl) URL.revokeObjectURL(previewUrl);
    setPreviewUrl(URL.createObjectURL(file));
  };

  const start = (file: File) => {
    running.current?.cancel();
    setFileName(file.name);
    const refused = refusalBeforeUpload(file);
    setProblem(refused);
    if (refused) return;
    setProgress(0);
    send(file)
      .catch((error: unknown) => !(error instanceof UploadCancelled) && setProblem(problemOf(error)))
      .finally(() => {
        setProgress(null);
        running.current = null;
      });
  };

  return { fileName, progress, problem, previewUrl, start, cancel: () => running.current?.cancel() };
}
