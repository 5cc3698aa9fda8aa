import { openWindow, signUp } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { expect, type Page, test } from './fixtures/test';
import { Served } from './support/served';

test.describe.configure({ timeout: 240_000 });

let served: Served;

test.beforeAll(async () => {
  served = await Served.start();
});
test.afterAll(() => served.stop());

/** Most stops on the way to what is wanted; the pages have far fewer. */
const MOST_STOPS = 80;

async function tabTo(page: Page, wanted: string): Promise<void> {
  for (let stop = 0; stop < MOST_STOPS; stop++) {
    if ((await page.locator(`${wanted}:focus`).count()) > 0) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`Tab does not lead to ${wanted}`);
}

async function times(page: Page, key: string, count: number): Promise<void> {
  for (let n = 0; n < count; n++) await page.keyboard.press(key);
}

test('without a mouse a sheet is begun, a biased stage drawn, sized, read and corrected', async ({ browser }) => {
  const page = await openWindow(browser, served.url);
  await signUp(page, '/sign-up', { name: 'Ines Roth', email: 'ines@buoy.example' });
  const { keyboard } = page;

  await test.step('a blank sheet', async () => {
    await tabTo(page, 'button:has-text("Blank sheet")');
    await keyboard.press('Enter');
    await expect(page.getByRole('dialog').getByLabel('Name')).toBeFocused();
    await keyboard.press('ControlOrMeta+a');
    await keyboard.type('By keys alone');
    await keyboard.press('Enter');
    await page.waitForURL(/\/sheets\//);
  });
  const sheet = await SheetPage.on(page);
  await tabTo(page, '[aria-label="Drawing"]');

  /** Takes a part by its letter, goes with it from where the one before was put, and sets it down. */
  const place = async (letter: string, ...moves: readonly (readonly [key: string, count: number])[]) => {
    await keyboard.press(letter);
    for (const [key, count] of moves) await times(page, key, count);
    await keyboard.press('Enter');
    await keyboard.press('Escape');
  };
  // Each begins 100 px to the right of the part selected last; Shift makes steps of 50 px.
  await test.step('a divider, a load, a FET and its source', async () => {
    await place('v', ['Shift+ArrowLeft', 6]);
    await place('r', ['Shift+ArrowUp', 3]);
    await place('r', ['Shift+ArrowLeft', 2], ['Shift+ArrowDown', 4]);
    await place('r', ['Shift+ArrowRight', 2], ['Shift+ArrowUp', 4]);
    await place('n', ['Shift+ArrowLeft', 2], ['Shift+ArrowDown', 3]);
    await expect(sheet.part('Q1')).toBeFocused();
  });

  const tie = async (from: readonly [ref: string, stops: number], to: string) => {
    const [ref, stops] = from;
    await goTo(ref);
    await times(page, '.', stops);
    await keyboard.press('Enter');
    for (let step = 0; step < 20 && (await page.locator(`[data-terminal="${to}"]:focus`).count()) === 0; step++) {
      await keyboard.press('.');
    }
    await keyboard.press('Enter');
  };
  const goTo = async (ref: string) => {
    await keyboard.press('Escape');
    await keyboard.press('f');
    await keyboard.type(ref);
    await keyboard.press('Enter');
    await expect(sheet.part(ref)).toBeFocused();
  };
  await test.step('ties terminal to terminal', async () => {
    await tie(['V1', 1], 'R1.a');
    await tie(['R1', 1], 'R3.a');
    await tie(['R1', 2], 'R2.a');
    await tie(['R2', 1], 'Q1.gate');
    await tie(['R3', 2], 'Q1.drain');
    await tie(['V1', 2], 'R2.b');
    await tie(['R2', 2], 'Q1.source');
    await expect(page.locator('.react-flow__edge')).toHaveCount(7);
  });

  await test.step('grounds it and says what each value is', async () => {
    await goTo('V1');
    await place('g', ['Shift+ArrowLeft', 2], ['Shift+ArrowDown', 2]);
    await keyboard.press('.');
    await keyboard.press('Enter');
    for (let step = 0; step < 24 && (await page.locator('[data-terminal="V1.minus"]:focus').count()) === 0; step++) {
      await keyboard.press('.');
    }
    await keyboard.press('Enter');
    for (const [ref, value] of [
      ['R1', '120k'],
      ['R2', '60k'],
      ['R3', '22k'],
    ] as const) {
      await goTo(ref);
      await keyboard.press('Enter');
      await keyboard.type(value);
      await keyboard.press('Enter');
      await keyboard.press('Escape');
    }
    await expect(sheet.tag('Q1')).toContainText(/off|triode|saturated/);
  });

  await test.step('turns, moves, copies, selects and takes back', async () => {
    await goTo('R3');
    const place = await sheet.middle('R3');
    await keyboard.press(']');
    await keyboard.press('Shift+ArrowRight');
    await expect.poll(() => sheet.middle('R3')).not.toEqual(place);
    await times(page, 'ControlOrMeta+z', 2);
    await expect.poll(() => sheet.middle('R3')).toEqual(place);
    await keyboard.press('ControlOrMeta+ArrowLeft');
    await keyboard.press('Space');
    await expect(page.locator('[aria-pressed="true"][data-part]')).toHaveCount(2);
    await keyboard.press('ControlOrMeta+c');
    await keyboard.press('ControlOrMeta+v');
    await expect(sheet.part('R4')).toBeVisible();
    await keyboard.press('Delete');
    await expect(sheet.part('R4')).toHaveCount(0);
  });

  await test.step('reaches every action from one menu, and learns the keys', async () => {
    await keyboard.press('ControlOrMeta+a');
    await keyboard.press('a');
    await expect(page.getByRole('menuitem', { name: /^Duplicate as a mirror image/ })).toBeVisible();
    await keyboard.press('Escape');
    await expect(sheet.drawing).toBeFocused();
    await keyboard.press('?');
    await expect(page.getByRole('dialog', { name: 'Keys' })).toContainText('duplicate as a mirror image');
    await keyboard.press('Escape');
    await expect(sheet.drawing).toBeFocused();
  });
  await sheet.expectSaved();
});
