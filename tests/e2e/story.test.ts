import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { expectAccessible, needsTool, openStage, type Stage } from './harness';

const samples = path.resolve(import.meta.dirname, '../../samples');

let stage: Stage;
beforeAll(async () => {
  stage = await openStage();
});
afterAll(async () => {
  await stage?.close();
});

const part = (page: Page, name: string): Locator => page.getByRole('region', { name, exact: true });
const press = async (scope: Page | Locator, name: string): Promise<void> =>
  scope.getByRole('button', { name, exact: true }).click();

async function choose(page: Page, scope: Locator, label: string, option: RegExp): Promise<void> {
  await scope.getByRole('button', { name: new RegExp(label) }).click();
  await page.getByRole('option', { name: option }).first().click();
}

async function fillLength(scope: Locator, label: string, value: string): Promise<void> {
  const field = scope.getByLabel(label, { exact: true });
  await field.fill(value);
  await field.press('Tab');
}

interface Story {
  file: string;
  title: string;
  widthMm: string;
  treatment: RegExp;
  stock: RegExp;
}

/** The customer's part: from the drawing to a submitted order; answers the order's number. */
async function order(page: Page, story: Story): Promise<string> {
  await page.goto('/orders/new');
  // The form comes alive a moment after it is drawn.
  await page.getByRole('button', { name: 'Choose a file' }).and(page.locator(':enabled')).waitFor();
  await page.locator('input[type=file]').setInputFiles(path.join(samples, story.file));
  await page.waitForURL(/draft=U-/);
  await part(page, 'Artwork').getByRole('img').first().waitFor();
  await fillLength(part(page, 'Size'), 'Width in mm', story.widthMm);
  await choose(page, part(page, 'Blank'), 'Made of', story.stock);
  await fillLength(part(page, 'Blank'), 'Width in mm', '200');
  await fillLength(part(page, 'Blank'), 'Height in mm', '160');
  await part(page, 'Look').getByText(story.treatment).first().click();
  await part(page, 'Look').getByText('Umber', { exact: true }).click();
  await part(page, 'The order').getByLabel('What you call it').fill(story.title);
  await page.getByText('I have the right to have it engraved').click();
  await page.getByText('Still missing:').waitFor({ state: 'hidden' });
  await page.getByText(/^Draft U-\d+ is kept/).waitFor();
  await expectAccessible(page);
  await press(page, 'Submit order');
  await page.waitForURL(/\/orders\/U-\d+\b/, { timeout: 60_000 });
  await page.getByText('Submitted').first().waitFor();
  return new URL(page.url()).pathname.split('/').at(-1) ?? '';
}

/** The designer's part: takes the order, prepares it as asked, passes it and sends the proof. */
async function prepareAndSendProof(page: Page, number: string): Promise<void> {
  await page.goto(`/queue/${number}`);
  await press(page, 'Take this order');
  await page.getByRole('button', { name: /^power and speed not yet typed/ }).click();
  const figures = page.getByRole('dialog');
  await fillLength(figures, 'Power in %', '40');
  await figures.getByLabel(/^Speed in/).fill('90');
  await page.keyboard.press('Tab');
  await page.keyboard.press('Escape');
  await page.getByRole('button', { name: /^Prepare/ }).click();
  await page.getByText('Files for the machine').waitFor({ timeout: 120_000 });
  await expectAccessible(page);
  await press(page, 'Pass the prepared file');
  await press(page.getByRole('dialog'), 'Pass the prepared file');
  await press(page, 'Send proof');
  await page
    .getByRole('dialog')
    .getByLabel(/Words to the customer/)
    .fill('Here is how it will look.');
  await press(page.getByRole('dialog'), 'Send proof');
  await page.getByText('Record an approval in person').waitFor();
}

