import { beginSheet, openWindow, signUp } from './fixtures/people';
import type { SheetPage } from './fixtures/sheet-page';
import { expect, type Page, test } from './fixtures/test';
import { Served } from './support/served';

test.describe.configure({ timeout: 180_000 });

let served: Served;

test.beforeAll(async () => {
  served = await Served.start();
});
test.afterAll(() => served.stop());

/** A person of a team of their own, with one sheet open. */
async function drawer(page: Page, name: string, starter: string): Promise<SheetPage> {
  await signUp(page, '/sign-up', { name, email: `${name.toLowerCase().replace(/\W+/g, '.')}@buoy.example` });
  return beginSheet(page, starter, `Sheet of ${name}`);
}

const CLIPBOARD = { permissions: ['clipboard-read', 'clipboard-write'] };

test('a drag frames parts, they move together, and Escape takes back a frame and a move', async ({ browser }) => {
  const page = await openWindow(browser, served.url);
  const sheet = await drawer(page, 'Ada Strand', 'Differential pair with mirror load');

  await sheet.frame('Q3', 'Q4');
  await expect(sheet.part('Q3')).toHaveAttribute('aria-pressed', 'true');
  await expect(sheet.part('Q4')).toHaveAttribute('aria-pressed', 'true');
  await expect(sheet.part('Q1')).toHaveAttribute('aria-pressed', 'false');

  const together = await sheet.offset('Q3', 'Q4');
  const apart = await sheet.offset('Q3', 'Q1');
  await sheet.dragPart('Q3', [0, -40]);
  expect(await sheet.offset('Q3', 'Q4')).toEqual(together);
  // About 40 px of the window, for what moves is on the grid of the sheet.
  expect((await sheet.offset('Q3', 'Q1'))[1]).toBeGreaterThan(apart[1] + 30);
  await page.keyboard.press('ControlOrMeta+z');
  await expect.poll(() => sheet.offset('Q3', 'Q1')).toEqual(apart);

  await test.step('Escape drops what is under the hand', async () => {
    const [x, y] = await sheet.middle('Q3');
    await page.mouse.move(x, y);
    await page.mouse.down();
    await page.mouse.move(x, y + 60, { steps: 6 });
    expect(await sheet.offset('Q3', 'Q1')).not.toEqual(apart);
    await page.keyboard.press('Escape');
    await page.mouse.up();
    expect(await sheet.offset('Q3', 'Q1')).toEqual(apart);

    const box = await sheet.drawing.boundingBox();
    if (!box) throw new Error('the drawing is not shown');
    await page.mouse.click(box.x + 8, box.y + 8);
    await page.mouse.move(box.x + 8, box.y + 8);
    await page.mouse.down();
    await page.mouse.move(box.x + box.width - 8, box.y + box.height - 8, { steps: 4 });
    await expect(page.locator('.brackets-selected')).not.toHaveCount(0);
    await page.keyboard.press('Escape');
    await page.mouse.up();
    await expect(page.locator('.brackets-selected')).toHaveCount(0);
  });

  await test.step('Delete takes the wires with the parts', async () => {
    const wires = page.locator('.react-flow__edge');
    const before = await wires.count();
    await sheet.part('Q6').click();
    await page.keyboard.press('Delete');
    await expect(sheet.part('Q6')).toHaveCount(0);
    expect(await wires.count()).toBeLessThan(before);
    await page.keyboard.press('ControlOrMeta+z');
    await expect(wires).toHaveCount(before);
  });
});

test('parts are copied from one browser’s sheet to another’s, and anything else on the clipboard is refused', async ({
  browser,
}) => {
  const hers = await drawer(await openWindow(browser, served.url), 'Cleo Vane', 'Differential pair with mirror load');
  const bo = await openWindow(browser, served.url, CLIPBOARD);
  const his = await drawer(bo, 'Bo Lind', 'Blank sheet');

  await hers.frame('Q5', 'Q6');
  await hers.part('R1').click({ modifiers: ['Shift'] });
  await hers.page.keyboard.press('ControlOrMeta+c');
  await expect(hers.page.getByText(/Copied \d+ parts/).first()).toBeVisible();

  await his.drawing.hover({ position: { x: 500, y: 250 } });
  await his.drawing.focus();
  await bo.keyboard.press('ControlOrMeta+v');
  for (const ref of ['Q5', 'Q6', 'R1']) await expect(his.part(ref)).toHaveAttribute('aria-pressed', 'true');
  await bo.keyboard.press('ControlOrMeta+v');
  await expect(his.part('Q1')).toBeVisible();
  await expect(his.part('R2')).toBeVisible();
  await bo.keyboard.press('ControlOrMeta+z');
  await expect(his.part('Q1')).toHaveCount(0);
  await expect(his.part('Q6')).toBeVisible();

  await test.step('a circuit file’s text is laid out', async () => {
    const circuit = {
      format: 'stillpoint.circuit',
      version: 1,
      ground: 'gnd',
      parts: [
        { ref: 'V7', kind: 'voltage', plus: 'in', minus: 'gnd', voltage: 2 },
        { ref: 'R7', kind: 'resistor', a: 'in', b: 'gnd', resistance: 1000 },
      ],
    };
    await bo.evaluate((text) => navigator.clipboard.writeText(text), JSON.stringify(circuit));
    await his.drawing.focus();
    await bo.keyboard.press('a');
    await bo.getByRole('menuitem', { name: 'Paste' }).click();
    await expect(his.part('V7')).toBeVisible();
    await expect(his.part('R7')).toBeVisible();
  });

  await test.step('other text is refused in words, and nothing changes', async () => {
    await bo.evaluate(() => navigator.clipboard.writeText('Dear all'));
    await his.drawing.focus();
    const parts = await bo.locator('[data-part]').count();
    await bo.keyboard.press('ControlOrMeta+v');
    await expect(bo.locator('.tray-hint')).toContainText('something other than parts of a sheet');
    expect(await bo.locator('[data-part]').count()).toBe(parts);
  });
});

