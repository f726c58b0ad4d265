/** One measured figure. */
export interface Row {
  what: string;
  value: number;
  unit: string;
}

export const row = (what: string, value: number, unit: string): Row => ({ what, value: Math.round(value * 100) / 100, unit });

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}

export function printTable(rows: readonly Row[]): void {
  const width = Math.max(...rows.map((entry) => entry.what.length));
  for (const { what, value, unit } of rows) console.log(`${what.padEnd(width)}  ${value.toLocaleString('en').padStart(12)} ${unit}`);
}
