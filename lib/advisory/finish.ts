import { advisorySchema } from './model';
import { checkAdvisory } from './checks';
import { shown } from './instants';
import { THRESHOLD_KEYS } from '../units';
import type { CheckContext } from './checks';
import type { Draft } from './draft';
import type { Advisory, Format, InputError, Reading } from './model';

type Issue = { path: readonly PropertyKey[]; message: string; code?: string | undefined; keys?: readonly string[] };

/** The last step of every format: the model's bounds, the order of times, and the warnings. */
export function finish(format: Format, draft: Draft, context: CheckContext = {}): Reading {
  const parsed = advisorySchema.safeParse(draft.advisory);
  if (!parsed.success) {
    return { ok: false, format, errors: parsed.error.issues.map((issue) => placed(draft, issue.path, describe(issue as Issue, draft.advisory))) };
  }
  const errors = orderErrors(draft, parsed.data);
  if (errors.length > 0) return { ok: false, format, errors };
  const checked = checkAdvisory(parsed.data, context).map((warning) => ({ ...draft.placeOf(keyOf(warning.path ?? '')), ...warning }));
  return { ok: true, format, advisory: parsed.data, warnings: [...draft.warnings, ...checked] };
}

/** Points go forward in time, each at a time of its own. */
function orderErrors(draft: Draft, { points }: Advisory): InputError[] {
  return points.slice(1).flatMap((point, index) => {
    const before = points[index]!;
    const step = Date.parse(point.validAt) - Date.parse(before.validAt);
    if (step > 0) return [];
    const line = draft.placeOf(`points.${index}`).line;
    const other = line === undefined ? `points[${index}]` : `the point on line ${line}`;
    const message = step === 0 ? `two points at ${point.validAt}, this and ${other}: keep one of them` : `${point.validAt} is earlier than ${before.validAt} of ${other}: put the points in order of time`;
    return [placed(draft, ['points', index + 1, 'validAt'], message)];
  });
}

function placed(draft: Draft, path: readonly PropertyKey[], message: string): InputError {
  return { ...draft.placeOf(path.join('.')), ...(path.length === 0 ? {} : { path: pathText(path) }), message };
}

/** `points[3].radiiNm.34.ne`. */
export const pathText = (path: readonly PropertyKey[]): string => path.map((part, index) => (typeof part === 'number' ? `[${String(part)}]` : `${index === 0 ? '' : '.'}${String(part)}`)).join('');

/** The same path as places are kept under: `points.3.lat`. */
const keyOf = (path: string): string => path.replace(/\[(\d+)\]/g, '.$1');

function describe({ path, message, code, keys }: Issue, root: unknown): string {
  if (code === 'unrecognized_keys') return `${(keys ?? []).map((key) => `"${shown(key)}"`).join(', ')} is not known here: radii are given for ${THRESHOLD_KEYS.join(', ')} kt`;
  const found = valueAt(root, path);
  const expected = message.replace(/^(?:Invalid input|Invalid option|Too small|Too big): /, '').replace(/, received .*$/, '');
  return found === undefined ? `${String(path.at(-1))} is missing: ${expected}` : `${expected}; found ${quoted(found)}`;
}

function quoted(value: unknown): string {
  if (typeof value === 'number') return String(value);
  return shown(JSON.stringify(value) ?? typeof value);
}

function valueAt(root: unknown, path: readonly PropertyKey[]): unknown {
  let value = root;
  for (const part of path) {
    if (typeof value !== 'object' || value === null) return undefined;
    value = Object.hasOwn(value, part) ? (value as Record<PropertyKey, unknown>)[part] : undefined;
  }
  return value;
}
