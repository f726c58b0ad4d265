import type { InputError } from '../../lib/advisory';

/** What the server refused, or that it could not be reached (`status` 0). */
export class RequestFailed extends Error {
  override name = 'RequestFailed';
  constructor(
    readonly status: number,
    message: string,
    readonly errors: readonly InputError[] = [],
  ) {
    super(message);
  }
}

/** The words of an RFC 9457 problem, whatever of it the server gave. */
export function problemFrom(status: number, body: unknown): RequestFailed {
  const problem = (typeof body === 'object' && body !== null ? body : {}) as { title?: unknown; detail?: unknown; errors?: unknown };
  const words = [problem.title, problem.detail].filter((part): part is string => typeof part === 'string' && part !== '');
  const errors = Array.isArray(problem.errors) ? (problem.errors as InputError[]) : [];
  return new RequestFailed(status, words.join('. ') || `The server answered ${status}.`, errors);
}
