import type { z } from 'zod';
import type { Problem } from '@/lib/orders/views';
import type { RouteKey, ROUTES } from '@/lib/server/routes';

type AnyRoute = (typeof ROUTES)[number];
type RouteOf<K extends RouteKey> = K extends `${infer M} ${infer P}`
  ? Extract<AnyRoute, { method: M; path: P }>
  : never;
type PathOf<K extends RouteKey> = K extends `${string} ${infer P}` ? P : never;
type ParamNames<P extends string> = P extends `${string}:${infer Name}/${infer Rest}`
  ? Name | ParamNames<Rest>
  : P extends `${string}:${infer Name}`
    ? Name
    : never;

type ParamsPart<K extends RouteKey> = [ParamNames<PathOf<K>>] extends [never]
  ? { params?: undefined }
  : { params: Record<ParamNames<PathOf<K>>, string | number> };
type QueryPart<K extends RouteKey> =
  RouteOf<K> extends { query: infer Q extends z.ZodType } ? { query?: z.input<Q> } : { query?: undefined };
type BodyPart<K extends RouteKey> =
  RouteOf<K> extends { body: infer B extends z.ZodType } ? { body: z.input<B> } : { body?: undefined };

export type CallInput<K extends RouteKey> = ParamsPart<K> &
  QueryPart<K> &
  BodyPart<K> & { signal?: AbortSignal };
export type CallAnswer<K extends RouteKey> =
  RouteOf<K> extends { response: infer R extends z.ZodType } ? z.output<R> : never;

/** A refusal that the server put into words: what happened, why, what to do. */
export class Refusal extends Error {
  override readonly name = 'Refusal';
  constructor(
    readonly status: number,
    readonly problem: Problem,
  ) {
    super(problem.title);
  }
}

const UNREACHABLE: Problem = {
  code: 'unreachable',
  title: 'The shop does not answer.',
  detail: 'The connection may be down.',
  action: 'Try again in a moment. What you entered stays here.',
};

/** Any error as something that can be shown. */
export function problemOf(error: unknown): Problem {
  return error instanceof Refusal ? error.problem : UNREACHABLE;
}

export function isProblem(value: unknown): value is Problem {
  return typeof value === 'object' && value !== null && 'title' in value && 'action' in value;
}

export function addressOf(
  key: RouteKey,
  params: Record<string, string | number> = {},
  query: Record<string, unknown> = {},
): string {
  const path = key
    .slice(key.indexOf(' ') + 1)
    .replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
  const given = Object.entries(query).filter(
    ([, value]) => value !== undefined && value !== '' && value !== null,
  );
  const search = new URLSearchParams(given.map(([name, value]) => [name, String(value)])).toString();
  return search ? `${path}?${search}` : path;
}

/** Calls one endpoint of the product with its own types. Throws `Refusal`. */
export async function call<K extends RouteKey>(key: K, input: CallInput<K>): Promise<CallAnswer<K>> {
  const { params, query, body, signal } = input as {
    params?: Record<string, string | number>;
    query?: Record<string, unknown>;
    body?: unknown;
    signal?: AbortSignal;
  };
  const response = await fetch(addressOf(key, params, query), {
    method: key.slice(0, key.indexOf(' ')),
    headers:
      body === undefined
        ? { accept: 'application/json' }
        : { accept: 'application/json', 'content-type': 'application/json' },
    body: body === undefined ? undefined : JSON.stringify(body),
    signal,
  });
  const answer: unknown = await response.json().catch(() => null);
  if (response.ok) return answer as CallAnswer<K>;
  throw new Refusal(response.status, isProblem(answer) ? answer : UNREACHABLE);
}
