import type { IncomingMessage } from 'node:http';
import { PassThrough, Readable } from 'node:stream';
import type { ReadableStream as NodeReadableStream } from 'node:stream/web';
import formidable, { errors as codes } from 'formidable';
import { ArtworkError, LIMITS } from '../../prepare/tools';
import { AppError } from '../errors';
import type { Incoming, Storage } from '../storage/storage';

/** Room for the parts' own headers around the file. */
const ENVELOPE_BYTES = 64 * 1024;
const MIB = 1024 * 1024;

const tooLarge = (): AppError =>
  new AppError('artwork-too-large', { detail: `The file has more than ${LIMITS.maxBytes / MIB} MiB.` });

/** Length that the request states; 0 where it states none. */
export const statedLength = (request: Request): number =>
  Number(request.headers.get('content-length') ?? 0) || 0;

/** Refuses by the stated length, before a byte is read. */
export function requireUploadLength(request: Request): void {
  if (statedLength(request) > LIMITS.maxBytes + ENVELOPE_BYTES) throw tooLarge();
}

/** The name as people know it: without folders, control characters or a length that breaks a page. */
export function shownFileName(original: string | null): string {
  const last = (original ?? '').split(/[/\\]/).at(-1) ?? '';
  const plain = [...last]
    .filter((character) => !/\p{C}/u.test(character))
    .join('')
    .trim();
  return plain.slice(-120) || 'artwork';
}

function refusalOf(error: unknown): unknown {
  const { code, httpCode } = (error ?? {}) as { code?: number; httpCode?: number };
  if (code === codes.biggerThanMaxFileSize || code === codes.biggerThanTotalMaxFileSize) return tooLarge();
  if (code === codes.aborted)
    return new AppError(
      'unreadable-body',
      { detail: 'The upload broke off.', action: 'Send the file again.' },
      { cause: error },
    );
  if (code === codes.maxFilesExceeded)
    return new AppError('malformed', { fields: { artwork: 'Send one file at a time.' } }, { cause: error });
  if (httpCode !== undefined && httpCode < 500) {
    return new AppError(
      'unreadable-body',
      { detail: 'The form that carries the file is broken.', action: 'Send the file again.' },
      { cause: error },
    );
  }
  return error;
}

/** formidable wants Node's own request: the body's stream with the headers beside it. */
function asNodeRequest(request: Request): IncomingMessage {
  if (!request.body) throw new AppError('no-artwork');
  const body = Readable.fromWeb(request.body as unknown as NodeReadableStream);
  const headers: Record<string, string> = Object.fromEntries(request.headers);
  // It takes a body with neither a length nor a transfer coding for an empty one.
  if (!headers['content-length']) headers['transfer-encoding'] ??= 'chunked';
  return Object.assign(body, {
    headers,
    method: request.method,
    url: request.url,
  }) as unknown as IncomingMessage;
}

/**
 * Streams the one file of a multipart form into storage, where it waits for a decision: no more than a chunk of it is in
 * memory, and nothing of it stays when the request breaks off or is refused.
 */
export async function receiveFile(
  request: Request,
  field: string,
  storage: Storage,
): Promise<{ fileName: string; incoming: Incoming }> {
  requireUploadLength(request);
  const arriving: { pipe: PassThrough; stored: Promise<Incoming> }[] = [];
  const form = formidable({
    maxFiles: 1,
    maxFileSize: LIMITS.maxBytes,
    maxTotalFileSize: LIMITS.maxBytes,
    allowEmptyFiles: true,
    minFileSize: 0,
    maxFields: 8,
    maxFieldsSize: ENVELOPE_BYTES,
    filter: ({ name, originalFilename }) => name === field && originalFilename !== null,
    fileWriteStreamHandler: () => {
      const pipe = new PassThrough();
      const stored = storage.receive(pipe);
      stored.catch((error: Error) => pipe.destroy(error));
      arriving.push({ pipe, stored });
      return pipe;
    },
  });
  try {
    const [, files] = await form.parse(asNodeRequest(request));
    const [arrived] = arriving;
    if (!arrived) throw new AppError('no-artwork');
    const incoming = await arrived.stored;
    const fileName = shownFileName(files[field]?.[0]?.originalFilename ?? null);
    if (incoming.bytes > 0) return { fileName, incoming };
    await incoming.discard();
    throw new ArtworkError(
      'empty-file',
      'The file is empty: it holds no bytes at all. Export it again and drop it here.',
    );
  } catch (error) {
    for (const { pipe, stored } of arriving) {
      pipe.destroy(new Error('the upload was refused'));
      await stored.then(
        (incoming) => incoming.discard(),
        () => undefined,
      );
    }
    throw refusalOf(error);
  }
}
