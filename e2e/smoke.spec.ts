import { expect, test } from '@playwright/test';

test('the page opens as Gapwright and the browser complains of nothing', async ({ page }) => {
  const complaints: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(message.text());
  });
  page.on('pageerror', (error) => complaints.push(error.message));
  page.on('response', (response) => {
    if (response.status() >= 400) complaints.push(`${response.status()} ${response.url()}`);
  });

  await page.goto('/');

  await expect(page).toHaveTitle('Gapwright');
  await expect(page.locator('#root')).not.toBeEmpty();
  expect(complaints).toEqual([]);
});
