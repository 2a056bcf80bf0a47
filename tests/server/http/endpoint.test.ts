import '../../setup/database';
import { beforeEach, describe, expect, it } from 'vitest';
import { DONE } from '@/lib/server/http/answer';
import { endpoint } from '@/lib/server/http/endpoint';
import { LONGEST_JSON_BYTES } from '@/lib/server/http/read-body';
import { AppError } from '@/lib/server/errors';
import { ALLOWANCES, forgetAttempts } from '@/lib/server/limits';
import type { Person } from '@/lib/server/person';
import { ArtworkError } from '@/lib/prepare/tools';
import type { RouteKey } from '@/lib/server/routes';
import { call, jsonOf, type CallOptions } from '../../setup/call';

const admin: Person = { id: 1, name: 'Odile', email: 'odile@shop.example', role: 'admin', confirmed: true };
const customer: Person = { ...admin, id: 2, name: 'Ines', email: 'ines@shop.example', role: 'customer' };

beforeEach(forgetAttempts);

const invite = endpoint('POST /api/people/invitations', () => DONE);
const invitation = { email: 'runa@shop.example', role: 'operator' };
const codeOf = async (options: CallOptions, status: number): Promise<unknown> =>
  (await jsonOf(await call(invite, options), status)).code;

describe('an answer', () => {
  it('is JSON that nobody keeps and no browser guesses at', async () => {
    const response = await call(invite, { body: invitation, person: admin });
    expect(await response.json()).toEqual({ ok: true });
    expect(Object.fromEntries(response.headers)).toMatchObject({
      'content-type': 'application/json; charset=utf-8',
      'cache-control': 'no-store',
      'x-content-type-options': 'nosniff',
    });
  });

  it('is cut to what is listed: a field too many never leaves the server', async () => {
    const leaky = endpoint('GET /api/account', () => ({
      person: {
        id: 1,
        name: 'O',
        email: 'o@shop.example',
        role: 'admin' as const,
        confirmed: true,
        disabled: false,
        password_hash: 'secret',
      },
    }));
    expect(await (await call(leaky)).text()).not.toContain('secret');
  });

  it('of another kind passes through as it is', async () => {
    const health = endpoint('GET /health', () => new Response('well', { status: 503 }));
    const response = await call(health);
    expect([response.status, await response.text()]).toEqual([503, 'well']);
  });

  it('that does not fit its own schema is our fault, not the caller’s', async () => {
    const wrong = endpoint('GET /api/machines', () => ({ machines: [{ id: 'one' }] }) as never);
    expect((await call(wrong, { person: admin })).status).toBe(500);
  });
});

describe('where a change comes from', () => {
  const base: CallOptions = { body: invitation, person: admin };

  it.each([
    ['another site', { origin: 'https://elsewhere.example' }],
    ['another port of this machine', { origin: 'http://localhost:9999' }],
    ['another scheme', { origin: 'https://localhost:4380' }],
    ['a sandboxed frame', { origin: 'null' }],
    ['another site that hides its origin', { 'sec-fetch-site': 'cross-site' }],
    ['a sister site', { 'sec-fetch-site': 'same-site' }],
  ])('is refused from %s', async (_, headers) => {
    expect(await codeOf({ ...base, headers }, 403)).toBe('cross-site');
  });

  it('is looked at before who asks', async () => {
    expect(
      await codeOf({ ...base, person: null, headers: { origin: 'https://elsewhere.example' } }, 403),
    ).toBe('cross-site');
  });

  it.each([
    ['our own page', { 'sec-fetch-site': 'same-origin' }],
    ['the address bar', { 'sec-fetch-site': 'none' }],
  ])('is taken from %s', async (_, headers) => {
    expect((await call(invite, { ...base, headers })).status).toBe(200);
  });

  it('does not matter for reading, which changes nothing', async () => {
    const list = endpoint('GET /api/machines', () => ({ machines: [] }));
    expect(
      (await call(list, { person: admin, headers: { origin: 'https://elsewhere.example' } })).status,
    ).toBe(200);
  });
});

