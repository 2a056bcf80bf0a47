import type { OrderView } from '@/lib/orders/views';
import { isProblem, Refusal } from './api';

export interface Upload {
  done: Promise<OrderView>;
  cancel: () => void;
}

/** Thrown when the person stopped the upload. */
export class UploadCancelled extends Error {
  override readonly name = 'UploadCancelled';
}

const BROKEN_OFF = {
  code: 'upload-broken-off',
  title: 'The upload broke off.',
  detail: 'The connection went away before the whole file had arrived.',
  action: 'Drop the file here again.',
};

/** Sends artwork with its progress, 0–1. XMLHttpRequest, because fetch tells nothing of what was sent. */
export function uploadArtwork(
  orderNumber: string,
  file: File,
  onProgress: (progress: number) => void,
): Upload {
  const request = new XMLHttpRequest();
  const done = new Promise<OrderView>((resolve, reject) => {
    request.upload.onprogress = (event) => event.lengthComputable && onProgress(event.loaded / event.total);
    request.onabort = () => reject(new UploadCancelled());
    request.onerror = () => reject(new Refusal(0, BROKEN_OFF));
    request.onload = () => {
      const answer = request.response as unknown;
      if (request.status >= 200 && request.status < 300)
        return resolve((answer as { order: OrderView }).order);
      reject(new Refusal(request.status, isProblem(answer) ? answer : BROKEN_OFF));
    };
  });
  const form = new FormData();
  form.append('artwork', file);
  request.open('POST', `/api/orders/${encodeURIComponent(orderNumber)}/artwork`);
  request.responseType = 'json';
  request.send(form);
  return { done, cancel: () => request.abort() };
}
