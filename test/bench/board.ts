import { gzipSync } from 'node:zlib';
import { newDataDir, removeDataDir, startServerProcess } from '../server/serverProcess';
import { row } from './report';
import type { Row } from './report';

/** JavaScript that the Board's page asks for, as sent (gzip) and as run. */
export async function benchBoard(): Promise<Row[]> {
  const server = await startServerProcess(newDataDir());
  try {
    const html = await (await server.get('/')).text();
    const scripts = [...new Set([...html.matchAll(/\/_next\/static\/[^"'\\ ]+\.js/g)].map(([path]) => path))];
    let raw = 0;
    let sent = 0;
    for (const path of scripts) {
      const bytes = new Uint8Array(await (await server.get(path)).arrayBuffer());
      raw += bytes.length;
      sent += gzipSync(bytes).length;
    }
    return [row(`JavaScript named by the page, ${scripts.length} files, run`, raw / 1000, 'kB'), row('JavaScript named by the page, gzip', sent / 1000, 'kB')];
  } finally {
    await server.end('SIGINT');
    removeDataDir(server.dataDir);
  }
}
