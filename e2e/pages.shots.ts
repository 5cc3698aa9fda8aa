import { type Browser, expect, test } from '@playwright/test';
import { STARTERS } from '#shared/starters/starters';
import { signIn } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { Served } from './support/served';

const FOLDER = 'test-results/pictures';
const THEMES = ['light', 'dark'] as const;
const WIDTHS = [1440, 1024, 390] as const;

let served: Served;
test.beforeAll(async () => {
  served = await Served.start('--demo');
});
test.afterAll(() => served.stop());

async function ownersWindow(browser: Browser, theme: 'light' | 'dark', width: number) {
  const context = await browser.newContext({
    baseURL: served.url,
    colorScheme: theme,
    reducedMotion: 'reduce',
    viewport: { width, height: width < 500 ? 844 : 900 },
  });
  const page = await context.newPage();
  await signIn(page, 'ines@buoy.example', Served.demoPassword);
  return page;
}

for (const theme of THEMES) {
  for (const width of WIDTHS) {
    test(`pages of the demo and every starter, ${theme}, ${width} px`, async ({ browser }) => {
      test.setTimeout(240_000);
      const page = await ownersWindow(browser, theme, width);
      const shoot = async (name: string) => page.screenshot({ path: `${FOLDER}/${name}-${theme}-${width}.png` });
      await expect(page.getByRole('table')).toBeVisible();
      await shoot('sheets');
      const { teams } = await (await page.request.get('/api/me')).json();
      const listed = await (await page.request.get(`/api/teams/${teams[0].id}/sheets`)).json();
      const sheets: { id: string; name: string }[] = listed.sheets;
      for (const { id, name } of STARTERS) {
        const made = await page.request.post(`/api/teams/${teams[0].id}/sheets`, {
          data: { name, starter: id },
          headers: { Origin: served.url },
        });
        sheets.push((await made.json()).sheet);
      }
      for (const { id, name } of sheets) {
        await page.goto(`/sheets/${id}`);
        const sheet = await SheetPage.on(page);
        await sheet.expectSaved();
        await expect(page.getByRole('figure').first()).toHaveAttribute('aria-busy', 'false');
        await shoot(name.toLowerCase().replace(/\W+/g, '-'));
      }
      await page.goto('/team');
      await expect(page.getByRole('table').first()).toBeVisible();
      await shoot('team');
      await page.context().close();
    });
  }
}

test('the picture of the README', async ({ browser }) => {
  const page = await ownersWindow(browser, 'light', 1440);
  await page.getByRole('link', { name: 'Hydrophone input pair' }).click();
  const sheet = await SheetPage.on(page);
  await expect(sheet.tag('Q6')).toHaveAttribute('aria-busy', 'false');
  await page.screenshot({ path: 'e2e/pictures/sheet.png' });
});
