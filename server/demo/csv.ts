/** A CSV (RFC 4180) of rows that all have the columns of the first; values hold no commas, quotes or line ends. */
export function csvOf(rows: readonly object[]): string {
  const lines = rows.map((row) => Object.values(row).map(plain).join(','));
  return `${[Object.keys(rows[0]).join(','), ...lines].join('\n')}\n`;
}

function plain(value: unknown): string {
  const text = String(value);
  if (/[",\r\n]/.test(text)) throw new RangeError(`Unexpected mark in a value: ${text}`);
  return text;
}
