import { request } from 'node:http';
import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ApiClient } from '../setup/api-client.mjs';
import { serve } from '../setup/serve.mjs';

interface DemoPerson {
  role: string;
  email: string;
  password: string;
}
interface Answer {
  status: number;
  headers: Record<string, string | string[] | undefined>;
  text: string;
}

const people = JSON.parse(readFileSync('db/seeds/demo-people.json', 'utf8')) as DemoPerson[];
let site: Awaited<ReturnType<typeof serve>>;
let number: string;
const cookies: Record<string, string> = { nobody: '' };

/** Sends a path exactly as written: fetch would tidy it up first. */
function send(
  path: string,
  options: { as?: string; method?: string; headers?: Record<string, string>; body?: string } = {},
): Promise<Answer> {
  const { as = 'nobody', method = 'GET', headers = {}, body } = options;
  return new Promise((resolve, reject) => {
    const sent = request(
      {
        host: '127.0.0.1',
        port: new URL(site.base).port,
        path,
        method,
        headers: { host: new URL(site.base).host, cookie: cookies[as], ...headers },
      },
      (response) => {
        let text = '';
        response.setEncoding('utf8').on('data', (part) => (text += part));
        response.on('end', () =>
          resolve({ status: response.statusCode ?? 0, headers: response.headers, text }),
        );
      },
    );
    sent.on('error', reject).end(body);
  });
}

async function signIn(name: string, email: string, password: string): Promise<ApiClient> {
  const client = new ApiClient(site.base);
  await client.signIn(email, password);
  const { headers } = await signInByHand(email, password);
  const session =
    [headers['set-cookie']].flat().find((cookie) => cookie?.startsWith('authjs.session-token')) ?? '';
  cookies[name] = session.split(';')[0];
  return client;
}

async function signInByHand(email: string, password: string, address = '127.0.0.1'): Promise<Answer> {
  const csrf = await send('/api/auth/csrf');
  const cookie = [csrf.headers['set-cookie']]
    .flat()
    .map((line) => line?.split(';')[0])
    .join('; ');
  const body = new URLSearchParams({
    csrfToken: JSON.parse(csrf.text).csrfToken,
    email,
    password,
    callbackUrl: site.base,
  }).toString();
  const headers = {
    cookie,
    origin: site.base,
    'content-type': 'application/x-www-form-urlencoded',
    'x-auth-return-redirect': '1',
    'x-forwarded-for': address,
  };
  return send('/api/auth/callback/credentials', { method: 'POST', headers, body });
}

beforeAll(async () => {
  site = await serve();
  for (const { role, email, password } of people) await signIn(role, email, password);
  const customer = new ApiClient(site.base);
  const own = people.find(({ role }) => role === 'customer') as DemoPerson;
  await customer.signIn(own.email, own.password);
  number = (await customer.send('POST', '/api/orders', { title: 'Not for other eyes' })).order.number;
  const other = { name: 'Olaf Neighbour', email: 'olaf@neighbour.example', password: 'nothing-of-mine' };
  await new ApiClient(site.base).send('POST', '/api/account/register', other);
  await signIn('other', other.email, other.password);
});
afterAll(() => site.stop());

/** Every way to write an address that might slip past a look at its first letters. */
const forms = (path: string): string[] => {
  const [, first, ...rest] = path.split('/');
  const end = rest.length > 0 ? `/${rest.join('/')}` : '';
  const encoded = `%${first.charCodeAt(0).toString(16)}${first.slice(1)}`;
  return [
    path,
    `/${path}`,
    `//${path}`,
    path.replaceAll('/', '//'),
    `${path}/`,
    `${path}//`,
    `/.${path}`,
    `/x/..${path}`,
    `/${encoded}${end}`,
    `/${encoded.replace('%', '%25')}${end}`,
    `/${first.toUpperCase()}${end}`,
    path.slice(0, 1) + path.slice(1).replaceAll('/', '%2f'),
    path.slice(0, 1) + path.slice(1).replaceAll('/', '%5c'),
    `${path}?x=1`,
    `${path};x=1`,
    `${path}%00`,
    `${path}.json`,
    `${path}#x`,
  ];
};

