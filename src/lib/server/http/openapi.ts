import { z } from 'zod';
import { refusalSchema, ROUTES, type Access, type Route } from '../routes';
import { NUMERIC_PARAMETERS } from './routing';

type Json = Record<string, unknown>;

const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, {
    io,
    target: 'draft-2020-12',
    unrepresentable: 'any',
  });
  return rest;
};

const whoMay = (access: Access): string =>
  access === 'anyone'
    ? 'Anyone.'
    : access === 'signed-in'
      ? 'Anyone signed in.'
      : `For: ${access.join(', ')}.`;

function pathParameters(path: string): Json[] {
  return [...path.matchAll(/:(\w+)/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: { type: (NUMERIC_PARAMETERS as readonly string[]).includes(name) ? 'integer' : 'string' },
  }));
}

function queryParameters(query: z.ZodType | undefined): Json[] {
  if (!query) return [];
  const { properties = {}, required = [] } = schemaOf(query, 'input') as {
    properties?: Json;
    required?: string[];
  };
  return Object.entries(properties).map(([name, schema]) => ({
    name,
    in: 'query',
    required: required.includes(name),
    schema,
  }));
}

function requestBody(route: Route): Json | undefined {
  if (route.upload) {
    const schema = {
      type: 'object',
      properties: { artwork: { type: 'string', format: 'binary' } },
      required: ['artwork'],
    };
    return { required: true, content: { 'multipart/form-data': { schema } } };
  }
  return (
    route.body && {
      required: true,
      content: { 'application/json': { schema: schemaOf(route.body, 'input') } },
    }
  );
}

function responses(route: Route): Json {
  const content = route.response
    ? { 'application/json': { schema: schemaOf(route.response, 'output') } }
    : { [route.media ?? 'application/octet-stream']: {} };
  return {
    200: { description: 'Done', content },
    default: {
      description: 'Refused: what happened, why, what to do',
      content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
    },
  };
}

function operation(route: Route): Json {
  return {
    summary: route.summary,
    description: whoMay(route.access),
    parameters: [...pathParameters(route.path), ...queryParameters(route.query)],
    requestBody: requestBody(route),
    responses: responses(route),
    security: route.access === 'anyone' ? [] : [{ session: [] }],
  };
}

/** The OpenAPI 3.1 description of every endpoint, from the same schemas that check requests and answers. */
export function openApi(): Json {
  const paths: Record<string, Json> = {};
  for (const route of ROUTES as readonly Route[]) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method.toLowerCase()]: operation(route) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Umberline',
      version: '1',
      description: 'Artwork preflight and preparation for a laser-engraving shop.',
    },
    paths,
    components: {
      schemas: { Problem: schemaOf(refusalSchema, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'authjs.session-token' } },
    },
  };
}
