import { AppError } from '../errors';
import { StorageError, type Storage, type StorageKey } from '../storage/storage';

/** Nothing that is stored may run, fetch or frame anything, whatever a browser takes it for. */
const LOCKED = {
  'x-content-type-options': 'nosniff',
  'content-security-policy': "sandbox; default-src 'none'",
};

/** A name for Content-Disposition (RFC 6266): plain ASCII for old readers, the true one for the others. */
export function attachment(fileName: string): string {
  const ascii = fileName.replace(/[^A-Za-z0-9._ -]/g, '_');
  const encoded = encodeURIComponent(fileName).replace(
    /['()*]/g,
    (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `attachment; filename="${ascii}"; filename*=UTF-8''${encoded}`;
}

async function found(storage: Storage, key: StorageKey): Promise<Awaited<ReturnType<Storage['stream']>>> {
  try {
    return await storage.stream(key);
  } catch (cause) {
    if (!(cause instanceof StorageError)) throw cause;
    throw new AppError(
      'broken',
      { detail: 'The stored file is missing.', action: 'Tell the shop, and send the artwork again.' },
      { cause },
    );
  }
}

/** A stored file as a download, never with a type that a browser would run. */
export async function download(storage: Storage, key: StorageKey, fileName: string): Promise<Response> {
  const { bytes, body } = await found(storage, key);
  return new Response(body, {
    headers: {
      ...LOCKED,
      'content-type': 'application/octet-stream',
      'content-length': String(bytes),
      'content-disposition': attachment(fileName),
      'cache-control': 'private, no-store',
    },
  });
}

/** A PNG that we drew ourselves. Its bytes never change under its hash, so a browser asks only whether they did. */
export async function picture(storage: Storage, key: StorageKey, request: Request): Promise<Response> {
  const headers = { ...LOCKED, etag: `"${key}"`, 'cache-control': 'private, no-cache' };
  if (request.headers.get('if-none-match') === headers.etag)
    return new Response(null, { status: 304, headers });
  const { bytes, body } = await found(storage, key);
  return new Response(body, {
    headers: { ...headers, 'content-type': 'image/png', 'content-length': String(bytes) },
  });
}
