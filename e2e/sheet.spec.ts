import { readFileSync } from 'node:fs';
import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import { boundsOf } from '../src/drawing/bounds.ts';
import { drawStage } from '../src/drawing/drawStage.ts';
import { middle } from '../src/drawing/boxes.ts';
import { settleStage } from '../src/readings/settleStage.ts';
import { fitMargin } from '../src/sheet/view.ts';
import { apply, fitted } from '../src/sheet/viewport.ts';
import { readStage } from '../src/stage/readStage.ts';
import { routeWires } from '../src/stage/routing/routeWires.ts';
import { baseName } from '../src/stage/states.ts';
import { expect, test } from './page.ts';

/** Where a primitive of the first example stands on the screen once it is fitted in: by the drawing, not by the page. */
const placeOf = async (page: Page, matches: (text: { of?: string; thing: string }) => boolean) => {
  const opened = await readStage(readFileSync('examples/echo-preamplifier.stage.json', 'utf8'));
  if (!opened.ok) throw new Error('The example does not open.');
  const state = baseName(opened.value);
  const readings = settleStage(opened.value).states[state] ?? null;
  const drawing = drawStage(opened.value, readings, {
    density: 'all',
    routes: routeWires(opened.value),
    state,
  });
  const found = drawing.primitives.find(matches);
  const box = await page.locator('#sheet').boundingBox();
  if (found === undefined || box === null) throw new Error('It is not on the sheet.');
  const [x, y] = apply(fitted(drawing.bounds, box, fitMargin), middle(boundsOf(found)));
  return { x: box.x + x, y: box.y + y };
};

const ledgerRow = (page: Page, name: string) =>
  page.getByRole('complementary', { name: 'ledger' }).getByRole('listitem').filter({ hasText: name });
const chosen = (page: Page) => page.getByRole('status', { name: 'selection' });

test('dragging a resistor’s slider takes a transistor from saturation to triode, and one undo takes it back', async ({
  page,
}) => {
  await expect(page.locator('#sheet canvas')).toHaveCount(3);
  await expect(ledgerRow(page, 'Q1')).toContainText('saturation');
  const value = await placeOf(page, ({ of, thing }) => of === 'p4' && thing === 'value');
  await page.mouse.click(value.x, value.y);
  const strip = page.getByRole('group', { name: 'resistance of R3' });
  await expect(strip.getByRole('textbox', { name: 'resistance' })).toHaveValue('4k7');

  const slider = strip.getByRole('slider');
  const box = await slider.boundingBox();
  if (box === null) throw new Error('The slider is not on the page.');
  const y = box.y + 15;
  await page.mouse.move(box.x + box.width / 2, y);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width * 0.6, y, { steps: 8 });
  await page.mouse.move(box.x + box.width * 0.7, y, { steps: 8 });
  // Nothing is stated before the hand lets go, and what the ledger says of the former value is struck.
  await expect(page.getByRole('button', { name: 'undo', exact: true })).toHaveAttribute(
    'aria-disabled',
    'true',
  );
  await page.mouse.up();
  await expect(ledgerRow(page, 'Q1')).toContainText('triode');
  await expect(slider).toHaveAttribute('aria-valuenow', /^1\d000$/);

  await page.getByRole('button', { name: 'undo: Set R3' }).click();
  await expect(ledgerRow(page, 'Q1')).toContainText('saturation');
  await expect(page.getByRole('button', { name: 'undo', exact: true })).toHaveAttribute(
    'aria-disabled',
    'true',
  );
  await page.getByRole('button', { name: 'redo: Set R3' }).click();
  await expect(ledgerRow(page, 'Q1')).toContainText('triode');
});

test('the same by keyboard alone', async ({ page }) => {
  await page.locator('#sheet').focus();
  for (let presses = 0; presses < 12; presses += 1) {
    await page.keyboard.press('Tab');
    if ((await chosen(page).textContent()) === 'R3 4k7') break;
  }
  await expect(chosen(page)).toHaveText('R3 4k7');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('textbox', { name: 'resistance' })).toBeFocused();
  await page.keyboard.type('10k');
  await page.keyboard.press('Enter');
  await expect(ledgerRow(page, 'Q1')).toContainText('triode');
  await page.keyboard.press('Escape');
  await expect(page.locator('#sheet')).toBeFocused();
  await page.keyboard.press('Control+z');
  await expect(ledgerRow(page, 'Q1')).toContainText('saturation');
});

