import AxeBuilder from '@axe-core/playwright';
import { openWindow, signIn } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { expect, type Locator, type Page, test } from './fixtures/test';
import { Served } from './support/served';

// Two people at once, each in a browser window of their own.
test.describe.configure({ timeout: 120_000 });

let served: Served;

test.beforeAll(async () => {
  served = await Served.start('--demo');
});
test.afterAll(() => served.stop());

const enter = async (...[browser, who]: [Parameters<typeof openWindow>[0], string]) => {
  const page = await openWindow(browser, served.url);
  await signIn(page, `${who}@buoy.example`, Served.demoPassword);
  return page;
};
const list = (page: Page, name = 'Sheets'): Locator => page.getByRole('table', { name, exact: true });
const row = (page: Page, name: string): Locator =>
  page.getByRole('row').filter({ has: page.getByRole('link', { name, exact: true }) });
const names = (page: Page) => list(page).getByRole('link').allTextContents();
const choose = async (page: Page, sheet: string, item: string) => {
  await page.getByRole('button', { name: `What to do with ${sheet}`, exact: true }).click();
  await page.getByRole('menuitem', { name: item }).click();
};

test('the demo’s list names the worst device of every sheet and orders them by any column', async ({ browser }) => {
  const page = await enter(browser, 'runa');
  await expect(row(page, 'Hydrophone input pair')).toContainText('Q6 missed by 114 mV');
  await expect(row(page, 'Hydrophone input pair')).toContainText('-63.6');
  await expect(row(page, 'Second stage, cascode')).toContainText('Q1 missed');
  await expect(row(page, 'Cable driver, 12 V')).toContainText('met with');
  await expect(row(page, 'First stage')).toContainText('begun by Samir Kade');
  expect(await names(page)).toEqual([
    'Hydrophone input pair',
    'Second stage, cascode',
    'Bias reference',
    'First stage',
    'Cable driver, 12 V',
  ]);

  const sort = (column: string) => list(page).getByRole('button', { name: column, exact: true }).click();
  await sort('name');
  expect(await names(page)).toEqual([
    'Bias reference',
    'Cable driver, 12 V',
    'First stage',
    'Hydrophone input pair',
    'Second stage, cascode',
  ]);
  await sort('FETs');
  expect((await names(page)).slice(0, 2)).toEqual(['Hydrophone input pair', 'Bias reference']);
  await sort('FETs');
  expect((await names(page))[0]).toBe('First stage');
  await expect(page.getByRole('columnheader', { name: 'FETs' })).toHaveAttribute('aria-sort', 'ascending');
  await sort('worst device');
  expect((await names(page)).slice(0, 2)).toEqual(['Hydrophone input pair', 'Second stage, cascode']);
  await sort('margin / mV');
  await sort('margin / mV');
  expect((await names(page))[0]).toBe('Cable driver, 12 V');
});

test('what is sought is found among all sheets, and nothing found says so', async ({ browser }) => {
  const page = await enter(browser, 'ines');
  const field = page.getByRole('searchbox', { name: 'Find a sheet' });
  await field.fill('stage samir');
  await expect.poll(() => names(page)).toEqual(['Second stage, cascode', 'First stage']);
  await field.fill('hydrofoil');
  await expect(page.getByText('Nothing found for “hydrofoil”')).toBeVisible();
  await page.getByRole('button', { name: 'Show all sheets' }).click();
  await expect.poll(async () => (await names(page)).length).toBeGreaterThanOrEqual(5);
});

test('a designer copies and renames a sheet by keys, an owner puts it away and brings it back', async ({ browser }) => {
  const samir = await enter(browser, 'samir');
  await choose(samir, 'First stage', 'Make a copy');
  await expect(samir.getByRole('status').filter({ hasText: '“First stage, copy” is in the list.' })).toBeVisible();
  await expect(row(samir, 'First stage, copy')).toContainText('met with');
  await samir.getByRole('button', { name: 'What to do with First stage, copy' }).focus();
  await samir.keyboard.press('Enter');
  await expect(samir.getByRole('menuitem', { name: 'Archive' })).toHaveCount(0);
  await samir.keyboard.press('Enter');
  await expect(samir.getByLabel('New name')).toBeFocused();
  await samir.keyboard.type(' ');
  await samir.keyboard.press('Enter');
  await expect(samir.getByText('Give a name.')).toBeVisible();
  await samir.keyboard.type('First stage, trial of 2 µm');
  await samir.keyboard.press('Enter');
  await expect(samir.getByRole('button', { name: 'What to do with First stage, trial of 2 µm' })).toBeFocused();

  const ines = await enter(browser, 'ines');
  await choose(ines, 'First stage, trial of 2 µm', 'Archive');
  await expect(list(samir).getByRole('link', { name: 'trial of 2 µm' })).toHaveCount(0);
  await ines.getByText('1 archived').click();
  await expect(list(ines, 'Archived sheets').getByRole('link')).toHaveText(['First stage, trial of 2 µm']);
  await choose(ines, 'First stage, trial of 2 µm', 'Bring back');
  await expect(row(samir, 'First stage, trial of 2 µm')).toBeVisible();
});

