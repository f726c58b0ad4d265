import { failed } from './draft';
import { pathText } from './finish';
import { parseJson } from './json-places';
import { advisorySchema } from './model';
import type { Draft, Read } from './draft';
import type { Warning } from './model';

/** Reads an advisory as JSON, in the shape of `advisorySchema`. */
export function readJson(text: string): Read {
  const json = parseJson(text);
  if (!json.ok) return json;
  const { value: given, placeOf } = json;
  if (typeof given !== 'object' || given === null || Array.isArray(given)) {
    return failed({ line: 1, column: 1, message: 'an advisory is a JSON object with storm, number, centre, issuedAt, averaging and points' });
  }
  // Numbers such as 2A are text; a plain number means the same as its digits.
  const value = 'number' in given && typeof given.number === 'number' ? { ...given, number: String(given.number) } : given;
  const parsed = advisorySchema.safeParse(value);
  return { ok: true, draft: { advisory: value, placeOf, warnings: parsed.success ? unread(value, parsed.data, [], placeOf) : [] } };
}

/** Fields that the model does not have, so that a misspelt `radiiNM` is not lost without a word. */
function unread(given: unknown, kept: unknown, path: (string | number)[], placeOf: Draft['placeOf']): Warning[] {
  if (typeof given !== 'object' || given === null || typeof kept !== 'object' || kept === null) return [];
  return Object.entries(given).flatMap(([key, value]) => {
    const inner = [...path, Array.isArray(given) ? Number(key) : key];
    if (Object.hasOwn(kept, key)) return unread(value, (kept as Record<string, unknown>)[key], inner, placeOf);
    return [{ code: 'field-unknown', path: pathText(inner), ...placeOf(inner.join('.')), message: `"${key}" is no field of an advisory and was left out` }];
  });
}
