import { AppError } from '../errors';

/** No JSON body of ours comes near this. */
export const LONGEST_JSON_BYTES = 256 * 1024;

const mediaType = (request: Request): string =>
  (request.headers.get('content-type') ?? '').split(';')[0].trim().toLowerCase();

export function requireMediaType(request: Request, wanted: string): void {
  if (mediaType(request) === wanted) return;
  throw new AppError('wrong-media-type', { detail: `This address takes ${wanted}.` });
}

async function readCapped(body: ReadableStream<Uint8Array>, longest: number): Promise<Buffer> {
  const parts: Uint8Array[] = [];
  let length = 0;
  for await (const part of body as unknown as AsyncIterable<Uint8Array>) {
    length += part.byteLength;
    if (length > longest)
      throw new AppError('too-large', { detail: `A form may have ${longest / 1024} KiB.` });
    parts.push(part);
  }
  return Buffer.concat(parts);
}

/** The JSON of a request, never more than the limit in memory; a request without a body gives an empty object. */
export async function readJson(request: Request): Promise<unknown> {
  if (Number(request.headers.get('content-length') ?? 0) > LONGEST_JSON_BYTES) {
    throw new AppError('too-large', { detail: `A form may have ${LONGEST_JSON_BYTES / 1024} KiB.` });
  }
  requireMediaType(request, 'application/json');
  const bytes = request.body ? await readCapped(request.body, LONGEST_JSON_BYTES) : Buffer.alloc(0);
  if (bytes.length === 0) return {};
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch (cause) {
    throw new AppError('unreadable-body', {}, { cause });
  }
}
