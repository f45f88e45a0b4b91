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

test('hints lie on the drawing at a first visit, and end when another sketch is opened', async ({ page }) => {
  await page.goto('/');
  const hints = page.getByRole('complementary', { name: 'Hints' });
  await expect(hints.getByText('Drag a part along the axis')).toBeVisible();
  await page.getByTitle(/sketches on the shelf$/).click();
  await page.getByRole('button', { name: 'Sorting-chute relay' }).click();
  await expect(page.getByTitle('Sorting-chute relay: sketches on the shelf')).toBeVisible();
  await expect(hints).toBeHidden();
});
