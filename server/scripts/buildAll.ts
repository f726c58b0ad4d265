import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { build } from 'esbuild';
import { fingerprint } from './fingerprint';
import { bin, run } from './run';

const STAMP = 'dist/build.json';

/** Whether pages and server were built from the files as they are now. */
export function isBuilt(): boolean {
  if (!existsSync(STAMP) || !existsSync('.next/BUILD_ID')) return false;
  return (JSON.parse(readFileSync(STAMP, 'utf8')) as { fingerprint?: string }).fingerprint === fingerprint();
}

/** Builds pages (Next) and the server with its compute thread (esbuild; packages stay in node_modules). Throws when either fails. */
export async function buildAll(): Promise<void> {
  rmSync(STAMP, { force: true });
  const code = await run(bin('next'), ['build']);
  if (code !== 0) throw new Error(`the pages did not build (next build ended with ${code})`);
  await build({
    entryPoints: { main: 'server/main.ts', worker: 'server/compute/worker.ts' },
    outdir: 'dist/server',
    bundle: true,
    packages: 'external',
    platform: 'node',
    target: 'node20',
    format: 'esm',
    sourcemap: true,
    logLevel: 'warning',
  });
  mkdirSync('dist', { recursive: true });
  writeFileSync(STAMP, JSON.stringify({ fingerprint: fingerprint(), at: new Date().toISOString() }));
}
