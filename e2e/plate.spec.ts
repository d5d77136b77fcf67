import { AxeBuilder } from '@axe-core/playwright';
import { expect, test } from './page.ts';

test('the page opens on the first example with its readings', async ({ page }) => {
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Echo preamplifier, gauge 14');
  await expect(page.getByTestId('plate').locator('svg')).toBeVisible();
  await expect(page.getByTestId('plate')).toContainText('saturation');
  await expect(page.getByText(/settled in \d+ steps?/)).toBeVisible();
});

test('every example can be chosen and shows its own plate and readings', async ({ page }) => {
  const links = page.getByRole('navigation', { name: 'examples' }).getByRole('link');
  const titles = await links.allTextContents();
  expect(titles.length).toBeGreaterThanOrEqual(10);
  for (const title of titles) {
    await links.filter({ hasText: new RegExp(`^${title}$`) }).click();
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(title);
    await expect(page.getByText(/settled in \d+ steps?/)).toBeVisible();
    await expect(page.getByTestId('plate').locator('svg')).toContainText(title);
  }
});

test('the state of the equipment changes the readings', async ({ page }) => {
  await page.goto('#battery-polarity');
  const plate = page.getByTestId('plate');
  await expect(plate).toContainText('triode');
  await page.getByRole('radio', { name: 'reversed' }).check();
  await expect(plate).toContainText('cutoff');
  await page.getByRole('radio', { name: 'right' }).check();
  await expect(plate).toContainText('triode');
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
  const plate = page.getByTestId('plate');
  const lightPlate = await plate.innerHTML();
  await page.emulateMedia({ colorScheme: 'dark' });
  await expect.poll(ground).not.toBe(light);
  await expect.poll(() => plate.innerHTML()).not.toBe(lightPlate);

  await page.getByRole('radio', { name: 'light' }).check();
  await expect.poll(ground).toBe(light);
  await expect.poll(() => plate.innerHTML()).toBe(lightPlate);
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
  test(`at ${width}×${height} nothing is cut off: the page does not scroll and the plate is all in sight`, async ({
    page,
  }) => {
    await page.setViewportSize({ width, height });
    const overflow = await page.evaluate(() => {
      const { scrollWidth, scrollHeight, clientWidth, clientHeight } = document.documentElement;
      return { x: scrollWidth - clientWidth, y: scrollHeight - clientHeight };
    });
    expect(overflow).toEqual({ x: 0, y: 0 });
    const svg = await page.getByTestId('plate').locator('svg').boundingBox();
    const sheet = await page.locator('#sheet').boundingBox();
    if (svg === null || sheet === null) throw new Error('The plate or the sheet is not on the page.');
    expect(svg.x).toBeGreaterThanOrEqual(sheet.x);
    expect(svg.y).toBeGreaterThanOrEqual(sheet.y);
    expect(svg.x + svg.width).toBeLessThanOrEqual(sheet.x + sheet.width);
    expect(svg.y + svg.height).toBeLessThanOrEqual(sheet.y + sheet.height);
    expect(svg.width / sheet.width + svg.height / sheet.height).toBeGreaterThan(0.8);
  });
}
