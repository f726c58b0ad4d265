import { expect } from '@playwright/test';
import type { Page } from '@playwright/test';

declare global {
  interface Window {
    /** When (ms since 1970) this screen first showed each revision. */
    shownAt?: Record<number, number>;
  }
}

const key = (): string => {
  const given = process.env['LEEBOARD_BOOTSTRAP_KEY'];
  if (!given) throw new Error('LEEBOARD_BOOTSTRAP_KEY is not set: the browser tests sign in with it.');
  return given;
};

/** Gives the page's browser a session, as the sign-in page does. */
export async function signIn(page: Page): Promise<void> {
  const answer = await page.request.post('/api/v1/sign-in', { data: { key: key() } });
  expect(answer.ok(), await answer.text()).toBe(true);
}

/** The board of the demo exercise, with its figures on the screen. */
export async function openDemo(page: Page): Promise<void> {
  await signIn(page);
  const { items } = (await (await page.request.get('/api/v1/events')).json()) as { items: { id: string; demo: boolean }[] };
  const demo = items.find((event) => event.demo);
  if (!demo) throw new Error('The demo exercise is not loaded.');
  await page.goto(`/events/${demo.id}`);
  await expect(page.locator('tbody tr[aria-rowindex]').first()).toBeVisible();
}

/** A page of an exercise made for one test, so that tests do not share advisories. */
export async function openNewEvent(page: Page, tab: string): Promise<void> {
  await signIn(page);
  const answer = await page.request.post('/api/v1/events', { data: { name: `Exercise ${Date.now()}`, timeZone: 'Etc/GMT+4', exercise: true } });
  const { id } = (await answer.json()) as { id: string };
  await page.goto(`/events/${id}/${tab}`);
  await expect(page.getByTestId('link')).toContainText('Live');
}

export const revisionOf = async (page: Page): Promise<number> => Number(await page.getByTestId('link').getAttribute('data-revision'));

/** From now on the page notes when it shows each revision. */
export async function watchRevisions(page: Page): Promise<void> {
  await page.evaluate(() => {
    const link = document.querySelector('[data-testid=link]')!;
    window.shownAt = {};
    new MutationObserver(() => {
      window.shownAt![Number(link.getAttribute('data-revision'))] ??= Date.now();
    }).observe(link, { attributes: true, attributeFilter: ['data-revision'] });
  });
}

/** A screen that stands, as those in a room do: map drawn, nothing being fetched, the page at rest for half a second. */
export async function settled(page: Page): Promise<void> {
  await expect(page.getByRole('application')).toHaveAttribute('data-drawing', 'ready');
  await page.waitForLoadState('networkidle');
  await page.evaluate(
    () =>
      new Promise<void>((resolve) => {
        let restingMs = 0;
        let before = performance.now();
        const look = (): void => {
          const now = performance.now();
          restingMs = now - before < 120 ? restingMs + (now - before) : 0;
          before = now;
          if (restingMs > 500) resolve();
          else setTimeout(look, 50);
        };
        look();
      }),
  );
}