describe('who asks', () => {
  it('must be signed in where the list says so', async () => {
    expect(await codeOf({ body: invitation }, 401)).toBe('not-signed-in');
  });

  it('must have one of the listed roles', async () => {
    expect(await codeOf({ body: invitation, person: customer }, 403)).toBe('not-allowed');
  });

  it('is settled before the body is looked at', async () => {
    expect(await codeOf({ raw: '{', headers: { 'content-type': 'application/json' } }, 401)).toBe(
      'not-signed-in',
    );
  });
});

describe('a body', () => {
  it('must be JSON', async () => {
    for (const type of ['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data', '']) {
      expect(
        await codeOf(
          { person: admin, raw: JSON.stringify(invitation), headers: { 'content-type': type } },
          415,
        ),
      ).toBe('wrong-media-type');
    }
    const charset = { 'content-type': 'Application/JSON; charset=utf-8' };
    expect(
      (await call(invite, { person: admin, raw: JSON.stringify(invitation), headers: charset })).status,
    ).toBe(200);
  });

  it('must be well formed', async () => {
    const headers = { 'content-type': 'application/json' };
    expect(await codeOf({ person: admin, raw: '{"email":', headers }, 400)).toBe('unreadable-body');
    expect(await codeOf({ person: admin, raw: Buffer.from([0x22, 0xff, 0xfe, 0x22]), headers }, 400)).toBe(
      'unreadable-body',
    );
  });

  it('that does not fit is told field by field', async () => {
    const problem = await jsonOf(
      await call(invite, { person: admin, body: { email: 'runa', role: 'king' } }),
      422,
    );
    expect(problem).toMatchObject({ code: 'malformed', status: 422 });
    expect(Object.keys(problem.fields as object)).toEqual(['email', 'role']);
  });

  it('is refused by its stated length before a byte is read', async () => {
    let read = false;
    const raw = new ReadableStream(
      {
        pull(controller) {
          read = true;
          controller.close();
        },
      },
      { highWaterMark: 0 },
    );
    const headers = { 'content-type': 'application/json', 'content-length': String(LONGEST_JSON_BYTES + 1) };
    expect(await codeOf({ person: admin, raw, headers }, 413)).toBe('too-large');
    expect(read).toBe(false);
  });

  it('is given up as soon as it runs over, when no length is stated', async () => {
    let sent = 0;
    const raw = new ReadableStream({
      pull(controller) {
        sent += 64 * 1024;
        controller.enqueue(new Uint8Array(64 * 1024).fill(0x20));
      },
    });
    expect(await codeOf({ person: admin, raw, headers: { 'content-type': 'application/json' } }, 413)).toBe(
      'too-large',
    );
    expect(sent).toBeLessThan(LONGEST_JSON_BYTES * 2);
  });

  it('may be absent where nothing is asked for', async () => {
    const confirmation = endpoint('POST /api/account/confirmation', () => DONE);
    expect((await call(confirmation, { method: 'POST', person: customer })).status).toBe(200);
  });

  it('of an upload must be multipart, and stays unread', async () => {
    const upload = endpoint(
      'POST /api/orders/:number/artwork',
      ({ request }) => new Response(request.bodyUsed ? 'read' : 'unread'),
    );
    const params = { number: 'U-1001' };
    expect((await call(upload, { method: 'POST', body: {}, params, person: customer })).status).toBe(415);
    const form = new FormData();
    form.set('artwork', new Blob(['x']), 'x.png');
    const request = new Request('http://localhost/', { method: 'POST', body: form });
    const headers = { 'content-type': request.headers.get('content-type') ?? '' };
    expect(
      await (
        await call(upload, { raw: await request.arrayBuffer(), params, person: customer, headers })
      ).text(),
    ).toBe('unread');
  });
});

