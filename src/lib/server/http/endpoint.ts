import type { APIContext, APIRoute } from 'astro';
import { orderNumberSchema } from '../../orders/order';
import { AppError } from '../errors';
import { countAttempt, isLimited } from '../limits';
import type { Person } from '../person';
import type { Access, Route, RouteKey } from '../routes';
import { json, problem } from './answer';
import { requireOwnOrigin } from './own-origin';
import { parseGiven } from './parse-given';
import { readJson, requireMediaType } from './read-body';
import {
  NUMERIC_PARAMETERS,
  routeOf,
  type AnswerOf,
  type BodyOf,
  type ParametersOf,
  type PersonOf,
  type QueryOf,
} from './routing';
import { socketAddress } from './socket-address';

/** What a handler is given: everything parsed, the person authorised for the route. */
export interface Call<K extends RouteKey> {
  person: PersonOf<K>;
  params: ParametersOf<K>;
  body: BodyOf<K>;
  query: QueryOf<K>;
  request: Request;
  url: URL;
  /** address that the request came from */
  address: string;
  /** session that it belongs to, or null */
  sessionId: string | null;
}

/** Throws unless the person may call a route of this access at all. */
export function authorise(person: Person | null, access: Access): void {
  if (access === 'anyone') return;
  if (!person) throw new AppError('not-signed-in');
  if (access !== 'signed-in' && !access.includes(person.role)) throw new AppError('not-allowed');
}

function readParameters(raw: APIContext['params']): Record<string, string | number> {
  const parameters: Record<string, string | number> = {};
  for (const [name, value = ''] of Object.entries(raw)) {
    const numeric = (NUMERIC_PARAMETERS as readonly string[]).includes(name);
    if (numeric && !/^[1-9]\d{0,14}$/.test(value)) throw new AppError('not-found');
    if (name === 'number' && !orderNumberSchema.safeParse(value).success) throw new AppError('not-found');
    parameters[name] = numeric ? Number(value) : value;
  }
  return parameters;
}

async function readBody(route: Route, request: Request): Promise<unknown> {
  if (route.upload) requireMediaType(request, 'multipart/form-data');
  return route.body ? parseGiven(route.body, await readJson(request)) : undefined;
}

async function limit(route: Route, person: Person | null, body: unknown, address: string): Promise<void> {
  const key = `${route.method} ${route.path}`;
  if (!isLimited(key)) return;
  const named = body as { email?: string } | undefined;
  await countAttempt(key, address, person?.email ?? named?.email ?? null);
}

/**
 * An endpoint of the list: it checks where the request came from, who asks and what was sent, calls the handler, and
 * gives its answer cut to the listed schema. Whose object it is, is decided by the use case.
 */
export function endpoint<K extends RouteKey>(
  key: K,
  handle: (call: Call<K>) => AnswerOf<K> | Promise<AnswerOf<K>>,
): APIRoute {
  const route = routeOf(key);
  return async ({ request, params: raw, locals, url }) => {
    try {
      if (route.method !== 'GET') requireOwnOrigin(request);
      const person = locals.user ?? null;
      authorise(person, route.access);
      const params = readParameters(raw);
      const address = socketAddress(request);
      const query = route.query && parseGiven(route.query, Object.fromEntries(url.searchParams));
      const body = await readBody(route, request);
      await limit(route, person, body, address);
      const call = {
        person,
        params,
        body,
        query,
        request,
        url,
        address,
        sessionId: locals.sessionId ?? null,
      } as Call<K>;
      const answer: unknown = await handle(call);
      if (answer instanceof Response) return answer;
      return json(route.response ? route.response.parse(answer) : answer);
    } catch (error) {
      return problem(error);
    }
  };
}
