/** A cell: text is defused, numbers are not; null and undefined are empty. */
export type Cell = string | number | null | undefined;

/**
 * Text that a spreadsheet would run as a formula is led by an apostrophe (OWASP, "CSV Injection": `=`, `+`, `-`, `@`, tab,
 * carriage return, line feed and their full-width forms).
 */
const defuse = (text: string): string => (/^[=+\-@\t\r\n\uFF1D\uFF0B\uFF0D\uFF20]/.test(text) ? `'${text}` : text);

/** One record of RFC 4180, with its line end. Semicolons are quoted too: half of the world's spreadsheets part cells by them. */
export const csvLine = (cells: readonly Cell[]): string => `${cells.map(cellOf).join(',')}\r\n`;

function cellOf(cell: Cell): string {
  if (cell === null || cell === undefined) return '';
  if (typeof cell === 'number') return String(cell);
  const safe = defuse(cell);
  return /[",;\t\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** A line that readers of CSV may skip. It is one cell, whatever it holds. */
export const csvComment = (text: string): string => `# ${text.replace(/[\s\p{Cc}]+/gu, ' ').replaceAll(/[,;]/g, '\u00b7').replaceAll('"', "'")}\r\n`;