test('a half is mirrored, parts are aligned, renumbered and found', async ({ browser }) => {
  const page = await openWindow(browser, served.url);
  const sheet = await drawer(page, 'Dora Finch', 'Blank sheet');
  await sheet.placeByMouse('P-channel FET', [300, 120]);
  await sheet.placeByMouse('N-channel FET', [340, 300]);
  await sheet.wire('Q1.drain', 'Q2.drain');

  await test.step('mirrored, with the wire between', async () => {
    await sheet.drawing.focus();
    await page.keyboard.press('ControlOrMeta+a');
    await page.keyboard.press('m');
    await expect(sheet.part('Q4')).toBeVisible();
    await expect(page.locator('.react-flow__edge')).toHaveCount(2);
    const [gate] = await sheet.centreOf('Q2.gate');
    const [drain] = await sheet.centreOf('Q2.drain');
    const [copyGate] = await sheet.centreOf('Q4.gate');
    const [copyDrain] = await sheet.centreOf('Q4.drain');
    expect(copyDrain).toBeGreaterThan(drain);
    expect(copyGate - copyDrain).toBeCloseTo(drain - gate, 3);
    expect((await sheet.offset('Q2', 'Q4'))[1]).toBe(0);
  });

  await test.step('aligned by their drains', async () => {
    await sheet.part('Q1').click();
    await sheet.part('Q2').click({ modifiers: ['Shift'] });
    await page.keyboard.press('s');
    await page.getByRole('menuitemradio', { name: 'drain' }).click();
    await page.getByRole('menuitem', { name: 'left' }).click();
    const [upper] = await sheet.centreOf('Q1.drain');
    const [lower] = await sheet.centreOf('Q2.drain');
    expect(upper).toBe(lower);
    await expect(page.locator('.tray-hint')).toContainText('Aligned 2 parts left by their drains');
  });

  await test.step('renumbered row by row from the menu, and taken back', async () => {
    const [q3] = await sheet.centreOf('Q3.drain');
    await page.mouse.click(1400, 120);
    await page.getByRole('button', { name: 'actions' }).click();
    await page.getByRole('menuitem', { name: 'Renumber row by row' }).click();
    await expect.poll(async () => (await sheet.centreOf('Q2.drain'))[0]).toBe(q3);
    await page.keyboard.press('ControlOrMeta+z');
    await expect.poll(async () => (await sheet.centreOf('Q3.drain'))[0]).toBe(q3);
  });

  await test.step('found by the keys', async () => {
    await page.keyboard.press('f');
    await page.keyboard.type('q4.');
    await expect(page.getByRole('option').first()).toContainText('Q4.');
    await page.getByLabel('Reference, net or value').fill('q4');
    await page.keyboard.press('Enter');
    await expect(page.getByRole('dialog')).toBeHidden();
    await expect(sheet.part('Q4')).toBeFocused();
    await expect(sheet.part('Q4')).toHaveAttribute('aria-pressed', 'true');
  });
});