/** The operator's part: downloads every file, ticks the list, runs it, records how it came out. */
async function run(page: Page, number: string): Promise<{ name: string; bytes: Buffer; sha256: string }[]> {
  await page.goto('/today');
  await page
    .getByRole('link', { name: new RegExp(number) })
    .first()
    .click();
  await page.waitForURL(new RegExp(`/tickets/${number}`));
  await expectAccessible(page);
  const files = [];
  for (const link of await page.getByRole('link', { name: new RegExp(`^${number}-pass`) }).all()) {
    const [download] = await Promise.all([page.waitForEvent('download'), link.click()]);
    const bytes = readFileSync(await download.path());
    files.push({
      name: download.suggestedFilename(),
      bytes,
      sha256: createHash('sha256').update(bytes).digest('hex'),
    });
  }
  await press(page, 'On the machine');
  for (const box of await page.getByRole('dialog').getByRole('checkbox').all())
    await box.check({ force: true });
  await press(page.getByRole('dialog'), 'On the machine');
  await press(page, 'Done');
  await page
    .getByRole('dialog')
    .getByLabel(/What you saw/)
    .fill('Even all over.');
  await press(page.getByRole('dialog'), 'Done');
  await page.getByText('Hand over', { exact: true }).first().waitFor();
  return files;
}

const stories: (Story & { formats: string[] })[] = [
  {
    file: 'bakery-mark.svg',
    title: 'Mark for the lids',
    widthMm: '96',
    treatment: /^Solid/,
    stock: /[Bb]irch/,
    formats: ['bmp', 'png', 'tiff'],
  },
  {
    file: 'bakery-mark.svg',
    title: 'Mark in lines',
    widthMm: '96',
    treatment: /^Linework/,
    stock: /[Cc]herry/,
    formats: ['pdf', 'svg'],
  },
  {
    file: 'alpine-photograph.jpg',
    title: 'The ridge',
    widthMm: '120',
    treatment: /^Halftone/,
    stock: /[Bb]irch/,
    formats: ['bmp', 'png', 'tiff'],
  },
];

test.each(stories)('$title goes from upload to handed over through four roles', async (story) => {
  needsTool('chromium', 'pngcheck', 'pdfinfo');
  const customer = await stage.as('customer');
  const designer = await stage.as('designer');
  const operator = await stage.as('operator');

  const number = await order(customer, story);
  await prepareAndSendProof(designer, number);

  await customer.goto(`/orders/${number}`);
  await expectAccessible(customer);
  await press(customer, 'Approve proof');
  await customer.getByText(/^Approved by/).waitFor();

  await designer.goto(`/queue/${number}`);
  await press(designer, 'Release to the machine');
  await press(designer.getByRole('dialog'), 'Release to the machine');
  await designer.getByText('Recall the ticket').waitFor();

  const files = await run(operator, number);
  expect(files.map((file) => file.name.split('.').at(-1)).sort()).toEqual(story.formats);
  for (const file of files) {
    if (file.name.endsWith('.png')) {
      // Basis: ISO/IEC 15948 as pngcheck reads it, a reader that is not ours.
      const said = execFileSync('pngcheck', ['-v'], { input: file.bytes, encoding: 'utf8' });
      expect(said).toMatch(/1-bit grayscale/);
    }
    if (file.name.endsWith('.pdf')) {
      const said = execFileSync('pdfinfo', ['-'], { input: file.bytes, encoding: 'utf8' });
      const [, width] = /Page size:\s+([\d.]+) x/.exec(said) ?? [];
      expect((Number(width) / 72) * 25.4).toBeCloseTo(Number(story.widthMm), 1);
    }
  }

  await press(operator, 'Hand over');
  await choose(operator, operator.getByRole('dialog'), 'How it leaves', /Collected/);
  await operator.getByRole('dialog').getByLabel('By whom').fill('Ines Farrow');
  await press(operator.getByRole('dialog'), 'Hand over');
  await customer.goto(`/orders/${number}`);
  await customer.getByText('Handed over').first().waitFor();
});
