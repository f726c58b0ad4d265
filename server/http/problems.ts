import type { InputError } from '../../lib/advisory';
import type { Problem } from '../../lib/wire';

/** Every way a request can be refused, with its HTTP status and its title in a problem document (RFC 9457). */
export const REFUSALS = {
  'bad-request': [400, 'The request cannot be understood'],
  unauthorized: [401, 'Sign in, or send a key'],
  forbidden: [403, 'Your role does not allow this'],
  'foreign-origin': [403, 'This call comes from another site'],
  'not-found': [404, 'There is no such thing here'],
  'not-computed': [404, 'Not computed'],
  'too-slow': [408, 'The request took too long to come'],
  conflict: [409, 'This cannot be done now'],
  'too-large': [413, 'The file is too large'],
  'wrong-type': [415, 'This kind of content is not read here'],
  'unknown-host': [421, 'This server does not answer under that name'],
  invalid: [422, 'The content cannot be used'],
  'too-many-requests': [429, 'Too many requests'],
  'headers-too-large': [431, 'The headers are too large'],
  fault: [500, 'Something went wrong on the server'],
} as const satisfies Record<string, readonly [status: number, title: string]>;

export type RefusalCode = keyof typeof REFUSALS;

/** Thrown wherever a request must be refused; what a client reads is made of it in one place (`answerProblem`). */
export class Refusal extends Error {
  override name = 'Refusal';
  constructor(
    readonly code: RefusalCode,
    readonly detail: string,
    readonly errors: readonly InputError[] = [],
  ) {
    super(detail);
  }
}

/** What a client reads of a refusal (RFC 9457). `number` is the one that the log has. */
export function problemDocument({ code, detail, errors }: Refusal, number: string): Problem {
  const [status, title] = REFUSALS[code];
  return { type: `urn:leeboard:problem:${code}`, title, status, detail, instance: `urn:uuid:${number}`, ...(errors.length > 0 ? { errors: [...errors] } : {}) };
}
