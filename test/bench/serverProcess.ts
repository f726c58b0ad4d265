import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const KEY = 'bench-key-bench-key-bench-key';

/** The built server as a process of its own, with a data folder of its own. */
export interface ServerProcess {
  url: string;
  key: string;
  get(path: string): Promise<Response>;
  post(path: string, body: string, contentType: string): Promise<Response>;
  stop(): Promise<void>;
}

const freePort = (): Promise<number> =>
  new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as { port: number };
      probe.close(() => resolve(port));
    });
  });

export async function startServerProcess(env: Record<string, string> = {}): Promise<ServerProcess> {
  const port = await freePort();
  const dataDir = mkdtempSync(join(tmpdir(), 'leeboard-bench-'));
  const child = spawn(process.execPath, ['dist/server/main.js'], {
    env: { ...process.env, NODE_ENV: 'production', LEEBOARD_PORT: String(port), LEEBOARD_DATA_DIR: dataDir, LEEBOARD_BOOTSTRAP_KEY: KEY, LEEBOARD_LOG_LEVEL: 'warn', ...env },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  const url = `http://127.0.0.1:${port}`;
  const headers = { authorization: `Bearer ${KEY}` };
  const get = (path: string): Promise<Response> => fetch(url + path, { headers });
  for (let attempt = 0; ; attempt++) {
    const answer = await fetch(`${url}/api/v1/health`).catch(() => null);
    if (answer?.ok) break;
    if (attempt > 300 || child.exitCode !== null) throw new Error('The server did not start; build it with npm run build.');
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  return {
    url,
    key: KEY,
    get,
    post: (path, body, contentType) => fetch(url + path, { method: 'POST', headers: { ...headers, 'content-type': contentType }, body }),
    async stop() {
      child.kill('SIGINT');
      await ended;
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
