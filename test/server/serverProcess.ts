import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const KEY = 'process-key-process-key-process';

/** The built server as a process of its own. */
export interface ServerProcess {
  url: string;
  key: string;
  dataDir: string;
  /** What it has printed so far. */
  printed(): string;
  get(path: string): Promise<Response>;
  post(path: string, body: string, contentType: string): Promise<Response>;
  /** Sends a signal and answers the exit code, null where the signal itself ended the process. */
  end(signal: 'SIGINT' | 'SIGTERM' | 'SIGKILL'): Promise<number | null>;
}

const freePort = (): Promise<number> =>
  new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as { port: number };
      probe.close(() => resolve(port));
    });
  });

export const newDataDir = (): string => mkdtempSync(join(tmpdir(), 'leeboard-process-'));
export const removeDataDir = (dataDir: string): void => rmSync(dataDir, { recursive: true, force: true });

/** Starts it on a free port and waits until it answers. The project must have been built. */
export async function startServerProcess(dataDir: string, env: Record<string, string> = {}): Promise<ServerProcess> {
  const port = await freePort();
  const child = spawn(process.execPath, ['dist/server/main.js'], {
    env: { ...process.env, NODE_ENV: 'production', LEEBOARD_PORT: String(port), LEEBOARD_DATA_DIR: dataDir, LEEBOARD_BOOTSTRAP_KEY: KEY, LEEBOARD_LOG_LEVEL: 'warn', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let printed = '';
  child.stdout.on('data', (text: Buffer) => (printed += text.toString()));
  child.stderr.on('data', (text: Buffer) => (printed += text.toString()));
  const ended = new Promise<number | null>((resolve) => child.once('exit', (code) => resolve(code)));
  const url = `http://127.0.0.1:${port}`;
  const headers = { authorization: `Bearer ${KEY}` };
  for (let attempt = 0; ; attempt++) {
    const answer = await fetch(`${url}/api/v1/health`).catch(() => null);
    if (answer?.ok) break;
    if (attempt > 600 || child.exitCode !== null) throw new Error(`The server did not start: ${printed}`);
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  return {
    url,
    key: KEY,
    dataDir,
    printed: () => printed,
    get: (path) => fetch(url + path, { headers }),
    post: (path, body, contentType) => fetch(url + path, { method: 'POST', headers: { ...headers, 'content-type': contentType }, body }),
    end(signal) {
      child.kill(signal);
      return ended;
    },
  };
}
