import { expect, type Page, test } from '@playwright/test';
import { signIn } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { Served } from './support/served';

let served: Served;
test.beforeAll(async () => {
  served = await Served.start('--demo');
});
test.afterAll(() => served.stop());

/** The wire from R1 to R2 on a sheet of its own, both upright, one to the right of and below the other. */
async function openWire(page: Page) {
  await signIn(page, 'ines@buoy.example', Served.demoPassword);
  const { teams } = await (await page.request.get('/api/me')).json();
  const part = (ref: string, x: number, y: number) => ({
    id: ref,
    kind: 'resistor',
    ref,
    place: { x, y, turn: 0, flip: false },
    values: { resistance: 1000 },
  });
  const parts = [part('R1', 0, 0), part('R2', 300, 200), part('R3', 500, 0)];
  const wires = [{ id: 'w', from: { part: 'R1', pin: 'b' }, to: { part: 'R2', pin: 'a' }, bends: [] }];
  const nets = [
    ['R1', 'R1.a', 'R1.b'],
    ['R2', 'R1.b', 'R2.b'],
    ['R3', 'R3.a', 'R3.b'],
  ];
  const made = await page.request.post(`/api/teams/${teams[0].id}/sheets`, {
    data: {
      name: 'Two resistors',
      circuit: {
        format: 'stillpoint.circuit',
        version: 1,
        ground: 'gnd',
        parts: nets.map(([ref, a, b]) => ({ ref, kind: 'resistor', a, b, resistance: 1000 })),
        drawing: { parts, wires },
      },
    },
    headers: { Origin: served.url },
  });
  expect(made.status()).toBe(201);
  await page.goto(`/sheets/${(await made.json()).sheet.id}`);
  const sheet = await SheetPage.on(page);
  await sheet.expectSaved();
  const wire = page.locator('[data-wire="w"]');
  await expect(wire).toBeVisible();
  const shape = async () => (await wire.getAttribute('d')) ?? '';
  /** The middle of the level stretch on the window, by where it is drawn. */
  const levelMiddle = () =>
    wire.evaluate((path: SVGPathElement) => {
      const corners = [...(path.getAttribute('d') ?? '').matchAll(/[ML]([-\d.]+) ([-\d.]+)/g)].map(([, x, y]) => ({
        x: Number(x),
        y: Number(y),
      }));
      const level = corners.findIndex((corner, i) => i > 0 && corner.y === corners[i - 1]?.y);
      const [a, b] = [corners[level - 1], corners[level]];
      const matrix = path.getScreenCTM();
      if (!a || !b || !matrix) throw new Error('the wire has a level stretch');
      const { x, y } = new DOMPoint((a.x + b.x) / 2, a.y).matrixTransform(matrix);
      return { x, y };
    });
  return { sheet, shape, levelMiddle };
}

test('a stretch of a wire is pushed aside by mouse; Escape lets it go, undo takes it back, a reload keeps it', async ({
  browser,
}) => {
  const page = await (await browser.newContext({ baseURL: served.url })).newPage();
  const { sheet, shape, levelMiddle } = await openWire(page);
  const before = await shape();
  const at = await levelMiddle();
  const push = async () => {
    await page.mouse.move(at.x, at.y);
    await page.mouse.down();
    await page.mouse.move(at.x, at.y + 40, { steps: 5 });
  };
  await push();
  expect(await shape()).not.toBe(before);
  await page.keyboard.press('Escape');
  await expect.poll(shape).toBe(before);
  await page.mouse.up();
  expect(await shape()).toBe(before);

  await push();
  await page.mouse.up();
  const after = await shape();
  expect(after).not.toBe(before);
  expect((await levelMiddle()).y).toBeCloseTo(at.y + 40, 0);
  await sheet.drawing.focus();
  await page.keyboard.press('ControlOrMeta+z');
  await expect.poll(shape).toBe(before);
  await page.keyboard.press('ControlOrMeta+y');
  await expect.poll(shape).toBe(after);
  await sheet.expectSaved();
  await page.reload();
  await expect(page.locator('[data-wire="w"]')).toHaveAttribute('d', after);
  await page.context().close();
});

test('a stretch of a wire is pushed aside by touch', async ({ browser }) => {
  const page = await (await browser.newContext({ baseURL: served.url, hasTouch: true })).newPage();
  const { sheet, shape, levelMiddle } = await openWire(page);
  const before = await shape();
  const at = await levelMiddle();
  await sheet.swipe([at.x, at.y], [0, 40]);
  await expect.poll(shape).not.toBe(before);
  expect((await levelMiddle()).y).toBeCloseTo(at.y + 40, 0);
  await page.context().close();
});

test('by keys a wire is chosen at its terminal and pushed, and another is tied to its middle', async ({ browser }) => {
  const page = await (await browser.newContext({ baseURL: served.url })).newPage();
  const { sheet, shape } = await openWire(page);
  const before = await shape();
  await sheet.terminal('R1.b').focus();
  await page.keyboard.press('w');
  await page.keyboard.press('Shift+ArrowDown');
  await page.keyboard.press('Shift+ArrowDown');
  await expect.poll(shape).not.toBe(before);
  await page.keyboard.press('ControlOrMeta+z');
  await page.keyboard.press('ControlOrMeta+z');
  await expect.poll(shape).toBe(before);

  await sheet.terminal('R3.b').focus();
  await page.keyboard.press('Enter');
  await page.keyboard.press('w');
  await page.keyboard.press('Enter');
  await expect(page.locator('.dot')).toHaveCount(1);
  await expect(page.locator('[data-wire]')).toHaveCount(3);
  await page.context().close();
});
