import type { z } from 'zod';
import type { Person } from '../person';
import { ROUTES, type Route, type RouteKey } from '../routes';

type Listed = (typeof ROUTES)[number];
/** The entry of ROUTES that a key names. */
export type RouteOf<K extends RouteKey> = K extends `${infer M} ${infer P}`
  ? Extract<Listed, { method: M; path: P }>
  : never;

/** Parameters that are row numbers; the others are words. */
export const NUMERIC_PARAMETERS = ['id', 'presetId', 'artworkVersion'] as const;

type ParameterNames<P extends string> = P extends `${string}:${infer Name}/${infer Rest}`
  ? Name | ParameterNames<`/${Rest}`>
  : P extends `${string}:${infer Name}`
    ? Name
    : never;
export type ParametersOf<K extends RouteKey> = {
  [N in ParameterNames<RouteOf<K>['path']>]: N extends (typeof NUMERIC_PARAMETERS)[number] ? number : string;
};

type Parsed<R, Field extends string> = R extends { [F in Field]: infer S extends z.ZodType }
  ? z.output<S>
  : undefined;
export type BodyOf<K extends RouteKey> = Parsed<RouteOf<K>, 'body'>;
export type QueryOf<K extends RouteKey> = Parsed<RouteOf<K>, 'query'>;
export type PersonOf<K extends RouteKey> = RouteOf<K>['access'] extends 'anyone' ? Person | null : Person;
export type AnswerOf<K extends RouteKey> =
  RouteOf<K> extends { response: infer S extends z.ZodType } ? z.input<S> | Response : Response;

const BY_KEY = new Map<string, Route>(ROUTES.map((route) => [`${route.method} ${route.path}`, route]));

/** The route of a key; a key that is not in the list is a mistake of the program. */
export function routeOf(key: RouteKey): Route {
  const route = BY_KEY.get(key);
  if (!route) throw new RangeError(`expected a key of ROUTES, got "${key}"`);
  return route;
}
