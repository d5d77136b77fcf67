import { AxeBuilder } from '@axe-core/playwright';
import { expect, test } from './page.ts';
import { inkBox, inkOf, isPainted } from './ink.ts';

test('the page opens on the first example with its readings', async ({ page }) => {
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Echo preamplifier, gauge 14');
  await expect(page.locator('#sheet canvas')).toHaveCount(3);
  await expect(page.getByRole('complementary', { name: 'ledger' })).toContainText('saturation');
  await expect(page.getByText(/settled in \d+ steps?/)).toBeVisible();
});

test('every example can be chosen and shows its own readings', async ({ page }) => {
  const links = page.getByRole('navigation', { name: 'examples' }).getByRole('link');
  const titles = await links.allTextContents();
  expect(titles.length).toBeGreaterThanOrEqual(10);
  for (const title of titles) {
    await links.filter({ hasText: new RegExp(`^${title}$`) }).click();
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(title);
    await expect(page.getByText(/settled in \d+ steps?/)).toBeVisible();
    await expect(page.getByRole('table', { name: new RegExp(`^Readings of ${title}`) })).toBeAttached();
    expect(await isPainted(page)).toBe(true);
  }
});

test('the state of the equipment changes the readings', async ({ page }) => {
  await page.goto('#battery-polarity');
  const ledger = page.getByRole('complementary', { name: 'ledger' });
  await expect(ledger).toContainText('triode');
  await page.getByRole('radio', { name: 'reversed' }).check();
  await expect(ledger).toContainText('cutoff');
  await page.getByRole('radio', { name: 'right' }).check();
  await expect(ledger).toContainText('triode');
});

test('the same figures stand in a table for a screen reader', async ({ page }) => {
  const table = page.getByRole('table', { name: /^Readings/ });
  await expect(table.getByRole('row').filter({ hasText: 'Q1 drain' })).toContainText(/\d V/);
});

for (const theme of ['light', 'dark'] as const) {
  test(`nothing in the ${theme} page is out of reach of a person with a disability, by the checker's rules`, async ({
    page,
  }) => {
    await page.emulateMedia({ colorScheme: theme });
    const links = page.getByRole('navigation', { name: 'examples' }).getByRole('link');
    for (const name of ['echo-preamplifier', 'battery-polarity']) {
      await page.goto(`#${name}`);
      await expect(links.and(page.locator('[aria-current]'))).toHaveAttribute('href', `#${name}`);
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations).toEqual([]);
    }
  });
}

test('the theme follows the system until a person chooses one, and the choice is kept', async ({ page }) => {
  const ground = () => page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);
  await page.emulateMedia({ colorScheme: 'light' });
  const light = await ground();
  await expect.poll(() => isPainted(page)).toBe(true);
  const lightInk = await inkOf(page);
  await page.emulateMedia({ colorScheme: 'dark' });
  await expect.poll(ground).not.toBe(light);
  await expect.poll(() => inkOf(page)).not.toBe(lightInk);

  await page.getByRole('radio', { name: 'light' }).check();
  await expect.poll(ground).toBe(light);
  await expect.poll(() => inkOf(page)).toBe(lightInk);
  await page.reload();
  await expect(page.getByRole('radio', { name: 'light' })).toBeChecked();
  await expect.poll(ground).toBe(light);
});

test('every choice is reached with the keyboard and shows where the focus is', async ({ page }) => {
  const ring = () =>
    page.evaluate(() => {
      const focused = document.activeElement;
      const shown = focused?.closest('label') ?? focused;
      if (!focused || !shown || focused === document.body) return undefined;
      const { outlineStyle, outlineWidth } = getComputedStyle(shown);
      return {
        what: focused.getAttribute('name') ?? focused.getAttribute('href') ?? shown.id,
        outlineStyle,
        outlineWidth,
      };
    });
  const visited: string[] = [];
  for (let presses = 0; presses < 40; presses += 1) {
    await page.keyboard.press('Tab');
    const focus = await ring();
    if (focus === undefined) break;
    expect(focus, focus.what).toMatchObject({ outlineStyle: 'solid', outlineWidth: '2px' });
    visited.push(focus.what);
  }
  const links = await page.getByRole('navigation', { name: 'examples' }).getByRole('link').all();
  for (const link of links) expect(visited).toContain(await link.getAttribute('href'));
  expect(visited).toEqual(expect.arrayContaining(['state', 'theme', 'sheet']));
});

test('an example is chosen with Enter, a state with an arrow key', async ({ page }) => {
  await page.locator('a[href="#battery-polarity"]').focus();
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Battery polarity protection');
  await page.getByRole('radio', { name: 'right' }).focus();
  await page.keyboard.press('ArrowRight');
  await expect(page.getByRole('radio', { name: 'reversed' })).toBeChecked();
});

for (const [width, height] of [
  [1280, 720],
  [1440, 900],
  [2560, 1440],
] as const) {
  test(`at ${width}×${height} nothing is cut off: the page does not scroll and the stage is all in sight`, async ({
    page,
  }) => {
    await page.setViewportSize({ width, height });
    const overflow = await page.evaluate(() => {
      const { scrollWidth, scrollHeight, clientWidth, clientHeight } = document.documentElement;
      return { x: scrollWidth - clientWidth, y: scrollHeight - clientHeight };
    });
    expect(overflow).toEqual({ x: 0, y: 0 });
    await expect.poll(() => isPainted(page)).toBe(true);
    const { ink, sheet } = await inkBox(page);
    // Between the ticks at the edges.
    const ticks = 10;
    expect(ink.left).toBeGreaterThan(ticks);
    expect(ink.top).toBeGreaterThan(ticks);
    expect(ink.right).toBeLessThan(sheet.width - ticks);
    expect(ink.bottom).toBeLessThan(sheet.height - ticks);
    // As large as there is room for, or at 100 %.
    const percent = Number.parseInt(
      await page.getByRole('button', { name: /back to 100 %/ }).innerText(),
      10,
    );
    const room = (ink.right - ink.left) / sheet.width + (ink.bottom - ink.top) / sheet.height;
    if (percent < 100) expect(room).toBeGreaterThan(0.8);
    else expect(percent).toBe(100);
  });
}
