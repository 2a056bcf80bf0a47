import { afterAll, beforeAll, expect, test } from 'vitest';
import { carryOneOrder } from '../setup/one-order.mjs';
import {
  demoPeople,
  expectAccessible,
  expectNoSidewaysScroll,
  needsTool,
  openStage,
  type Stage,
} from './harness';

const MARK =
  '<svg xmlns="http://www.w3.org/2000/svg" width="60mm" height="30mm" viewBox="0 0 60 30"><path d="M6 24 30 4l24 20z"/><path d="M4 27h52" stroke="#000" stroke-width=".05"/></svg>';

let stage: Stage;
let number: string;

beforeAll(async () => {
  stage = await openStage();
  const artwork = {
    name: 'gable.svg',
    mediaType: 'image/svg+xml',
    widthMm: 60,
    heightMm: 30,
    bytes: Buffer.from(MARK),
  };
  const told = await carryOneOrder({ base: stage.base, people: demoPeople(), artwork, treatment: 'solid' });
  number = told.order.number;
});
afterAll(async () => {
  await stage?.close();
});

const PAGES: readonly [role: string | null, paths: readonly string[]][] = [
  [null, ['/', '/sign-in', '/register', '/forgotten', '/no-such-page']],
  ['customer', ['/orders', '/orders/new', '/orders/NUMBER', '/account']],
  ['designer', ['/queue', '/queue/NUMBER']],
  ['operator', ['/today', '/tickets', '/tickets/NUMBER', '/outcomes']],
  ['admin', ['/machines', '/stocks', '/people', '/record']],
];
const LOOKS = [
  { width: 360, height: 740, dark: true },
  { width: 768, height: 1024, dark: false },
  { width: 1440, height: 900, dark: false },
] as const;

test.each(LOOKS)('every page fits and is accessible at $width px', async (look) => {
  needsTool('chromium');
  for (const [role, paths] of PAGES) {
    const page = await stage.as(role, look);
    const said: string[] = [];
    page.on('pageerror', (error) => said.push(error.message));
    page.on('console', (message) => {
      if (message.type() === 'error' && !message.text().includes('404')) said.push(message.text());
    });
    for (const path of paths) {
      await page.goto(path.replace('NUMBER', number), { waitUntil: 'load' });
      await page.getByRole('heading', { level: 1 }).waitFor();
      // Islands replace their waiting state once their data has come.
      await page.locator('[aria-busy=true]').waitFor({ state: 'detached' });
      await expectAccessible(page);
      await expectNoSidewaysScroll(page);
    }
    expect(said, `${role} at ${look.width} px`).toEqual([]);
    await page.context().close();
  }
});
