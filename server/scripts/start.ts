import { resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { readSettings } from '../settings';
import { buildAll, isBuilt } from './buildAll';

try {
  // A bad setting is told before a build is waited for.
  readSettings(process.env);
  if (!isBuilt()) {
    console.log('Building Leeboard: the first time, and after changes.');
    await buildAll();
  }
} catch (error) {
  console.error(`Leeboard did not start: ${(error as Error).message}`);
  process.exit(1);
}
Object.assign(process.env, { NODE_ENV: 'production' });
await import(pathToFileURL(resolve('dist/server/main.js')).href);
