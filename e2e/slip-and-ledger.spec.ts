import { AxeBuilder } from '@axe-core/playwright';
import { formatValue } from '#shared/units/format-value';
import { openWindow, signIn } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { expect, type Page, test } from './fixtures/test';
import { Served } from './support/served';

let served: Served;

test.beforeAll(async () => {
  served = await Served.start('--demo');
});
test.afterAll(() => served.stop());

async function openPair(page: Page, email: string): Promise<SheetPage> {
  await signIn(page, email, Served.demoPassword);
  await page.getByRole('link', { name: 'Hydrophone input pair' }).first().click();
  // The first window to open a sheet loads the drawing's script too.
  await page.getByLabel('Drawing', { exact: true }).waitFor({ timeout: 30_000 });
  const sheet = await SheetPage.on(page);
  await expect(sheet.tag('Q6')).toHaveAttribute('aria-busy', 'false');
  return sheet;
}

/** How many of the chart's pixels have the colour of a token. */
function pixelsOf(page: Page, token: string): Promise<number> {
  return page.evaluate((name) => {
    const probe = document.body.appendChild(document.createElement('i'));
    probe.style.color = `var(--${name})`;
    const wanted = getComputedStyle(probe).color.match(/\d+/g)?.slice(0, 3).map(Number) ?? [];
    probe.remove();
    const canvas = document.querySelector<HTMLCanvasElement>('.uplot canvas');
    const pixels = canvas?.getContext('2d')?.getImageData(0, 0, canvas.width, canvas.height).data ?? [];
    let count = 0;
    for (let at = 0; at < pixels.length; at += 4) {
      if (pixels[at + 3] === 255 && wanted.every((level, channel) => level === pixels[at + channel])) count++;
    }
    return count;
  }, token);
}

test('the slip draws the device’s own curve with the load it sees, gives its numbers, and tells who is at a value', async ({
  browser,
}) => {
  test.setTimeout(180_000);
  const ines = await openWindow(browser, served.url);
  const sheet = await openPair(ines, 'ines@buoy.example');
  await sheet.part('Q6').focus();
  await ines.keyboard.press('Enter');
  const slip = ines.getByLabel('Q6: values');
  const chart = slip.getByRole('img', { name: /^ID against VDS/ });
  await expect(chart).toHaveAccessibleName(/The circuit offers/);

  await test.step('the curve is painted in the colours of its regions, the load in ink', async () => {
    for (const token of ['triode', 'saturated', 'ink']) {
      await expect.poll(() => pixelsOf(ines, token), `pixels of ${token}`).toBeGreaterThan(40);
    }
    await ines.emulateMedia({ colorScheme: 'dark' });
    for (const token of ['triode', 'saturated', 'ink']) {
      await expect.poll(() => pixelsOf(ines, token), `pixels of ${token} in the dark`).toBeGreaterThan(40);
    }
    await ines.emulateMedia({ colorScheme: 'light' });
  });

  await test.step('an edit moves the point along, and the tag’s figure is the chart’s', async () => {
    await slip.getByLabel('W', { exact: true }).fill('5u');
    await ines.keyboard.press('Enter');
    await expect(slip).toContainText('triode');
    await expect(chart).toHaveAccessibleName(/stands at VDS .* The circuit offers/);
  });

  await test.step('a key turns the chart into its numbers, where device and load are equal at the point', async () => {
    await slip.focus();
    await ines.keyboard.press('t');
    const cells = slip.getByRole('row', { name: /point/ }).getByRole('cell');
    const device = await cells.nth(1).textContent();
    expect(device?.trim()).toMatch(/^[\d.]+$/);
    await expect(cells.nth(2)).toHaveText(device ?? '', { useInnerText: false });
    const id = Number(device) * 1e-6;
    await expect(slip.locator('header')).toContainText(formatValue(id, 'A'));
    const axe = await new AxeBuilder({ page: ines }).include('[aria-label="Q6: values"]').analyze();
    expect(axe.violations).toEqual([]);
    await ines.keyboard.press('t');
    await expect(chart).toBeVisible();
  });

  await test.step('someone else sees who is at which value', async () => {
    const { teams } = await (await ines.request.get('/api/me')).json();
    const members = await (await ines.request.get(`/api/teams/${teams[0].id}/members`)).json();
    const other = members.members.find(
      ({ email, role }: { email: string; role: string }) => email !== 'ines@buoy.example' && role === 'designer',
    );
    const guest = await openWindow(browser, served.url);
    const theirs = await openPair(guest, other.email);
    await theirs.part('Q6').focus();
    await guest.keyboard.press('Enter');
    await guest.getByLabel('Q6: values').getByLabel('L', { exact: true }).focus();
    await expect(slip.locator('[data-value="length"]')).toContainText(`${other.name} is at this value`);
    await guest.context().close();
    await expect(slip.locator('[data-value="length"]')).not.toContainText('is at this value');
    await slip.getByLabel('W', { exact: true }).fill('20u');
    await ines.keyboard.press('Enter');
    await expect(slip).toContainText('saturated');
  });
});

test('from the ledger a part is found, opened, and edited together with others, by keys alone', async ({ browser }) => {
  test.setTimeout(180_000);
  const page = await openWindow(browser, served.url);
  await openPair(page, 'ines@buoy.example');
  const fets = page.getByRole('table', { name: 'FETs' });
  const name = (ref: string) => fets.getByRole('button', { name: ref, exact: true });
  await fets.getByRole('button', { name: 'ref', exact: true }).click();
  await expect(fets.getByRole('columnheader', { name: 'ref', exact: true })).toHaveAttribute('aria-sort', 'ascending');

  await name('Q1').focus();
  await page.keyboard.press('End');
  await expect(name('Q6')).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(page.getByLabel('Q6: values')).toBeVisible();
  await page.keyboard.press('Escape');

  await name('Q3').focus();
  await page.keyboard.press('Shift+ArrowDown');
  await expect(fets.locator('tr[aria-current="true"]')).toHaveCount(2);
  await page.getByRole('button', { name: 'edit 2 selected' }).press('Enter');
  await expect(page.getByLabel('2 parts: values')).toBeVisible();
  await page.keyboard.press('Escape');

  await expect(page.getByTitle(/the sum of the currents that the voltage sources deliver/)).toContainText('µA');
  const axe = await new AxeBuilder({ page }).include('[aria-label="Ledger"]').analyze();
  expect(axe.violations).toEqual([]);
});

test('on a phone the ledger scrolls sideways by itself and keeps the names in sight', async ({ browser }) => {
  const page = await openWindow(browser, served.url);
  await page.setViewportSize({ width: 390, height: 844 });
  await openPair(page, 'ines@buoy.example');
  const name = page.getByRole('table', { name: 'FETs' }).getByRole('rowheader', { name: 'Q6' });
  const before = await name.boundingBox();
  await page.getByRole('columnheader', { name: 'verdict' }).scrollIntoViewIfNeeded();
  await expect(page.getByRole('columnheader', { name: 'verdict' })).toBeInViewport();
  expect((await name.boundingBox())?.x).toBe(before?.x);
});
