import { AxeBuilder } from '@axe-core/playwright';
import { mkdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { expect, onTestFailed } from 'vitest';
import { needsTool } from '../setup/reference-tool';
import { serve } from '../setup/serve.mjs';

/** Everything a browser test needs: the built site on data of its own, and Debian's Chromium. */
export interface Stage {
  base: string;
  dataDir: string;
  /** opens a window of its own for a person, signed in when a role is named */
  as(role: string | null, options?: { width?: number; height?: number; dark?: boolean }): Promise<Page>;
  close(): Promise<void>;
}

interface DemoPerson {
  role: string;
  name: string;
  email: string;
  password: string;
}

const root = path.resolve(import.meta.dirname, '../..');
export const demoPeople = (): DemoPerson[] =>
  JSON.parse(readFileSync(path.join(root, 'db/seeds/demo-people.json'), 'utf8')) as DemoPerson[];

const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export async function openStage(): Promise<Stage> {
  const server = await serve();
  const browser: Browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    headless: true,
    args: FLAGS,
  });
  const contexts: BrowserContext[] = [];
  return {
    base: server.base,
    dataDir: server.dataDir,
    async as(role, { width = 1440, height = 900, dark = false } = {}) {
      const context = await browser.newContext({
        viewport: { width, height },
        colorScheme: dark ? 'dark' : 'light',
        reducedMotion: 'reduce',
        baseURL: server.base,
        acceptDownloads: true,
      });
      contexts.push(context);
      // Nothing is fetched from anywhere but the site itself.
      context.on('request', (request) => {
        const url = request.url();
        if (!url.startsWith(server.base) && !/^(data|blob):/.test(url))
          throw new Error(`a page asked for ${url}`);
      });
      const page = await context.newPage();
      onTestFailed(async ({ task }) => {
        const folder = path.join(root, 'screenshots');
        mkdirSync(folder, { recursive: true });
        const name = `${task.name}-${role ?? 'nobody'}`.replace(/[^A-Za-z0-9]+/g, '-').slice(0, 80);
        await page.screenshot({ path: path.join(folder, `${name}.png`), fullPage: true });
      });
      if (role) await signIn(page, role);
      return page;
    },
    async close() {
      for (const context of contexts) await context.close();
      await browser.close();
      await server.stop();
    },
  };
}

export async function signIn(page: Page, role: string): Promise<void> {
  const person = demoPeople().find((item) => item.role === role);
  if (!person) throw new Error(`no demo person is ${role}`);
  await page.goto('/sign-in');
  await signInWith(page, person);
}

/** Fills in the sign-in page that is open and waits until it has led on. */
export async function signInWith(
  page: Page,
  { email, password }: { email: string; password: string },
): Promise<void> {
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('main').getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !/^\/(sign-in|start)/.test(url.pathname));
  await page.waitForLoadState('networkidle');
}

/** Fails with the rule, the element and the reason of every violation that axe finds. */
export async function expectAccessible(page: Page): Promise<void> {
  await page.getByRole('heading', { level: 1 }).first().waitFor();
  const { violations } = await new AxeBuilder({ page }).analyze();
  const words = violations.flatMap((rule) =>
    rule.nodes.map((node) => `${rule.id}: ${node.target.join(' ')} ${node.failureSummary ?? ''}`),
  );
  expect(words, page.url()).toEqual([]);
}

/** Fails where a page is wider than its window: nobody should have to scroll sideways. */
export async function expectNoSidewaysScroll(page: Page): Promise<void> {
  const [content, window] = await page.evaluate(() => [
    document.documentElement.scrollWidth,
    document.documentElement.clientWidth,
  ]);
  expect(content, `${page.url()} at ${window} px`).toBeLessThanOrEqual(window);
}

export { needsTool };
