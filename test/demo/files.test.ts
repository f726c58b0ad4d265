import { readdirSync } from 'node:fs';
import { expect, test } from 'vitest';
import { demoFiles } from '../../server/demo/demoFiles';
import { folder, textOf } from './shipped';

const made = demoFiles();

test('the files that ship are those the maker makes, byte for byte', () => {
  for (const [path, text] of made) expect(textOf(path) === text, path).toBe(true);
});

test('nothing else ships beside them', () => {
  const shipped = readdirSync(folder, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile());
  expect(shipped).toHaveLength(made.size);
});

test('together they are less than 10 MB', () => {
  expect([...made.values()].reduce((sum, text) => sum + Buffer.byteLength(text), 0)).toBeLessThan(10e6);
});
