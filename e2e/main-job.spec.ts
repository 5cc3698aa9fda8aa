import { formatValue } from '#shared/units/format-value';
import { beginSheet, invitationLink, openWindow, signUp } from './fixtures/people';
import { SheetPage } from './fixtures/sheet-page';
import { expect, test } from './fixtures/test';
import { Served } from './support/served';

let served: Served;

test.beforeAll(async () => {
  served = await Served.start();
});
test.afterAll(() => served.stop());

test('two people draw a biased stage together, read equal tags, and find it again after a restart', async ({
  browser,
}) => {
  test.setTimeout(240_000);
  const ada = await openWindow(browser, served.url);
  await signUp(ada, '/sign-up', { name: 'Ada Strand', email: 'ada@buoy.example' });
  const designerLink = await invitationLink(ada, 'designer');
  const viewerLink = await invitationLink(ada, 'viewer');
  const bo = await openWindow(browser, served.url);
  await signUp(bo, designerLink, { name: 'Bo Lind', email: 'bo@buoy.example' });

  const hers = await beginSheet(ada, 'Blank sheet', 'First stage');
  await bo.goto(new URL(ada.url()).pathname);
  const his = await SheetPage.on(bo);
  await expect(ada.getByLabel('Here now')).toContainText('Bo Lind');
  await expect(bo.getByLabel('Here now')).toContainText('Ada Strand');

  await test.step('one places parts and ties terminals by mouse', async () => {
    await hers.placeByMouse('voltage source', [200, 250]);
    await hers.placeByMouse('resistor', [400, 130], [400, 380], [640, 110], [640, 390]);
    await hers.wire('V1.plus', 'R1.a');
    await hers.wire('R1.a', 'R3.a');
    await hers.wire('R1.b', 'R2.a');
    await hers.groundAt('V1.minus', 'R2.b', 'R4.b');
  });

  await test.step('the other places the FET and ties it by keys', async () => {
    await expect(his.part('R4')).toBeVisible();
    await his.drawing.focus();
    await bo.keyboard.press('n');
    await bo.keyboard.press('Enter');
    await bo.keyboard.press('Escape');
    await expect(hers.part('Q1')).toBeVisible();
  });

  await test.step('a circuit that cannot be solved says so at the part, without figures', async () => {
    await expect(his.tag('Q1')).toContainText('floats');
    await expect(his.tag('Q1')).not.toContainText('µA');
  });

  await test.step('the first moves the FET by mouse, the other ties its terminals', async () => {
    const from = await hers.part('Q1').boundingBox();
    const stage = await hers.part('R3').boundingBox();
    if (!from || !stage) throw new Error('Q1 and R3 are drawn');
    await hers.dragPart('Q1', [stage.x + stage.width / 2 - from.x - from.width / 2, stage.y + 180 - from.y]);
    await his.wire('Q1.drain', 'R3.b');
    await his.wire('Q1.source', 'R4.a');
    await his.part('R2').focus();
    await bo.keyboard.press('.');
    await bo.keyboard.press('Enter');
    await expect(bo.locator('[data-terminal="R2.a"]')).toBeFocused();
    for (let step = 0; step < 12 && (await bo.locator('[data-terminal="Q1.gate"]:focus').count()) === 0; step++) {
      await bo.keyboard.press('.');
    }
    await bo.keyboard.press('Enter');
  });

  await test.step('values are typed as people write them', async () => {
    await his.typeValue('R1', '100k');
    await his.typeValue('R2', '0,1 MΩ');
    await hers.typeValue('R3', '8k2');
    await hers.typeValue('R4', '2K');
  });

  await expect(hers.tag('Q1')).toContainText('saturated');
  await expect(his.tag('Q1')).toContainText('saturated');
  await expect.poll(() => his.tagText('Q1')).toBe(await hers.tagText('Q1'));
  await hers.expectSaved();
  await his.expectSaved();
  const before = await hers.tagText('Q1');

  await served.restart();
  await hers.expectSaved();
  await bo.reload();
  const again = await SheetPage.on(bo);
  await expect(again.tag('Q1')).toContainText('saturated');
  expect(await again.tagText('Q1')).toBe(before);
  expect(await hers.tagText('Q1')).toBe(before);

  await test.step('HTTP gives the same numbers', async () => {
    const answer = await ada.request.get(
      `${new URL(ada.url()).pathname.replace('/sheets/', '/api/sheets/')}/operating-point`,
    );
    const record = await answer.json();
    expect(record.status).toBe('solved');
    expect(before).toContain('saturated');
    expect(before).toContain(formatValue(record.fets.Q1.id, 'A'));
    await expect(ada.getByRole('row', { name: /^Q1/ })).toContainText(
      (record.fets.Q1.saturationMargin * 1e3).toPrecision(3),
    );
  });

  await test.step('a viewer sees it live and cannot change it', async () => {
    const cy = await openWindow(browser, served.url);
    await signUp(cy, viewerLink, { name: 'Cy Moe', email: 'cy@buoy.example' });
    await cy.goto(new URL(ada.url()).pathname);
    const theirs = await SheetPage.on(cy);
    await expect(theirs.tag('Q1')).toContainText('saturated');
    await expect(cy.getByText('looking on as viewer')).toBeVisible();
    await expect(cy.getByRole('button', { name: /^Place:/ })).toHaveCount(0);
    const place = await theirs.offset('R1', 'R3');
    await theirs.dragPart('R3', [60, 0]);
    await theirs.part('R3').focus();
    await cy.keyboard.press('Delete');
    await cy.keyboard.press('r');
    await cy.keyboard.press('Enter');
    await hers.typeValue('R3', '30k');
    await expect(theirs.tag('Q1')).toContainText('triode');
    await expect(theirs.part('R5')).toHaveCount(0);
    expect(await theirs.offset('R1', 'R3')).toEqual(place);
    await expect(hers.part('R3')).toBeVisible();
  });
});
