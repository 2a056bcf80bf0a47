import type { Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { carryOneOrder } from '../setup/one-order.mjs';
import { demoPeople, needsTool, openStage, signInWith, type Stage } from './harness';

const MARK =
  '<svg xmlns="http://www.w3.org/2000/svg" width="40mm" height="40mm" viewBox="0 0 40 40"><circle cx="20" cy="20" r="14" fill="none" stroke="#000" stroke-width="3"/></svg>';

let stage: Stage;
/** an order of the first customer, with files */
let number: string;
let fileUrl: string;
let pictureUrl: string;

beforeAll(async () => {
  stage = await openStage();
  const artwork = {
    name: 'ring.svg',
    mediaType: 'image/svg+xml',
    widthMm: 40,
    heightMm: 40,
    bytes: Buffer.from(MARK),
  };
  const told = await carryOneOrder({ base: stage.base, people: demoPeople(), artwork, treatment: 'solid' });
  number = told.order.number;
  fileUrl = told.preparation.files[0].url;
  pictureUrl = told.preparation.pictures.burned;
});
afterAll(async () => {
  await stage?.close();
});

const status = (page: Page, url: string): Promise<number> =>
  page.evaluate(async (address) => (await fetch(address)).status, url);

const post = (page: Page, url: string, body: unknown): Promise<number> =>
  page.evaluate(
    async ([address, text]) =>
      (await fetch(address, { method: 'POST', headers: { 'content-type': 'application/json' }, body: text }))
        .status,
    [url, JSON.stringify(body)] as const,
  );

/** What a page of the site answers: its status, wherever it led. */
async function visit(page: Page, path: string): Promise<{ status: number; path: string }> {
  const response = await page.goto(path);
  return { status: response?.status() ?? 0, path: new URL(page.url()).pathname };
}

test('a stranger sees the front page, and nothing of anyone', async () => {
  needsTool('chromium');
  const page = await stage.as(null);
  expect((await visit(page, '/')).status).toBe(200);
  for (const path of ['/orders', '/queue', '/today', '/people', `/orders/${number}`]) {
    expect((await visit(page, path)).path, path).toBe('/sign-in');
  }
  for (const url of [`/api/orders/${number}`, fileUrl, pictureUrl, `/api/orders/${number}/progress`]) {
    expect(await status(page, url), url).toBe(401);
  }
});

test('a customer cannot see another customer’s order by any address, nor any staff page', async () => {
  needsTool('chromium');
  const page = await stage.as(null);
  await page.goto('/register');
  await page.getByLabel('Name').fill('Mira Ostrand');
  await page.getByLabel('E-mail').fill('mira@ostrand.example');
  await page.getByLabel('Password').fill('rings-and-years');
  await page.getByRole('button', { name: 'Open account' }).click();
  await page.waitForURL(/\/sign-in/);
  await signInWith(page, { email: 'mira@ostrand.example', password: 'rings-and-years' });
  for (const url of [
    `/api/orders/${number}`,
    `/api/orders/${number}/progress`,
    pictureUrl,
    `/api/orders/${number}/artwork/1/original`,
  ]) {
    expect(await status(page, url), url).toBe(404);
  }
  expect((await visit(page, `/orders/${number}`)).status).toBe(404);
  // A page that can be read, with the site's own look and ways on.
  await page.getByRole('heading', { level: 1 }).waitFor();
  expect(await status(page, fileUrl)).toBe(403);
  for (const path of ['/queue', '/today', '/tickets', '/machines', '/people', '/record']) {
    expect((await visit(page, path)).status, path).not.toBe(200);
  }
});

test('a designer cannot release what has not been approved, nor change people or machines', async () => {
  needsTool('chromium');
  const page = await stage.as('designer');
  const { orders } = await page.evaluate(async () => ({
    orders: (await (await fetch('/api/orders?perPage=100')).json()).rows,
  }));
  for (const row of orders as { number: string; state: string }[]) {
    if (row.state === 'approved') continue;
    const { order } = await page.evaluate(
      async (url) => (await fetch(url)).json(),
      `/api/orders/${row.number}`,
    );
    expect(
      await post(page, `/api/orders/${row.number}/events`, { event: 'release', version: order.version }),
      row.state,
    ).toBe(409);
  }
  expect(await post(page, '/api/people/invitations', { email: 'more@staff.example', role: 'admin' })).toBe(
    403,
  );
  expect((await visit(page, '/people')).status).not.toBe(200);
});

test('an operator cannot prepare, pass or change what is to be run', async () => {
  needsTool('chromium');
  const page = await stage.as('operator');
  expect(await post(page, `/api/orders/${number}/preparations`, { version: 1 })).toBe(403);
  const { order } = await page.evaluate(async (url) => (await fetch(url)).json(), `/api/orders/${number}`);
  expect(
    await post(page, `/api/orders/${number}/events`, {
      event: 'pass',
      version: order.version,
      preparationId: 1,
    }),
  ).toBe(409);
  expect((await visit(page, `/queue/${number}`)).status).not.toBe(200);
});

test('the last admin can neither step down nor be disabled', async () => {
  needsTool('chromium');
  const page = await stage.as('admin');
  const { person } = await page.evaluate(async () => (await fetch('/api/account')).json());
  const change = (body: unknown): Promise<number> =>
    page.evaluate(
      async ([id, text]) =>
        (
          await fetch(`/api/people/${id}`, {
            method: 'PATCH',
            headers: { 'content-type': 'application/json' },
            body: text,
          })
        ).status,
      [person.id, JSON.stringify(body)] as const,
    );
  expect(await change({ role: 'designer' })).toBe(409);
  expect(await change({ disabled: true })).toBe(409);
});