test('a value that is none stays in its field with the reason, until it is put right', async ({ page }) => {
  const value = await placeOf(page, ({ of, thing }) => of === 'p4' && thing === 'value');
  await page.mouse.click(value.x, value.y);
  const field = page.getByRole('textbox', { name: 'resistance' });
  await field.fill('4,7k');
  await field.press('Enter');
  await expect(page.getByRole('alert')).toContainText('Write the decimal sign as a point');
  await expect(field).toHaveValue('4,7k');
  // Clicking elsewhere loses nothing.
  await page.mouse.click(value.x + 250, value.y - 100);
  await expect(field).toHaveValue('4,7k');
  await field.fill('12/3*1000');
  await field.press('Enter');
  await expect(page.getByRole('alert')).toHaveCount(0);
  await expect(page.getByRole('slider')).toHaveAttribute('aria-valuenow', '4000');
});

test('a part is dragged along the grid with its wires, in one step', async ({ page }) => {
  const name = await placeOf(page, ({ of, thing }) => of === 'p4' && thing === 'name');
  await page.mouse.move(name.x, name.y);
  await page.mouse.down();
  await page.mouse.move(name.x + 30, name.y + 10, { steps: 5 });
  await page.mouse.move(name.x + 61, name.y + 20, { steps: 5 });
  await page.mouse.up();
  await expect(chosen(page)).toHaveText('R3 4k7');
  await expect(page.getByRole('button', { name: 'undo: Move R3' })).toBeVisible();
  await expect(ledgerRow(page, 'Q1')).toContainText('saturation');
  await page.mouse.click(name.x, name.y - 150);
  await expect(chosen(page)).toHaveText('');
});

test('keys turn, mirror, move and delete what is chosen, and undo takes each back', async ({ page }) => {
  const name = await placeOf(page, ({ of, thing }) => of === 'p4' && thing === 'name');
  await page.mouse.click(name.x, name.y);
  for (const [key, step] of [
    ['.', 'Turn R3'],
    [',', 'Turn R3'],
    ['/', 'Mirror R3'],
    ['ArrowRight', 'Move R3'],
    ['Delete', 'Delete R3'],
  ] as const) {
    await page.keyboard.press(key);
    await expect(page.getByRole('button', { name: `undo: ${step}` })).toBeVisible();
  }
  for (let steps = 0; steps < 5; steps += 1) await page.keyboard.press('Control+z');
  await expect(page.getByRole('button', { name: 'undo', exact: true })).toBeVisible();
  await expect(ledgerRow(page, 'Q1')).toContainText('saturation');
});

test('the wheel zooms, the buttons go to 100 % and fit', async ({ page }) => {
  const percent = page.getByRole('button', { name: /back to 100 %/ });
  const fit = await percent.innerText();
  await page.locator('#sheet').hover();
  await page.mouse.wheel(0, -500);
  await expect(percent).not.toHaveText(fit);
  await percent.click();
  await expect(percent).toHaveText('100 %');
  await page.getByRole('button', { name: 'fit' }).click();
  await expect(percent).toHaveText(fit);
});

test('with keeping off, a change leaves the readings marked until they are settled', async ({ page }) => {
  const status = page.getByRole('status', { name: 'settling' });
  await page.getByRole('switch', { name: 'Keep settled' }).uncheck();
  const value = await placeOf(page, ({ of, thing }) => of === 'p4' && thing === 'value');
  await page.mouse.click(value.x, value.y);
  await page.getByRole('textbox', { name: 'resistance' }).fill('10k');
  await page.keyboard.press('Enter');
  await expect(status).toHaveText('changed since it was settled');
  await expect(page.getByRole('table', { name: /^Readings/ })).toHaveCount(0);
  await page.getByRole('button', { name: 'Settle' }).click();
  await expect(status).toHaveText(/settled in \d+ steps?/);
  await expect(ledgerRow(page, 'Q1')).toContainText('triode');
});

for (const theme of ['light', 'dark'] as const) {
  test(`an open value strip keeps the ${theme} page free of what the checker knows of`, async ({ page }) => {
    await page.emulateMedia({ colorScheme: theme });
    const value = await placeOf(page, ({ of, thing }) => of === 'p4' && thing === 'value');
    await page.mouse.click(value.x, value.y);
    await page.getByRole('textbox', { name: 'resistance' }).fill('none');
    await page.keyboard.press('Enter');
    await expect(page.getByRole('alert')).toBeVisible();
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations).toEqual([]);
  });
}
