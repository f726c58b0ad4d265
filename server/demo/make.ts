import { mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { demoFiles } from './demoFiles';

/** Writes the demo's files to `public/demo`: `npm run demo:make`. */
const folder = fileURLToPath(new URL('../../public/demo/', import.meta.url));
let bytes = 0;
for (const [path, text] of demoFiles()) {
  const file = join(folder, path);
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, text);
  bytes += Buffer.byteLength(text);
}
console.log(`${folder}: ${(bytes / 1e6).toFixed(1)} MB`);
