import { openWindow, signIn } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { expect, test } from './fixtures/test';
import { Served } from './support/served';

let served: Served;

test.beforeAll(async () => {
  served = await Served.start('--demo');
});
test.afterAll(() => served.stop());

test('a reference that nothing starts shows its zero-current point by keys, until the circuit changes', async ({
  browser,
}) => {
  const page = await openWindow(browser, served.url);
  await signIn(page, 'ines@buoy.example', Served.demoPassword);
  await page.getByRole('link', { name: 'Bias reference' }).click();
  const sheet = await SheetPage.on(page);
  await expect(sheet.tag('Q1')).toContainText('saturated');
  const first = await sheet.tagText('Q1');
  await expect(sheet.tag('Q1').getByRole('button', { name: 'several points' })).toBeVisible();

  const opener = page.getByRole('button', { name: /^point \d of 2$/ });
  const frame = page.getByRole('region', { name: 'Another operating point is shown' });
  await expect(opener).toHaveText('point 1 of 2');
  await expect(frame).toHaveCount(0);

  await test.step('the list names it as the hazard, and an arrow shows it', async () => {
    await opener.focus();
    await page.keyboard.press('Enter');
    await expect(page.getByRole('radio', { name: /no current flows.*start-up hazard.*start-up path/ })).toBeVisible();
    await expect(page.getByRole('radio', { name: 'the first point' })).toBeFocused();
    await page.keyboard.press('ArrowDown');
    await expect(sheet.tag('Q1')).toContainText('off');
    await page.keyboard.press('Escape');
    await expect(opener).toBeFocused();
  });

  await test.step('drawing, tables and words are all of that point', async () => {
    await expect(opener).toHaveText('point 2 of 2');
    await expect(frame).toContainText('point 2 of 2, not the first: all devices off, no current flows');
    await expect(page.getByRole('status').filter({ hasText: 'Showing point 2 of 2' })).toHaveCount(1);
    for (const ref of ['Q1', 'Q2', 'Q3', 'Q4', 'Q5']) {
      await expect(sheet.tag(ref)).toContainText('off');
      await expect(page.getByRole('row', { name: new RegExp(`^${ref}`) })).toContainText('off');
    }
    await expect(page.getByRole('list', { name: 'Verdicts' })).toHaveText('5 missed');
  });

  await test.step('and the first comes back when asked for', async () => {
    await page.getByRole('button', { name: 'Next operating point' }).press('Enter');
    expect(await sheet.tagText('Q1')).toBe(first);
    await expect(frame).toHaveCount(0);
  });

  await test.step('an edit goes back to the first, with the figures of the new circuit', async () => {
    await page.getByRole('button', { name: 'Previous operating point' }).press('Enter');
    await expect(frame).toBeVisible();
    await sheet.typeValue('R1', '1k5');
    await expect(frame).toHaveCount(0);
    await expect(opener).toHaveText('point 1 of 2');
    await expect(sheet.tag('Q1')).toContainText('saturated');
    expect(await sheet.tagText('Q1')).not.toBe(first);
  });
});
