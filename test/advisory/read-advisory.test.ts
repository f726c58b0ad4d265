import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { FORMATS, advisorySchema, decodeText, readAdvisory } from '../../lib/advisory';
import { bulletin, errorsOf, namesIn, read, textOf } from './fixtures';
import type { Reading } from '../../lib/advisory';

describe('what no reader can take', () => {
  test('an empty file', () => expect(readAdvisory('')).toEqual({ ok: false, format: null, errors: [{ message: 'the file is empty: nothing to read' }] }));
  test('a file of blanks', () => expect(errorsOf(' \n\t')[0]!.message).toContain('empty'));
  test('prose gets a list of what is read', () => expect(errorsOf('Dear all,\nthe storm is near.')[0]).toMatchObject({ line: 1, message: expect.stringMatching(/text bulletin.*deck.*CSV.*GeoJSON.*JSON/) as string }));
  test('a form that the file is not, if asked for, fails with that form’s own words', () => expect(readAdvisory(bulletin(), { format: 'deck' })).toMatchObject({ ok: false, format: 'deck', errors: { 0: { line: 1, message: expect.stringContaining('is no basin') as string } } }));
});

test('the form that was read is told', () => {
  expect(readAdvisory(bulletin())).toMatchObject({ ok: true, format: 'bulletin' });
  expect(readAdvisory(textOf('decks', 'wp172023-jtwc'))).toMatchObject({ ok: true, format: 'deck' });
});

test('a byte order mark is not part of the text', () => {
  expect(read(`\ufeff${bulletin()}`).advisory).toEqual(read(bulletin()).advisory);
});

/** Whatever comes in, an answer comes out: an advisory within the model’s bounds, or errors that say something. */
function answered(reading: Reading): void {
  if (reading.ok) {
    expect(advisorySchema.safeParse(reading.advisory).success).toBe(true);
    for (const warning of reading.warnings) expect(warning.code).toMatch(/^[a-z][a-z-]+$/);
  } else {
    expect(reading.errors.length).toBeGreaterThan(0);
    for (const { message, line, column } of reading.errors) {
      expect(message.length).toBeGreaterThan(8);
      expect(line ?? 1).toBeGreaterThan(0);
      expect(column ?? 1).toBeGreaterThan(0);
    }
  }
}

const CSV = 'validAt,lat,lon,maxWindKt,r34NeNm,r34SeNm,r34SwNm,r34NwNm,stormName\n2031-09-19T09:00Z,24.1,-55.2,70,120,90,60,100,Maro\n2031-09-19T18:00Z,24.9,-56.2,80,,,,,\n';
const POINTS = '{"type":"FeatureCollection","features":[{"type":"Feature","geometry":{"type":"Point","coordinates":[-55.2,24.1]},"properties":{"validAt":"2031-09-19T09:00Z","maxWindKt":70,"radiiNm":{"34":{"ne":1,"se":2,"sw":3,"nw":4}}}}]}';
const LINE = '{"type":"Feature","geometry":{"type":"LineString","coordinates":[[-55.2,24.1],[-56,25]]},"properties":{"times":["2031-09-19T09:00Z","2031-09-19T15:00Z"],"maxWindKt":[70,80]}}';
const JSON_TEXT = '{"storm":{"name":"Maro"},"number":"5","centre":"C","issuedAt":"2031-09-19T09:00:00Z","averaging":"1-min","points":[{"validAt":"2031-09-19T09:00:00Z","lat":24.1,"lon":-55.2,"maxWindKt":70,"radiiNm":{"34":{"ne":1,"se":2,"sw":3,"nw":4}}}]}';
const good = fc.constantFrom(...namesIn('bulletins').map((name) => textOf('bulletins', name)), ...namesIn('decks').map((name) => textOf('decks', name)), CSV, POINTS, LINE, JSON_TEXT);
const options = fc.record({ format: fc.option(fc.constantFrom(...FORMATS), { nil: undefined }), technique: fc.option(fc.constantFrom('OFCL', 'x', ''), { nil: undefined }), cycle: fc.option(fc.constantFrom('2026092512', 'x'), { nil: undefined }) }, { requiredKeys: [] }).map((given) => JSON.parse(JSON.stringify(given)) as Parameters<typeof readAdvisory>[1]);
const splice = fc.record({ at: fc.nat(3000), remove: fc.nat(40), insert: fc.oneof(fc.string({ maxLength: 12 }), fc.constantFrom('\n', ',', '"', '{', '}', '<pre>', '<script>', '99', '-', 'NaN', 'N', 'KT', 'FORECAST VALID ', '\u0000', '\ud800')) });

