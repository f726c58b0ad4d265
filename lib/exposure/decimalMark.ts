import type { Row } from './fields';
import { isPositionColumn } from './fields';

/** The decimal mark of a file: a comma only where its latitudes and longitudes are written with commas and none with a point. */
export function decimalMarkOf(rows: readonly Row[], columns: readonly string[]): '.' | ',' {
  const positions = columns.filter(isPositionColumn);
  let commas = false;
  for (const { values } of rows) {
    for (const column of positions) {
      const text = String(values[column]);
      if (text.includes('.')) return '.';
      commas ||= text.includes(',');
    }
  }
  return commas ? ',' : '.';
}
