import { gzipSync } from 'node:zlib';
import { openWindow, signIn } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { expect, test } from './fixtures/test';
import { Served } from './support/served';

/** Kilobytes of script, gzipped: of every page before the drawing is opened, and with it. */
const BUDGET = { pages: 250, withDrawing: 450 };

let served: Served;

test.beforeAll(async () => {
  served = await Served.start('--demo');
});
test.afterAll(() => served.stop());

test('the pages come within their budget of script, and the drawing within its own', async ({ browser }) => {
  const page = await openWindow(browser, served.url);
  const fetched = new Set<string>();
  // Workers fetch theirs through the window that began them.
  page.context().on('response', (response) => {
    if (new URL(response.url()).pathname.endsWith('.js')) fetched.add(response.url());
  });
  const kilobytes = async () => {
    const sizes = [...fetched].map(async (url) => gzipSync(await (await fetch(url)).text()).length);
    return (await Promise.all(sizes)).reduce((sum, size) => sum + size, 0) / 1000;
  };

  await signIn(page, 'ines@buoy.example', Served.demoPassword);
  await expect(page.getByRole('table', { name: 'Sheets' })).toBeVisible();
  const pages = await kilobytes();
  expect(pages).toBeGreaterThan(50);
  expect(pages).toBeLessThan(BUDGET.pages);

  await page.getByRole('link', { name: 'Hydrophone input pair' }).click();
  const sheet = await SheetPage.on(page);
  await expect(sheet.tag('Q6')).toContainText('triode');
  expect([...fetched].some((url) => url.includes('worker'))).toBe(true);
  const withDrawing = await kilobytes();
  expect(withDrawing).toBeGreaterThan(pages);
  expect(withDrawing).toBeLessThan(BUDGET.withDrawing);
});