describe('no input is without an answer', () => {
  test('random text, in any form', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 400 }), options, (text, given) => answered(readAdvisory(text, given))), { numRuns: 500 });
  });

  test('random JSON, in any form', () => {
    fc.assert(fc.property(fc.json(), options, (text, given) => answered(readAdvisory(text, given))), { numRuns: 500 });
  });

  test('a good file cut anywhere', () => {
    fc.assert(fc.property(good, fc.nat(3000), options, (text, length, given) => answered(readAdvisory(text.slice(0, length % (text.length + 1)), given))), { numRuns: 500 });
  });

  test('a good file with pieces taken out and put in', () => {
    fc.assert(
      fc.property(good, fc.array(splice, { minLength: 1, maxLength: 6 }), (text, splices) => {
        const broken = splices.reduce((whole, { at, remove, insert }) => whole.slice(0, at % (whole.length + 1)) + insert + whole.slice((at % (whole.length + 1)) + remove), text);
        answered(readAdvisory(broken));
      }),
      { numRuns: 1500 },
    );
  });

  test('the lines of a good file in another order', () => {
    fc.assert(fc.property(good.chain((text) => fc.shuffledSubarray(text.split('\n'))), (lines) => answered(readAdvisory(lines.join('\n')))), { numRuns: 500 });
  });

  test('random bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 500 }), (bytes) => {
        const decoded = decodeText(bytes);
        if (decoded.ok) answered(readAdvisory(decoded.text));
        else expect(decoded.message.length).toBeGreaterThan(8);
      }),
      { numRuns: 500 },
    );
  });
});

describe('time grows with the size of the file, not faster', () => {
  const HEAD = `${bulletin().split('\nFORECAST')[0]}\n`;
  const repeated = (piece: string, length: number): string => piece.repeat(Math.ceil(length / piece.length));
  const NASTY: [string, string, string][] = [
    ['blanks in a line', 'HURRICANE', ' '],
    ['titles without a time', '', 'A FORECAST/ADVISORY NUMBER 1\n'],
    ['wide lines that mention an advisory', '', `ADVISORY${' '.repeat(220)}\n`],
    ['open brackets of a page', '<pre>', '<'],
    ['scripts that never close', '<pre>', '<script '],
    ['dots after a forecast', HEAD, `FORECAST VALID 20/0900Z ${'.'.repeat(200)}x\n`],
    ['quadrants without end', HEAD, `34 KT...${'1NE '.repeat(50)}\n`],
    ['points without end', HEAD, 'FORECAST VALID 20/0900Z 33.5N  76.9W\nMAX WIND 70 KT\n'],
    ['lists in lists', '', '['],
    ['objects in objects', '', '{"a":'],
    ['quotes', 'lat,lon,time\n', '"a""b"\n'],
    ['columns', 'lat,lon,', 'x,'],
    ['rows', 'validAt,lat,lon,maxWindKt\n', '1,2,3,4\n'],
    ['deck lines', '', 'AL, 09, 2031091906, 03, OFCL, 0, 241N, 552W, 70,\n'],
  ];

  test.each(NASTY)('%s: a megabyte is answered within five seconds in every form', (_, head, piece) => {
    const text = head + repeated(piece, 1_000_000);
    for (const format of FORMATS) {
      const before = performance.now();
      answered(readAdvisory(text, { format }));
      expect(performance.now() - before).toBeLessThan(5000);
    }
  });
});
