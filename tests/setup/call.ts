import type { APIContext, APIRoute } from 'astro';
import { markSocketAddress } from '@/lib/server/http/socket-address';
import type { Person } from '@/lib/server/person';

export interface CallOptions {
  method?: string;
  /** address with its query */
  path?: string;
  params?: Record<string, string>;
  body?: unknown;
  /** a body that is not JSON */
  raw?: BodyInit;
  headers?: Record<string, string>;
  person?: Person | null;
  sessionId?: string;
  address?: string;
}

/** Calls an endpoint's exported function as Astro would, from a page of our own site. */
export async function call(route: APIRoute, options: CallOptions = {}): Promise<Response> {
  const url = new URL(options.path ?? '/', 'http://localhost:4380');
  const method = options.method ?? (options.body === undefined && options.raw === undefined ? 'GET' : 'POST');
  const headers = new Headers({ origin: url.origin, ...options.headers });
  if (options.raw === undefined && method !== 'GET' && !headers.has('content-type'))
    headers.set('content-type', 'application/json');
  markSocketAddress(headers, options.address ?? '192.0.2.1');
  const body = options.raw ?? (options.body === undefined ? undefined : JSON.stringify(options.body));
  const request = new Request(url, {
    method,
    headers,
    body,
    ...(body instanceof ReadableStream ? { duplex: 'half' } : {}),
  });
  const context = {
    request,
    url,
    params: options.params ?? {},
    locals: { user: options.person ?? null, sessionId: options.sessionId ?? null },
  };
  return route(context as unknown as APIContext);
}

/** The JSON of an answer, which must have the status expected. */
export async function jsonOf<T = Record<string, unknown>>(response: Response, status = 200): Promise<T> {
  const text = await response.text();
  if (response.status !== status)
    throw new Error(`expected status ${status}, got ${response.status}: ${text}`);
  return JSON.parse(text) as T;
}
