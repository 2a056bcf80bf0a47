import '../../setup/database';
import { describe, expect, it } from 'vitest';
import { GET } from '@/pages/api/openapi.json';
import { ROUTES } from '@/lib/server/routes';
import { call, jsonOf } from '../../setup/call';

interface Operation {
  summary: string;
  description: string;
  parameters: { name: string; in: string }[];
  requestBody?: { content: Record<string, unknown> };
  responses: Record<string, unknown>;
}
const document = async () =>
  jsonOf<{ openapi: string; paths: Record<string, Record<string, Operation>> }>(await call(GET));

describe('the description', () => {
  it('has every route once and no other', async () => {
    const { paths, openapi } = await document();
    expect(openapi).toBe('3.1.0');
    const described = Object.entries(paths).flatMap(([path, methods]) =>
      Object.keys(methods).map((method) => `${method.toUpperCase()} ${path}`),
    );
    expect(described.sort()).toEqual(
      ROUTES.map(({ method, path }) => `${method} ${path.replace(/:(\w+)/g, '{$1}')}`).sort(),
    );
  });

  it('names every parameter of a path', async () => {
    for (const [path, methods] of Object.entries((await document()).paths)) {
      const names = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
      for (const { parameters } of Object.values(methods)) {
        expect(parameters.filter((parameter) => parameter.in === 'path').map(({ name }) => name)).toEqual(
          names,
        );
      }
    }
  });

  it('says what is sent, who may and what comes back', async () => {
    const { paths } = await document();
    const invite = paths['/api/people/invitations'].post;
    expect(invite.description).toBe('For: admin.');
    expect(JSON.stringify(invite.requestBody)).toContain('"designer"');
    expect(paths['/api/orders/{number}/artwork'].post.requestBody?.content).toHaveProperty(
      'multipart/form-data',
    );
    expect(paths['/api/people'].get.parameters).toContainEqual(
      expect.objectContaining({ name: 'role', in: 'query', required: false }),
    );
    for (const methods of Object.values(paths))
      for (const { responses } of Object.values(methods))
        expect(Object.keys(responses)).toEqual(['200', 'default']);
  });

  it('refers to nothing that it does not hold', async () => {
    const text = JSON.stringify(await document());
    const references = [...text.matchAll(/"\$ref":"([^"]+)"/g)].map(([, reference]) => reference);
    expect(new Set(references)).toEqual(new Set(['#/components/schemas/Problem']));
  });
});
