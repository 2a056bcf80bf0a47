import { ArtworkError } from '../../prepare/tools';
import { AppError } from '../errors';
import { log } from '../log';
import { isDiskFull } from '../storage/disk-full';

const SAFE_HEADERS = { 'cache-control': 'no-store', 'x-content-type-options': 'nosniff' };

export function json(value: unknown, status = 200, mediaType = 'application/json'): Response {
  return new Response(JSON.stringify(value), {
    status,
    headers: { ...SAFE_HEADERS, 'content-type': `${mediaType}; charset=utf-8` },
  });
}

/** Why and what to do: a message about artwork says the one in its first sentence and the other after it. */
function artworkWords(message: string): { detail: string; action?: string } {
  const [, detail, action] = /^(.+?\.) (\S.*)$/s.exec(message) ?? [];
  return action === undefined ? { detail: message } : { detail, action };
}

function refusalFor(error: unknown): AppError {
  if (error instanceof AppError) return error;
  if (error instanceof ArtworkError) {
    return new AppError(
      error.code === 'too-large' ? 'artwork-too-large' : 'artwork-refused',
      artworkWords(error.message),
      { cause: error },
    );
  }
  if (isDiskFull(error)) return new AppError('no-room', {}, { cause: error });
  log.error({ err: error }, 'an endpoint broke');
  return new AppError('broken', {}, { cause: error });
}

/** Whatever was thrown, as the answer that a person can act on (RFC 9457). */
export function problem(error: unknown): Response {
  const refusal = refusalFor(error);
  return json({ ...refusal.problem, status: refusal.status }, refusal.status, 'application/problem+json');
}

/** The answer of an endpoint that has nothing to say but that it is done. */
export const DONE = { ok: true } as const;