test('the list follows who opens a sheet and what becomes of it, without being loaded again', async ({ browser }) => {
  const onlooker = await enter(browser, 'runa');
  const samir = await enter(browser, 'samir');
  const here = row(onlooker, 'Second stage, cascode').getByRole('list');
  await expect(here).toHaveCount(0);
  await samir.getByRole('link', { name: 'Second stage, cascode' }).click();
  const sheet = await SheetPage.on(samir);
  await expect(here).toContainText('Samir Kade');
  await sheet.typeValue('R1', '75k');
  await expect(row(onlooker, 'Second stage, cascode')).toContainText('Q1 met with');
  await sheet.typeValue('R1', '120k');
  await expect(row(onlooker, 'Second stage, cascode')).toContainText('Q1 missed by');
  await samir.close();
  await expect(here).toHaveCount(0);
});

test('pages that cannot be shown say why and lead on', async ({ browser }) => {
  // A window of its own kind: here the browser is to report failed answers as errors.
  const page = await (await browser.newContext({ baseURL: served.url })).newPage();
  await signIn(page, 'runa@buoy.example', Served.demoPassword);
  await page.goto('/nowhere');
  await expect(page.getByRole('heading', { name: 'There is nothing here' })).toBeVisible();
  await page.route('**/api/sheets/*', (route) => route.fulfill({ status: 503, json: {} }));
  await page.goto('/sheets/unreachable');
  // After the first and both further attempts.
  const failed = page.getByRole('heading', { name: 'The sheet could not be opened' });
  await expect(failed).toBeVisible({ timeout: 30_000 });
  await page.unroute('**/api/sheets/*');
  await page.getByRole('button', { name: 'Try again' }).click();
  await expect(page.getByRole('heading', { name: 'No such sheet' })).toBeVisible();
  await page.getByRole('link', { name: 'To your sheets' }).click();
  await expect(list(page)).toBeVisible();
});

test('an open sheet outlasts an answer that fails, but not a person’s place in the team', async ({ browser }) => {
  const runa = await (await browser.newContext({ baseURL: served.url })).newPage();
  await signIn(runa, 'runa@buoy.example', Served.demoPassword);
  await runa.getByRole('link', { name: 'Bias reference' }).click();
  const sheet = await SheetPage.on(runa);
  let asked = 0;
  await runa.route('**/api/sheets/*', (route) => {
    asked += 1;
    return route.fulfill({ status: 503, json: {} });
  });
  const ines = await enter(browser, 'ines');
  await choose(ines, 'Bias reference', 'Rename');
  await ines.getByLabel('New name').fill('Bias reference, 85 µA');
  await ines.keyboard.press('Enter');
  // The first and both further attempts.
  await expect.poll(() => asked, { timeout: 30_000 }).toBe(3);
  await expect(sheet.drawing).toBeVisible();
  await runa.unroute('**/api/sheets/*');

  await ines.goto('/team');
  await ines.getByRole('button', { name: 'Remove Runa Leclerc' }).click();
  await ines
    .getByRole('dialog')
    .getByRole('button', { name: /^Remove/ })
    .click();
  await expect(runa.getByRole('heading', { name: 'You may no longer open this sheet' })).toBeVisible();
  await runa.getByRole('link', { name: 'To your sheets' }).click();
  await expect(runa).toHaveURL(`${served.url}/`);
});

for (const colorScheme of ['light', 'dark'] as const) {
  test(`the list has no fault that axe can find, wide and narrow, in the ${colorScheme} theme`, async ({ browser }) => {
    const page = await enter(browser, 'ines');
    await page.emulateMedia({ colorScheme });
    for (const width of [1440, 390]) {
      await page.setViewportSize({ width, height: 900 });
      await expect(row(page, 'Hydrophone input pair')).toBeVisible();
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
    }
  });
}
