import type { InputError } from '../../lib/advisory';

/** What a forecast is read from: a file as it is, pasted text, or the form. */
export interface Source {
  name: string;
  body: Blob | string;
  contentType: 'text/plain' | 'application/json';
  /** As text, to quote lines from; null when it is none. */
  text: string | null;
}

export const megabytes = (bytes: number): string => (bytes < 1024 * 1024 ? `${Math.max(1, Math.round(bytes / 1024))}\u00a0kB` : `${(bytes / 1024 / 1024).toFixed(1)}\u00a0MB`);

export interface QuotedError {
  error: InputError;
  /** The line of the source it stands on, or null. */
  quote: string | null;
  /** Spaces that put a caret under the column; null without one. */
  caret: string | null;
}

const WIDEST = 160;

/** Errors with the line they stand on, cut around the column where the line is long. */
export function quoteErrors(errors: readonly InputError[], text: string | null): QuotedError[] {
  const lines = text?.split(/\r\n|\n|\r/) ?? [];
  return errors.map((error) => {
    const line = error.line === undefined ? undefined : lines[error.line - 1];
    if (line === undefined) return { error, quote: null, caret: null };
    const column = error.column ?? null;
    const from = column === null ? 0 : Math.max(0, column - 1 - WIDEST / 2);
    const quote = `${from > 0 ? '…' : ''}${line.slice(from, from + WIDEST)}${line.length > from + WIDEST ? '…' : ''}`.replaceAll('\t', ' ');
    return { error, quote, caret: column === null ? null : `${' '.repeat(column - 1 - from + (from > 0 ? 1 : 0))}^` };
  });
}