describe('parameters and query', () => {
  const change = endpoint('PATCH /api/people/:id', ({ params }) => new Response(JSON.stringify(params)));

  it('are numbers where rows are meant', async () => {
    expect(
      await jsonOf(await call(change, { method: 'PATCH', body: {}, params: { id: '42' }, person: admin })),
    ).toEqual({ id: 42 });
  });

  it.each(['0', '-1', '1.5', '01', 'abc', '', '1e3', '9'.repeat(20), ' 1', '1%20'])(
    'answer 404 to the row "%s"',
    async (id) => {
      expect((await call(change, { method: 'PATCH', body: {}, params: { id }, person: admin })).status).toBe(
        404,
      );
    },
  );

  it.each(['u-1001', 'U-1', 'U-1001/..', '1001', 'U-1001 ', 'U-123456789'])(
    'answer 404 to the order "%s"',
    async (number) => {
      const order = endpoint('GET /api/orders/:number/progress', () => new Response('seen'));
      expect((await call(order, { params: { number }, person: admin })).status).toBe(404);
    },
  );

  it('are parsed with their defaults', async () => {
    const people = endpoint('GET /api/people', ({ query }) => new Response(JSON.stringify(query)));
    expect(
      await jsonOf(await call(people, { path: '/api/people?role=admin&other=1', person: admin })),
    ).toEqual({ q: '', role: 'admin' });
    expect((await call(people, { path: '/api/people?role=king', person: admin })).status).toBe(422);
  });
});

describe('what a handler throws', () => {
  const throwing = (error: unknown) => call(endpoint('GET /health', () => Promise.reject(error)));

  it('is told as the table has it', async () => {
    const response = await throwing(new AppError('conflict', { detail: 'Teo was quicker.' }));
    expect(response.headers.get('content-type')).toBe('application/problem+json; charset=utf-8');
    expect(await jsonOf(response, 409)).toMatchObject({
      code: 'conflict',
      detail: 'Teo was quicker.',
      status: 409,
    });
  });

  it('tells of artwork in its own words', async () => {
    const twoSentences = 'The file stops half-way. Export it again and send that.';
    expect(await jsonOf(await throwing(new ArtworkError('truncated', twoSentences)), 422)).toMatchObject({
      detail: 'The file stops half-way.',
      action: 'Export it again and send that.',
    });
    expect(
      await jsonOf(await throwing(new ArtworkError('truncated', 'This file stops half-way.')), 422),
    ).toMatchObject({ code: 'artwork-refused', detail: 'This file stops half-way.' });
    expect(
      await jsonOf(await throwing(new ArtworkError('too-large', 'This file has 70 MiB.')), 413),
    ).toMatchObject({ code: 'artwork-too-large' });
  });

  it('never tells what broke inside', async () => {
    const text = await (await throwing(new Error('SQLITE_CORRUPT at /var/secret'))).text();
    expect(text).toContain('broken');
    expect(text).not.toMatch(/SQLITE|secret|stack/i);
  });
});

it('a route with an allowance counts by address and by the account named', async () => {
  const forgotten = endpoint('POST /api/account/forgotten', () => DONE);
  const { perAccount } = ALLOWANCES['POST /api/account/forgotten'];
  const ask = (address: string, email: string) => call(forgotten, { body: { email }, address });
  for (let index = 0; index < perAccount; index += 1)
    expect((await ask(`192.0.2.${index}`, 'mira@shop.example')).status).toBe(200);
  expect((await ask('192.0.2.77', 'mira@shop.example')).status).toBe(429);
  expect((await ask('192.0.2.77', 'other@shop.example')).status).toBe(200);
});

it('a key that is not listed is a mistake of the program', () => {
  expect(() => endpoint('GET /api/nothing' as RouteKey, () => new Response())).toThrow(RangeError);
});