describe('another customer’s order', () => {
  const parts = [
    '',
    '/progress',
    '/artwork/1/original',
    '/artwork/1/picture',
    '/preparations/1',
    '/preparations/1/pictures/burned',
  ];

  it.each(parts)('is hidden in every form of /api/orders/:number%s', async (part) => {
    for (const form of forms(`/api/orders/${number}${part}`)) {
      const theirs = await send(form, { as: 'other' });
      // 301: slashes too many at the end are taken off first, and the address that is left is in this list.
      expect([301, 400, 404], form).toContain(theirs.status);
      expect(theirs.text, form).not.toContain('Not for other eyes');
      expect([301, 400, 401, 404], form).toContain((await send(form)).status);
    }
  });

  it('is hidden in every form of its page', async () => {
    expect((await send(`/orders/${number}`, { as: 'customer' })).text).toContain(number);
    for (const form of forms(`/orders/${number}`)) {
      const page = await send(form, { as: 'other' });
      expect(page.status, form).not.toBe(200);
      expect(page.text, form).not.toContain('Not for other eyes');
    }
  });
});

describe('what belongs to the staff', () => {
  it.each([
    '/api/people',
    '/api/machines',
    '/api/record',
    '/people',
    '/machines',
    '/stocks',
    '/record',
    '/queue',
    '/today',
  ])('is closed to a customer in every form of %s', async (path) => {
    for (const form of forms(path)) {
      for (const as of ['customer', 'nobody']) {
        const answer = await send(form, { as });
        expect(answer.status, `${as} at ${form}`).not.toBe(200);
        expect(answer.text).not.toMatch(/keys-of-the-shop|Runa Vester/);
      }
    }
    expect((await send(path, { as: 'admin' })).status).toBe(200);
  });
});

describe('a change', () => {
  const body = JSON.stringify({ name: 'Changed from elsewhere' });
  const json = { 'content-type': 'application/json' };
  const change = (headers: Record<string, string>) =>
    send('/api/account', { as: 'customer', method: 'PATCH', headers, body });

  it('is taken from our own pages', async () => {
    expect((await change({ ...json, origin: site.base, 'sec-fetch-site': 'same-origin' })).status).toBe(200);
  });

  it.each([
    ['another site', { ...json, origin: 'https://elsewhere.example' }],
    ['a hidden origin', { ...json, origin: 'null' }],
    ['another site without an origin', { ...json, 'sec-fetch-site': 'cross-site' }],
    ['a form of another site', { 'content-type': 'text/plain', origin: 'https://elsewhere.example' }],
    ['a form that says it is ours', { 'content-type': 'text/plain', origin: 'http://localhost:1' }],
  ])('is refused from %s', async (_, headers) => {
    expect((await change(headers)).status).toBe(403);
  });

  it('of a form is taken from our own pages: signing in works on this port', async () => {
    const { email, password } = people[0];
    expect(JSON.parse((await signInByHand(email, password)).text).url).toBe(site.base);
  });
});

it('the header that names another address is not believed', async () => {
  const urls: string[] = [];
  for (let index = 0; index < 11; index += 1) {
    urls.push(
      JSON.parse((await signInByHand('victim@shop.example', 'wrong-password', `203.0.113.${index}`)).text)
        .url,
    );
  }
  expect(urls.at(-1)).toContain('code=too-many');
});

describe('every answer', () => {
  it.each(['/', '/sign-in', '/health', '/api/account', '/api/openapi.json', '/nowhere'])(
    'of %s carries the security headers',
    async (path) => {
      const { headers } = await send(path);
      expect(headers).toMatchObject({
        'x-content-type-options': 'nosniff',
        'referrer-policy': 'same-origin',
      });
      const policy = String(headers['content-security-policy']);
      expect(policy).toContain("default-src 'none'");
      expect(policy).not.toMatch(/script-src[^;]*unsafe/);
      expect(headers['x-powered-by']).toBeUndefined();
    },
  );
});
