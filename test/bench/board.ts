import { gzipSync } from 'node:zlib';
import { chromium } from '@playwright/test';
import { ensureChromium } from '../../server/scripts/chromium';
import { newDataDir, removeDataDir, startServerProcess } from '../server/serverProcess';
import { row } from './report';
import type { Row } from './report';

const DRAWN_WITHOUT_A_GRAPHICS_CARD = ['--no-sandbox', '--disable-gpu', '--use-angle=swiftshader', '--enable-unsafe-swiftshader', '--disable-background-networking', '--no-first-run'];

/** What the Board of the exercise loads, and how soon it stands, in a headless Chromium that draws in software. */
export async function benchBoard(): Promise<Row[]> {
  const server = await startServerProcess(newDataDir(), { LEEBOARD_MEMBERS: '50' });
  const browser = await chromium.launch({ executablePath: ensureChromium(), args: DRAWN_WITHOUT_A_GRAPHICS_CARD });
  try {
    const context = await browser.newContext({ viewport: { width: 1920, height: 1080 } });
    await context.request.post(`${server.url}/api/v1/sign-in`, { data: { key: server.key } });
    const events = (await (await server.get('/api/v1/events')).json()) as { items: { id: string }[] };
    const page = await context.newPage();
    const scripts: Promise<Buffer>[] = [];
    page.on('response', (response) => {
      if (new URL(response.url()).pathname.endsWith('.js')) scripts.push(response.body());
    });
    const started = performance.now();
    await page.goto(`${server.url}/events/${events.items[0].id}`);
    await page.locator('tbody tr[aria-rowindex]').first().waitFor();
    const table = performance.now() - started;
    await page.locator('[role=application][data-drawing=ready]').waitFor();
    const map = performance.now() - started;
    await page.waitForLoadState('networkidle');
    const bodies = await Promise.all(scripts);
    const sum = (sizes: number[]): number => sizes.reduce((total, size) => total + size, 0);
    return [
      row(`JavaScript the Board loads, ${bodies.length} files, run`, sum(bodies.map((body) => body.length)) / 1000, 'kB'),
      row('JavaScript the Board loads, gzip', sum(bodies.map((body) => gzipSync(body).length)) / 1000, 'kB'),
      row('zone table on the screen (software drawing)', table, 'ms'),
      row('map on the screen (software drawing)', map, 'ms'),
    ];
  } finally {
    await browser.close();
    await server.end('SIGINT');
    removeDataDir(server.dataDir);
  }
}