test('a value is set in many parts at once, and a matched group keeps its values equal', async ({ browser }) => {
  const page = await openWindow(browser, served.url);
  const sheet = await drawer(page, 'Enno Dale', 'Differential pair with mirror load');
  await sheet.part('Q1').click();
  await sheet.part('Q2').click({ modifiers: ['Shift'] });
  await sheet.part('Q6').click({ modifiers: ['Shift'] });
  await page.keyboard.press('Enter');
  const slip = page.getByLabel('3 parts: values');
  await expect(slip.getByLabel('W', { exact: true })).toHaveValue('several');
  await expect(slip.getByLabel('L', { exact: true })).toHaveValue('1\u00a0µm');
  await slip.getByLabel('L', { exact: true }).fill('2');
  await page.keyboard.press('Enter');
  for (const ref of ['Q1', 'Q2', 'Q6']) await expect(sheet.label(ref)).toContainText('/2');
  await page.keyboard.press('Escape');
  await page.keyboard.press('ControlOrMeta+z');
  for (const ref of ['Q1', 'Q2', 'Q6']) await expect(sheet.label(ref)).toContainText('/1');

  await sheet.part('Q1').click();
  await sheet.part('Q2').click({ modifiers: ['Shift'] });
  await page.keyboard.press('k');
  await expect(sheet.label('Q1')).toContainText('8/1 =A');
  await expect(sheet.label('Q2')).toContainText('8/1 =A');
  // Of one alone, for Enter is about all that are selected.
  await page.keyboard.press('Escape');
  await sheet.typeValue('Q2', '12');
  await expect(sheet.label('Q1')).toContainText('12/1 =A');
  await page.keyboard.press('ControlOrMeta+z');
  await expect(sheet.label('Q1')).toContainText('8/1 =A');
  await expect(sheet.label('Q2')).toContainText('8/1 =A');

  await test.step('one leaves the group in its slip', async () => {
    await sheet.part('Q2').focus();
    await page.keyboard.press('Enter');
    await page.getByLabel('Q2: values').getByLabel('equal').selectOption('none');
    await page.keyboard.press('Escape');
    await expect(sheet.label('Q2')).not.toContainText('=A');
  });
});

test('a note is written where it stands', async ({ browser }) => {
  const page = await openWindow(browser, served.url);
  const sheet = await drawer(page, 'Fay Holm', 'Blank sheet');
  await sheet.drawing.focus();
  await page.keyboard.press('x');
  await page.keyboard.press('Enter');
  await page.getByLabel('text of the note').fill('tail first,\nthen the pair <b>');
  await page.keyboard.press('Tab');
  await page.keyboard.press('Escape');
  await expect(page.getByRole('button', { name: 'Note: tail first,' })).toContainText('then the pair <b>');
});

test('by touch at 390 px parts are placed, wired, moved and given values, and several are selected', async ({
  browser,
}) => {
  const page = await openWindow(browser, served.url, { hasTouch: true, viewport: { width: 390, height: 844 } });
  const sheet = await drawer(page, 'Gil Reed', 'Blank sheet');
  const touch = page.touchscreen;
  const box = await sheet.drawing.boundingBox();
  if (!box) throw new Error('the drawing is not shown');

  await test.step('the tray is one row that scrolls sideways, and no page is wider than the screen', async () => {
    const tops = await page
      .getByRole('button', { name: /^Place: / })
      .evaluateAll((buttons) => buttons.map((button) => button.getBoundingClientRect().top));
    expect(new Set(tops).size).toBe(1);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(390);
  });

  await page.getByRole('button', { name: 'Place: resistor' }).tap();
  await touch.tap(box.x + 100, box.y + 80);
  await touch.tap(box.x + 240, box.y + 80);
  await page.getByRole('button', { name: 'Place: resistor' }).tap();
  await expect(sheet.part('R2')).toBeVisible();

  for (const terminal of ['R1.b', 'R2.b']) {
    const area = await sheet.terminal(terminal).boundingBox();
    expect(Math.min(area?.width ?? 0, area?.height ?? 0)).toBeGreaterThanOrEqual(24);
    await touch.tap(...(await sheet.centreOf(terminal)));
  }
  await expect(page.locator('.react-flow__edge')).toHaveCount(1);

  await test.step('a finger moves a part', async () => {
    const before = await sheet.offset('R1', 'R2');
    await sheet.swipe(await sheet.middle('R2'), [0, 60]);
    await expect.poll(async () => (await sheet.offset('R1', 'R2'))[1]).toBe(before[1] + 60);
  });

  await test.step('two touches open the slip', async () => {
    await touch.tap(...(await sheet.middle('R1')));
    await touch.tap(...(await sheet.middle('R1')));
    const slip = page.getByLabel('R1: values');
    await slip.getByLabel('R', { exact: true }).fill('4k7');
    await page.keyboard.press('Enter');
    await slip.getByRole('button', { name: 'Close' }).tap();
    await expect(sheet.label('R1')).toContainText('4.7');
  });

  await test.step('several are selected one by one, and removed from the menu', async () => {
    await page.getByText('several').tap();
    await touch.tap(...(await sheet.middle('R2')));
    await expect(sheet.part('R1')).toHaveAttribute('aria-pressed', 'true');
    await expect(sheet.part('R2')).toHaveAttribute('aria-pressed', 'true');
    await page.getByRole('button', { name: 'actions' }).tap();
    await page.getByRole('menuitem', { name: 'Remove' }).tap();
    await expect(sheet.part('R1')).toHaveCount(0);
    await expect(sheet.part('R2')).toHaveCount(0);
  });
});
