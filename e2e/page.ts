import { expect, test as base } from '@playwright/test';

export { expect };

/** Every test starts on the page, and fails when the page says anything on the console or throws. */
export const test = base.extend({
  page: async ({ page }, use) => {
    const complaints: string[] = [];
    page.on('console', (message) => {
      if (['error', 'warning'].includes(message.type())) complaints.push(message.text());
    });
    page.on('pageerror', (error) => complaints.push(error.message));
    await page.goto('');
    await use(page);
    expect(complaints).toEqual([]);
  },
});
