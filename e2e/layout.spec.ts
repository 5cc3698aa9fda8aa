import { STARTERS } from '#shared/starters/starters';
import { signIn } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { expect, test } from './fixtures/test';
import { Served } from './support/served';

let served: Served;
test.beforeAll(async () => {
  served = await Served.start('--demo');
});
test.afterAll(() => served.stop());

test('on every starter and demo sheet no text lies over a symbol, a wire or another text', async ({ browser }) => {
  test.setTimeout(240_000);
  const page = await (await browser.newContext({ baseURL: served.url, reducedMotion: 'reduce' })).newPage();
  await signIn(page, 'ines@buoy.example', Served.demoPassword);
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
    await test.step(name, async () => {
      await page.goto(`/sheets/${id}`);
      const sheet = await SheetPage.on(page);
      await expect(page.getByRole('figure').first()).toHaveAttribute('aria-busy', 'false');
      await page.getByLabel('currents').check();
      await expect(page.locator('[data-current]').first()).toBeVisible();
      expect(await sheet.drawing.evaluate(overlaps)).toEqual([]);
    });
  }
  await page.context().close();
});

test('from too far to read the glyphs alone are left, and near again the figures', async ({ browser }) => {
  const page = await (await browser.newContext({ baseURL: served.url })).newPage();
  await signIn(page, 'ines@buoy.example', Served.demoPassword);
  await page.getByRole('link', { name: 'Hydrophone input pair' }).click();
  const sheet = await SheetPage.on(page);
  await expect(sheet.tag('Q6')).toHaveAttribute('aria-busy', 'false');
  const label = page.locator('.part-label').first();
  await expect(label).toBeVisible();
  const box = await sheet.drawing.boundingBox();
  if (!box) throw new Error('the drawing is shown');
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
  await expect(async () => {
    await page.mouse.wheel(0, 400);
    await expect(label).toBeHidden({ timeout: 500 });
  }).toPass();
  const glyph = await page.locator('.far-glyph svg').first().boundingBox();
  expect(glyph?.width).toBeGreaterThan(7);
  await page.getByRole('button', { name: 'show the whole drawing' }).click();
  await expect(label).toBeVisible();
  await expect(sheet.tag('Q6').getByText('A', { exact: false }).first()).toBeVisible();
  await page.context().close();
});

/** What lies over what in the drawing as the browser laid it out, by name. Runs in the page. */
function overlaps(drawing: Element): string[] {
  /** Less than this, in px of the window, is rounding. */
  const slack = 0.75;
  type Thing = { name: string; box: DOMRect; element: Element };
  const boxes = (selector: string): Thing[] =>
    [...drawing.querySelectorAll(selector)].map((element) => ({
      name: `${selector} ${element.textContent ?? ''}`.trim(),
      box: element.getBoundingClientRect(),
      element,
    }));
  const meet = ({ box: a }: Thing, { box: b }: Thing) =>
    Math.min(a.right, b.right) - Math.max(a.left, b.left) > slack &&
    Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top) > slack;
  const tags = boxes('.part-tag figure');
  const labels = boxes('.part-label');
  const names = boxes('.net-label');
  const figures = boxes('[data-current]');
  const dots = boxes('.dot');
  if (tags.length * labels.length * names.length * dots.length === 0) return ['a drawing without texts or symbols'];
  const texts = [...tags, ...labels, ...names, ...figures];
  const found: string[] = [];
  texts.forEach((text, i) => {
    for (const other of texts.slice(i + 1)) if (meet(text, other)) found.push(`${text.name} over ${other.name}`);
    for (const other of dots) if (meet(text, other)) found.push(`${text.name} over ${other.name}`);
  });
  const covered = (stroke: SVGGeometryElement, what: string, covering: Thing[]) => {
    const matrix = stroke.getScreenCTM();
    const length = stroke.getTotalLength();
    for (let at = 0; matrix && at <= length; at += 2) {
      const { x, y } = stroke.getPointAtLength(at).matrixTransform(matrix);
      for (const { name, box } of covering) {
        const inside = x > box.left + slack && x < box.right - slack && y > box.top + slack && y < box.bottom - slack;
        const said = `${name} over ${what}`;
        if (inside && !found.includes(said)) found.push(said);
      }
    }
  };
  for (const wire of drawing.querySelectorAll<SVGPathElement>('.react-flow__edge-path')) {
    covered(wire, `wire ${wire.dataset.wire}`, [...tags, ...labels, ...figures]);
  }
  const strokes = drawing.querySelectorAll<SVGGeometryElement>('.react-flow__node .symbol :is(path, circle)');
  for (const stroke of strokes) {
    covered(stroke, `the symbol of ${stroke.closest<HTMLElement>('[data-ref]')?.dataset.ref}`, texts);
  }
  return strokes.length === 0 ? ['a drawing without symbols'] : found;
}
