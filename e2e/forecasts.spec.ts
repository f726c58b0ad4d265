import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { openNewEvent } from './screens';

const BULLETIN = 'test/fixtures/bulletins/al102017.fstadv.004.txt';

test('a real bulletin is read, looked at and issued', async ({ page }) => {
  await openNewEvent(page, 'forecasts');
  await page.locator('input[type=file]').setInputFiles(BULLETIN);
  const reading = page.getByTestId('reading');
  await expect(reading).toContainText('forecast/advisory bulletin');
  // The bulletin's own first line of position: 31.4N 80.3W, 30 kt.
  await expect(reading.getByRole('row').nth(1)).toContainText('31.4 N 80.3 W');
  await expect(page.getByText('Preview: not issued')).toBeVisible();
  await reading.getByRole('button', { name: /^Issue advisory 4/ }).click();
  await expect(page.getByText('Advisory 4 is issued')).toBeVisible();
  await expect(page.getByRole('region', { name: 'History' }).getByRole('row').nth(1)).toContainText('forecast/advisory bulletin');
  await expect(page.locator('header')).toContainText('Advisory 4');
});

test('a file that cannot be read says the line and column and shows the line', async ({ page }) => {
  await openNewEvent(page, 'forecasts');
  const body = 'validAt,lat,lon,maxWindKt\n2031-09-19T09:00:00Z,23,-50,80\n2031-09-19T15:00:00Z,24,-51,abc\n';
  await page.locator('input[type=file]').setInputFiles({ name: 'points.csv', mimeType: 'text/csv', buffer: Buffer.from(body) });
  const alert = page.getByRole('alert').filter({ hasText: 'This cannot be read' });
  await expect(alert).toContainText('Line 3, column 29');
  await expect(alert.locator('pre')).toContainText('2031-09-19T15:00:00Z,24,-51,abc');
  await expect(page.getByText('No advisory yet.')).toBeVisible();
});

test('an empty file and one past the limit are refused before anything is sent', async ({ page }) => {
  await openNewEvent(page, 'forecasts');
  let sent = 0;
  page.on('request', (request) => (sent += request.method() === 'POST' && request.url().includes('/advisories') ? 1 : 0));
  await page.locator('input[type=file]').setInputFiles({ name: 'nothing.txt', mimeType: 'text/plain', buffer: Buffer.alloc(0) });
  await expect(page.getByRole('alert').filter({ hasText: 'The file is empty' })).toBeVisible();
  await page.locator('input[type=file]').setInputFiles({ name: 'large.txt', mimeType: 'text/plain', buffer: Buffer.alloc(9 * 1024 * 1024, 65) });
  await expect(page.getByRole('alert').filter({ hasText: /at most/ })).toBeVisible();
  expect(sent).toBe(0);
});

test('a photo renamed to .txt gets a clear answer', async ({ page }) => {
  await openNewEvent(page, 'forecasts');
  const jpeg = Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 0x10, 0x4a, 0x46, 0x49, 0x46, 0, 1, 1, 0, 0, 1]);
  await page.locator('input[type=file]').setInputFiles({ name: 'advisory.txt', mimeType: 'text/plain', buffer: jpeg });
  await expect(page.getByRole('alert').filter({ hasText: 'This cannot be read' })).toContainText(/JPEG/);
});

test('an advisory typed by hand shows each error in its cell, then is issued', async ({ page }) => {
  await openNewEvent(page, 'forecasts');
  await page.getByRole('button', { name: 'Type it in' }).click();
  await page.getByLabel('Storm', { exact: true }).fill('Tessel');
  await page.getByLabel('Number').fill('1');
  await page.getByLabel('Issuing centre').fill('Duty forecaster');
  await page.getByLabel('Issued, UTC').fill('2031-09-19 09:00');
  const rows = [
    ['2031-09-19 09:00', '95', '-50', '80'],
    ['2031-09-19 21:00', '25', '-51.5', '85'],
  ];
  for (const [i, row] of rows.entries())
    for (const [j, column] of ['Valid at, UTC', 'Lat', 'Lon', 'Wind kt'].entries()) await page.getByLabel(`${column}, point ${i + 1}`).fill(row[j]);
  await page.getByRole('button', { name: 'Check it' }).click();
  await expect(page.getByLabel('Lat, point 1')).toHaveAttribute('aria-invalid', 'true');
  await page.getByLabel('Lat, point 1').fill('23.5');
  await page.getByRole('button', { name: 'Check it' }).click();
  await page.getByRole('button', { name: 'Issue advisory 1' }).click();
  await expect(page.getByText('Advisory 1 is issued')).toBeVisible();
});

test('a name with markup in it is shown as it is written', async ({ page }) => {
  await openNewEvent(page, 'forecasts');
  const name = '<img src=x onerror=document.title="taken">';
  const body = `stormName,number,centre,issuedAt,validAt,lat,lon,maxWindKt\n"${name.replaceAll('"', '""')}",1,Desk,2031-09-19T09:00:00Z,2031-09-19T09:00:00Z,23,-50,80\n`;
  await page.locator('input[type=file]').setInputFiles({ name: 'points.csv', mimeType: 'text/csv', buffer: Buffer.from(body) });
  await expect(page.getByTestId('reading')).toContainText('<img src=x');
  expect(await page.title()).not.toBe('taken');
});

for (const theme of ['light', 'dark'] as const) {
  test(`no serious accessibility fault on the forecasts page, ${theme}`, async ({ page }) => {
    await page.emulateMedia({ colorScheme: theme });
    await openNewEvent(page, 'forecasts');
    await page.locator('input[type=file]').setInputFiles(BULLETIN);
    await expect(page.getByTestId('reading')).toBeVisible();
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations.filter(({ impact }) => impact === 'serious' || impact === 'critical').map(({ id, nodes }) => `${id}: ${nodes[0].html}`)).toEqual([]);
  });
}
