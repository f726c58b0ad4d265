import { execFileSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { chromium } from '@playwright/test';

const SYSTEM = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome', '/usr/bin/google-chrome-stable'];

/** A Chromium that is on this machine: the one named by LEEBOARD_CHROMIUM, the system's, or Playwright's own; null when there is none. */
export function findChromium(): string | null {
  const named = process.env.LEEBOARD_CHROMIUM;
  if (named) {
    if (!existsSync(named)) throw new Error(`LEEBOARD_CHROMIUM names ${named}, which is not there`);
    return named;
  }
  return [...SYSTEM, chromium.executablePath()].find((path) => existsSync(path)) ?? null;
}

/** Finds a Chromium, or installs one: by the package manager where this is root on Debian, else by Playwright. Throws one line. */
export function ensureChromium(): string {
  const found = findChromium();
  if (found) return found;
  const quiet = { stdio: 'ignore' } as const;
  const ways: (() => void)[] = [];
  if (process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    ways.push(() => {
      console.log('Installing Chromium with apt-get.');
      execFileSync('apt-get', ['update'], quiet);
      execFileSync('apt-get', ['install', '-y', '--no-install-recommends', 'chromium'], { ...quiet, env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } });
    });
  }
  ways.push(() => {
    console.log('Installing Chromium with Playwright.');
    execFileSync('node_modules/.bin/playwright', ['install', 'chromium'], quiet);
  });
  for (const install of ways) {
    try {
      install();
    } catch {
      continue;
    }
    const installed = findChromium();
    if (installed) return installed;
  }
  throw new Error('no Chromium for the browser tests: install the package chromium, or set LEEBOARD_CHROMIUM to one');
}
