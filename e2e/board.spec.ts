import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import type { Page } from '@playwright/test';
import { openDemo, revisionOf, settled, signIn, watchRevisions } from './screens';

test.describe.configure({ mode: 'serial' });

test('the board of the exercise fills by itself', async ({ page }) => {
  await signIn(page);
  await page.goto('/');
  await expect(page).toHaveURL(/\/events\//);
  await expect(page.getByTestId('link')).toContainText('Live');
  await expect(page.getByRole('img', { name: /Exercise/ })).toBeVisible();
  await expect(page.locator('tbody tr[aria-rowindex]').first()).toBeVisible();
  await expect(page.getByRole('definition').first()).toHaveText(/\d/);
  await expect(page.getByText(/Water kills more people than wind/)).toBeVisible();
  await expect(page.getByRole('application', { name: /Map of the forecast/ })).toHaveAttribute('data-drawing', 'ready');
  await expect(page.getByText(/1-minute mean at 10 m.*revision \d+/)).toBeVisible();
});

test('pointing at a zone in the table lights it on the map and in the strip', async ({ page }) => {
  await openDemo(page);
  const row = page.locator('tbody tr[aria-rowindex="3"]');
  const name = await row.getByRole('button').innerText();
  await row.hover();
  await expect(row).toHaveAttribute('data-lit', 'true');
  await expect(page.locator('li[data-lit="true"]')).toContainText(name);
  await expect(page.locator('svg path[data-selected]')).toHaveCount(1);
});

test('the table sorts by keyboard and says how', async ({ page }) => {
  await openDemo(page);
  const people = page.getByRole('columnheader', { name: 'People' });
  await people.getByRole('button').focus();
  await page.keyboard.press('Enter');
  await expect(people).toHaveAttribute('aria-sort', 'descending');
  const counts = (await page.locator('tbody td[data-column="people"]').allInnerTexts()).map((text) => Number(text.replaceAll(',', '')));
  expect(counts.length).toBeGreaterThan(5);
  expect([...counts].sort((a, b) => b - a)).toEqual(counts);
});

test('the map moves by keyboard and is not made anew when the page changes', async ({ page }) => {
  await openDemo(page);
  const map = page.getByRole('application', { name: /Map of the forecast/ });
  await expect(map.locator('svg text').first()).toBeVisible();
  await page.evaluate(() => {
    document.querySelector('[role=application] canvas')!.setAttribute('data-first', 'yes');
  });
  const before = await map.locator('svg').innerHTML();
  await map.focus();
  await page.keyboard.press('ArrowRight');
  await expect.poll(() => map.locator('svg').innerHTML()).not.toBe(before);
  await page.getByRole('link', { name: 'Forecasts' }).click();
  await expect(page.getByRole('heading', { name: 'Forecasts' })).toBeVisible();
  await page.getByRole('link', { name: 'Log' }).click();
  await page.getByRole('link', { name: 'Board' }).click();
  await expect(page.locator('[role=application] canvas[data-first="yes"]')).toHaveCount(1);
});

for (const theme of ['light', 'dark'] as const) {
  test(`no serious accessibility fault on the board, ${theme}`, async ({ page }) => {
    await page.emulateMedia({ colorScheme: theme });
    await openDemo(page);
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations.filter(({ impact }) => impact === 'serious' || impact === 'critical').map(({ id, nodes }) => `${id}: ${nodes[0].html}`)).toEqual([]);
  });
}

test('on a phone nothing scrolls sideways and the next deadlines come first', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await openDemo(page);
  await expect(page.getByRole('heading', { name: 'Next deadlines' })).toBeVisible();
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
});

test('the board loads at most 1.9 MB of JavaScript, unpacked', async ({ page }) => {
  const sizes: Promise<number>[] = [];
  page.on('response', (response) => {
    if (new URL(response.url()).pathname.endsWith('.js')) sizes.push(response.body().then((body) => body.length));
  });
  await openDemo(page);
  await expect(page.getByRole('application')).toHaveAttribute('data-drawing', 'ready');
  const total = (await Promise.all(sizes)).reduce((sum, size) => sum + size, 0);
  test.info().annotations.push({ type: 'JavaScript of the board, bytes', description: String(total) });
  expect(total).toBeGreaterThan(100_000);
  expect(total).toBeLessThan(1_900_000);
});

async function nextAdvisory(page: Page): Promise<void> {
  const before = await revisionOf(page);
  await page.getByRole('button', { name: 'Next advisory' }).click();
  await expect.poll(() => revisionOf(page), { timeout: 60_000 }).toBeGreaterThan(before);
}

test('two screens show the same revision within a second of each other', async ({ browser }) => {
  const [one, two] = await Promise.all([browser.newContext(), browser.newContext()]);
  const [first, second] = [await one.newPage(), await two.newPage()];
  await openDemo(first);
  await openDemo(second);
  await Promise.all([settled(first), settled(second)]);
  await Promise.all([watchRevisions(first), watchRevisions(second)]);
  await nextAdvisory(first);
  const revision = await revisionOf(first);
  await expect.poll(() => revisionOf(second)).toBeGreaterThanOrEqual(revision);
  const shownAt = (page: Page): Promise<number> => page.evaluate((wanted) => window.shownAt![wanted], revision);
  expect(Math.abs((await shownAt(first)) - (await shownAt(second)))).toBeLessThan(1000);
  await Promise.all([one.close(), two.close()]);
});

test('a screen that was offline for three advisories catches up by itself', async ({ browser }) => {
  const [near, away] = await Promise.all([browser.newContext(), browser.newContext()]);
  const [nearPage, awayPage] = [await near.newPage(), await away.newPage()];
  await openDemo(nearPage);
  await openDemo(awayPage);
  const held = await revisionOf(awayPage);
  await away.setOffline(true);
  await expect(awayPage.getByTestId('link')).toContainText('Reconnecting');
  for (let i = 0; i < 3; i++) await nextAdvisory(nearPage);
  expect(await revisionOf(awayPage)).toBe(held);
  await away.setOffline(false);
  await expect(awayPage.getByTestId('link')).toContainText('Live');
  await expect.poll(async () => (await revisionOf(awayPage)) === (await revisionOf(nearPage)), { timeout: 60_000 }).toBe(true);
  const number = (page: Page): Promise<string> => page.locator('header strong', { hasText: /^Advisory/ }).innerText();
  await expect.poll(async () => (await number(awayPage)) === (await number(nearPage))).toBe(true);
  await Promise.all([near.close(), away.close()]);
});
