import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { parseJson } from '../../lib/advisory/json-places';

describe('where a value stands', () => {
  const json = parseJson('{\n  "storm": {"name": "Maro"},\n  "points": [\n    {"lat": 24.1},\n    {"lat": [1, {"deep": true}]}\n  ]\n}');
  const placeOf = (path: string): unknown => (json.ok ? json.placeOf(path) : null);

  test('in an object', () => expect(placeOf('storm.name')).toEqual({ line: 2, column: 21 }));
  test('in a list', () => expect(placeOf('points.1')).toEqual({ line: 5, column: 5 }));
  test('deep inside', () => expect(placeOf('points.1.lat.1.deep')).toEqual({ line: 5, column: 26 }));
  test('what is not there stands where its surroundings start', () => expect(placeOf('points.0.lon')).toEqual({ line: 4, column: 5 }));
  test('what has no surroundings stands at the start', () => expect(placeOf('centre')).toEqual({ line: 1, column: 1 }));
});

describe('where a text stops being JSON (RFC 8259)', () => {
  const problem = (text: string): unknown => {
    const json = parseJson(text);
    return json.ok ? json.value : json.errors[0];
  };

  test.each([
    ['{"a": 1,}', 9, 'expected a name in double quotes'],
    ['{"a" 1}', 2, 'expected a name in double quotes'],
    ["{'a': 1}", 2, 'expected a name in double quotes'],
    ['{"a": 1 "b": 2}', 9, 'expected a comma or }'],
    ['[1, 2', 6, 'expected a comma or ]'],
    ['[1,]', 4, 'expected a value'],
    ['[1, , 2]', 5, 'expected a value'],
    ['[NaN]', 2, 'JSON has no NaN'],
    ['[-Infinity]', 2, 'JSON has no NaN or Infinity'],
    ['["abc]', 2, 'ends with a double quote'],
    ['["a\\x"]', 2, 'ends with a double quote'],
    ['{} {}', 4, 'nothing more after the last bracket'],
    ['[01]', 3, 'expected a comma or ]'],
    ['[tru]', 2, 'expected a value'],
    ['', 1, 'the end of the file'],
  ])('%s', (text, column, message) => {
    expect(problem(text)).toMatchObject({ line: 1, column, message: expect.stringContaining(message) as string });
  });

  test('the line is counted', () => expect(problem('{\n"a": 1\n"b": 2}')).toMatchObject({ line: 3, column: 1 }));
  test('brackets without end do not exhaust it', () => expect(problem('['.repeat(1_000_000))).toMatchObject({ message: expect.stringContaining('fewer brackets') as string }));
});

describe('the reference is the language’s own parser', () => {
  test('every value is found where it stands', () => {
    fc.assert(
      fc.property(fc.dictionary(fc.stringMatching(/^[a-z]{1,8}$/), fc.oneof(fc.integer(), fc.string(), fc.array(fc.integer())), { minKeys: 1 }), (object) => {
        const text = JSON.stringify(object, null, 2);
        const json = parseJson(text);
        const lines = text.split('\n');
        for (const [key, value] of Object.entries(object)) {
          const { line, column } = (json.ok ? json.placeOf(key) : {}) as { line: number; column: number };
          expect(lines[line - 1]!.slice(column - 1)).toMatch(Array.isArray(value) ? /^\[/ : JSON.stringify(value)[0] === '"' ? /^"/ : /^-?\d/);
          expect(lines[line - 1]).toContain(`"${key}":`);
        }
      }),
    );
  });

  test('a text that it refuses is refused with a place in it', () => {
    fc.assert(
      fc.property(fc.json(), fc.nat(), fc.constantFrom('}', ',', '"', 'x', '', ' '), (text, position, mark) => {
        const cut = position % (text.length + 1);
        const broken = text.slice(0, cut) + mark + text.slice(cut + 1);
        const json = parseJson(broken);
        if (json.ok) {
          expect(json.value).toEqual(JSON.parse(broken));
        } else {
          expect(() => JSON.parse(broken) as unknown).toThrow();
          expect(json.errors[0]!.message).not.toBe('this is not JSON');
          expect(json.errors[0]!.column).toBeGreaterThan(0);
        }
      }),
      { numRuns: 1000 },
    );
  });
});
