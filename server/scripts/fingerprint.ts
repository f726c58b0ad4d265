import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';

/** What a build is made from. The demo's data is read at run time. */
const INPUTS = ['app', 'lib', 'server', 'next.config.js', 'tsconfig.json', 'package-lock.json'];
const LEFT_OUT = new Set(['scripts']);

/** A hash over the content of everything a build is made from. */
export function fingerprint(): string {
  const hash = createHash('sha256');
  const add = (path: string): void => {
    if (statSync(path).isDirectory()) {
      for (const name of readdirSync(path).sort()) if (!LEFT_OUT.has(name)) add(join(path, name));
      return;
    }
    hash.update(path).update('\0').update(readFileSync(path)).update('\0');
  };
  INPUTS.forEach(add);
  return hash.digest('hex');
}
