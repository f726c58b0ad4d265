import { ESLint } from 'eslint';
import { beforeAll, describe, expect, test } from 'vitest';

const BOUNDARY = 'boundaries/dependencies';
let eslint: ESLint;

beforeAll(() => {
  eslint = new ESLint({ cwd: new URL('..', import.meta.url).pathname });
});

/** The rules that a file with this import breaks. */
async function broken(filePath: string, importLine: string): Promise<string[]> {
  const [result] = await eslint.lintText(`${importLine}\nexport const used = thing;\n`, { filePath });
  return result.messages.map(({ ruleId, message }) => ruleId ?? message);
}

describe('a wrong import fails the lint', () => {
  test.each([
    ['lib/geo/probe.ts', '../wind', 'an earlier folder of lib from a later one'],
    ['lib/units/probe.ts', '../geo', 'the first folder from any other'],
    ['lib/track/probe.ts', '../hazard', 'across several folders'],
    ['lib/wind/probe.ts', '../geo/sphere', 'past the door of an earlier folder'],
    ['lib/impact/probe.ts', '../../server/settings', 'lib from server'],
    ['app/board/probe.ts', '../../server/settings', 'app from server'],
    ['app/board/probe.ts', '../../lib/wind/inflow', 'app past the door of lib'],
    ['server/http/probe.ts', '../../app/http/api', 'server from app'],
  ])('%s importing %s: %s', async (file, source) => {
    expect(await broken(file, `import { thing } from '${source}';`)).toContain(BOUNDARY);
  });

  test('types are no exception', async () => {
    const [result] = await eslint.lintText(`import type { QuadrantProfiles } from '../wind';\nexport type Probe = QuadrantProfiles;\n`, { filePath: 'lib/geo/probe.ts' });
    expect(result.messages.map(({ ruleId }) => ruleId)).toContain(BOUNDARY);
  });

  test('a re-export is an import', async () => {
    const [result] = await eslint.lintText(`export * from '../wind';\n`, { filePath: 'lib/geo/probe.ts' });
    expect(result.messages.map(({ ruleId }) => ruleId)).toContain(BOUNDARY);
  });
});

describe('a right import passes', () => {
  test.each([
    ['lib/wind/probe.ts', '../geo', 'a later folder from an earlier one'],
    ['lib/wind/probe.ts', './inflow', 'within a folder'],
    ['lib/geo/probe.ts', '@turf/turf', 'a package'],
    ['app/board/probe.ts', '../../lib/units', 'app from lib'],
    ['server/http/probe.ts', '../../lib/wire', 'server from lib'],
  ])('%s importing %s: %s', async (file, source) => {
    expect(await broken(file, `import { thing } from '${source}';`)).toEqual([]);
  });
});

describe('the core is pure', () => {
  test.each([
    [`import { readFileSync as thing } from 'node:fs';`, 'no-restricted-imports'],
    [`const thing = Math.random();`, 'no-restricted-properties'],
    [`const thing = Date.now();`, 'no-restricted-properties'],
    [`const thing = process.env;`, 'no-restricted-globals'],
  ])('%s breaks %s', async (line, rule) => {
    expect(await broken('lib/wind/probe.ts', line)).toContain(rule);
  });
});
