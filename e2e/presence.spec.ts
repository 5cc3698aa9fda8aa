import { beginSheet, invitationLink, openWindow, signUp } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { expect, test } from './fixtures/test';
import { Served } from './support/served';

let served: Served;

test.beforeAll(async () => {
  served = await Served.start();
});
test.afterAll(() => served.stop());

test('people see who is here, what they have selected, and follow what one of them has in view', async ({
  browser,
}) => {
  test.setTimeout(120_000);
  const ada = await openWindow(browser, served.url);
  await signUp(ada, '/sign-up', { name: 'Ada Strand', email: 'ada@buoy.example' });
  const link = await invitationLink(ada, 'designer');
  const bo = await openWindow(browser, served.url);
  await signUp(bo, link, { name: 'Bo Lind', email: 'bo@buoy.example' });
  const hers = await beginSheet(ada, 'Differential pair', 'Pair');
  await bo.goto(new URL(ada.url()).pathname);
  const his = await SheetPage.on(bo);

  await test.step('a selection shows with its owner’s initials', async () => {
    await his.part('Q6').click();
    await expect(hers.drawing.getByText('BL', { exact: true }).first()).toBeVisible();
  });

  await test.step('following shows what the other has in view, until the view is moved by hand', async () => {
    const before = await his.part('Q1').boundingBox();
    await bo.getByRole('button', { name: 'Follow Ada Strand' }).click();
    await expect(bo.getByText('following Ada Strand')).toBeVisible();
    const box = await hers.drawing.boundingBox();
    if (!box) throw new Error('the drawing is shown');
    await ada.mouse.move(box.x + 300, box.y + 200);
    await ada.mouse.wheel(0, -600);
    await expect
      .poll(async () => (await his.part('Q1').boundingBox())?.width)
      .toBeGreaterThan((before?.width ?? 0) * 1.2);
    await expect
      .poll(async () =>
        Math.abs(((await his.part('Q1').boundingBox())?.x ?? 0) - ((await hers.part('Q1').boundingBox())?.x ?? 0)),
      )
      .toBeLessThan(3);
    await bo.mouse.move(box.x + 200, box.y + 200);
    await bo.mouse.wheel(0, 300);
    await expect(bo.getByText('following Ada Strand')).toBeHidden();
  });

  await test.step('someone who leaves is gone from who is here', async () => {
    await ada.context().close();
    await expect(bo.getByLabel('Here now')).not.toContainText('Ada Strand', { timeout: 5_000 });
  });
});
