import { nearest } from './draft';
import type { Place } from './draft';
import type { InputError } from './model';

export type ParsedJson = { ok: true; value: unknown; placeOf: (path: string) => Place } | { ok: false; errors: InputError[] };

/** Deeper than any advisory or GeoJSON goes. */
const DEEPEST = 64;

/** Parses JSON, and can say where each value stands (`points.3.lat`) or where the text stops being JSON. */
export function parseJson(text: string): ParsedJson {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    const { offset, message } = scan(text).problem ?? { offset: 0, message: 'this is not JSON' };
    return { ok: false, errors: [{ ...placeFinder(text)(offset), message }] };
  }
  // Places are wanted only where something is wrong, so they are looked for only then.
  let look: ((path: string) => Place) | null = null;
  const makeLook = (): ((path: string) => Place) => {
    const { offsets } = scan(text);
    const place = placeFinder(text);
    return (path) => place(nearest(offsets, path) ?? 0);
  };
  return { ok: true, value, placeOf: (path) => (look ??= makeLook())(path) };
}

interface Scan {
  offsets: Map<string, number>;
  problem: { offset: number; message: string } | null;
}

interface Container {
  path: string;
  close: '}' | ']';
  index: number;
}

const SCALAR = /true|false|null|-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const BLANK = /[ \t\r\n]*/y;

/** One pass over the text, without recursion: where every value starts, and the first thing that is not JSON (RFC 8259). */
function scan(text: string): Scan {
  const offsets = new Map<string, number>();
  const open: Container[] = [];
  let at = skipBlank(text, 0);
  let path = '';
  const stop = (expected: string): Scan => ({ offsets, problem: { offset: at, message: `${expected}, but found ${foundAt(text, at)}` } });

  for (;;) {
    // A value starts here.
    if (path !== '') offsets.set(path, at);
    const first = text[at];
    if (first === '{' || first === '[') {
      if (open.length === DEEPEST) return stop('fewer brackets inside one another');
      const container: Container = { path, close: first === '{' ? '}' : ']', index: 0 };
      at = skipBlank(text, at + 1);
      if (text[at] !== container.close) {
        open.push(container);
        const key = container.close === '}' ? readKey(text, at) : { path: '0', end: at };
        if (key === null) return stop('expected a name in double quotes');
        path = join(container.path, key.path);
        at = key.end;
        continue;
      }
      at++;
    } else {
      const end = scalarEnd(text, at);
      if (end === null) return stop(expectedValue(text, at));
      at = end;
    }
    // A value ended: close what ends with it, or go on to the next.
    for (;;) {
      at = skipBlank(text, at);
      const container = open.at(-1);
      if (container === undefined) return at === text.length ? { offsets, problem: null } : stop('expected nothing more after the last bracket');
      if (text[at] === container.close) {
        open.pop();
        at++;
        continue;
      }
      if (text[at] !== ',') return stop(`expected a comma or ${container.close}`);
      at = skipBlank(text, at + 1);
      const key = container.close === '}' ? readKey(text, at) : { path: String(++container.index), end: at };
      if (key === null) return stop('expected a name in double quotes');
      path = join(container.path, key.path);
      at = key.end;
      break;
    }
  }
}

const join = (path: string, key: string): string => (path === '' ? key : `${path}.${key}`);

function readKey(text: string, at: number): { path: string; end: number } | null {
  const end = text[at] === '"' ? stringEnd(text, at) : null;
  if (end === null) return null;
  const colon = skipBlank(text, end);
  return text[colon] === ':' ? { path: text.slice(at + 1, end - 1), end: skipBlank(text, colon + 1) } : null;
}

function scalarEnd(text: string, at: number): number | null {
  if (text[at] === '"') return stringEnd(text, at);
  SCALAR.lastIndex = at;
  return SCALAR.test(text) ? SCALAR.lastIndex : null;
}

function stringEnd(text: string, at: number): number | null {
  for (let index = at + 1; index < text.length; index++) {
    const code = text.charCodeAt(index);
    if (code === 34) return index + 1;
    if (code < 32) return null;
    if (code !== 92) continue;
    index++;
    if (text[index] === 'u' ? !/^[0-9a-f]{4}$/i.test(text.slice(index + 1, index + 5)) : !'"\\/bfnrt'.includes(text[index] ?? ' ')) return null;
  }
  return null;
}

function skipBlank(text: string, at: number): number {
  BLANK.lastIndex = at;
  BLANK.test(text);
  return BLANK.lastIndex;
}

function expectedValue(text: string, at: number): string {
  if (/^-?(NaN|Infinity)/.test(text.slice(at, at + 10))) return 'expected a number, and JSON has no NaN or Infinity: leave the field out where it is not known';
  if (text[at] === '"') return 'expected text that ends with a double quote on the same line';
  return 'expected a value';
}

const foundAt = (text: string, at: number): string => (at >= text.length ? 'the end of the file' : JSON.stringify(text.slice(at, at + 12).split('\n')[0]));

/** Finds line and column, from 1, of an offset. */
function placeFinder(text: string): (offset: number) => { line: number; column: number } {
  const starts = [0];
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
  return (offset) => {
    let [low, high] = [0, starts.length - 1];
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (starts[middle]! <= offset) low = middle;
      else high = middle - 1;
    }
    return { line: low + 1, column: offset - starts[low]! + 1 };
  };
}
