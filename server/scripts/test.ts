import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { ensureChromium } from './chromium';
import { bin, run } from './run';

interface Outcome {
  passed: number;
  failed: number;
}

const UNIT_REPORT = 'test-results/unit.json';
const BROWSER_REPORT = 'test-results/browser.json';

/** A check that passes or fails as one. */
async function check(name: string, command: string, args: string[]): Promise<Outcome> {
  console.log(`\n== ${name}`);
  return (await run(command, args)) === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

/** A suite that writes what it counted; one that ends badly without counting a failure is one failure. */
async function suite(name: string, report: string, command: string, args: string[], env: Record<string, string>, count: (report: never) => Outcome): Promise<Outcome> {
  console.log(`\n== ${name}`);
  rmSync(report, { force: true });
  const code = await run(command, args, env);
  const counted = existsSync(report) ? count(JSON.parse(readFileSync(report, 'utf8')) as never) : { passed: 0, failed: 0 };
  const nothing = counted.passed + counted.failed === 0;
  return { passed: counted.passed, failed: counted.failed + (nothing || (code !== 0 && counted.failed === 0) ? 1 : 0) };
}

mkdirSync('test-results', { recursive: true });
const outcomes = [
  await check('lint', bin('eslint'), ['.', '--max-warnings', '0']),
  await check('types', bin('tsc'), ['--noEmit']),
  await check('unused code and packages', bin('knip'), []),
  await suite('unit and integration', UNIT_REPORT, bin('vitest'), ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${UNIT_REPORT}`], {}, (report: { numPassedTests: number; numFailedTests: number; numPendingTests: number }) => ({
    passed: report.numPassedTests,
    // A skipped test has not passed.
    failed: report.numFailedTests + report.numPendingTests,
  })),
];
try {
  const chromium = ensureChromium();
  outcomes.push(
    await suite('browser', BROWSER_REPORT, bin('playwright'), ['test'], { LEEBOARD_CHROMIUM: chromium }, (report: { stats: { expected: number; unexpected: number; flaky: number; skipped: number } }) => ({
      passed: report.stats.expected,
      failed: report.stats.unexpected + report.stats.flaky + report.stats.skipped,
    })),
  );
} catch (error) {
  console.error((error as Error).message);
  outcomes.push({ passed: 0, failed: 1 });
}

const passed = outcomes.reduce((sum, outcome) => sum + outcome.passed, 0);
const failed = outcomes.reduce((sum, outcome) => sum + outcome.failed, 0);
console.log(`\n${passed} passed, ${failed} failed`);
process.exitCode = failed === 0 ? 0 : 1;
