/** Larger than any squared distance on a mask, small enough to be added. */
const FAR = 1e12;

/**
 * Distance from each cell to the nearest marked cell, in the unit of the steps. Exact on the grid: Felzenszwalb and
 * Huttenlocher (2012), Theory of Computing 8, 415-428, one pass down the columns and one lower envelope of parabolas along each
 * row, in time proportional to the number of cells.
 *
 * Cells lie row by row. `stepY` parts the rows; `stepX[row]` parts the cells of a row, so that meridians may draw together.
 */
export function distanceTransform(marked: Uint8Array, mark: number, columns: number, rows: number, stepX: Float64Array, stepY: number): Float32Array {
  const squared = new Float64Array(columns * rows);
  for (let column = 0; column < columns; column++) {
    let rowsAway = Infinity;
    for (let row = 0; row < rows; row++) {
      rowsAway = marked[row * columns + column] === mark ? 0 : rowsAway + 1;
      squared[row * columns + column] = rowsAway;
    }
    rowsAway = Infinity;
    for (let row = rows - 1; row >= 0; row--) {
      const i = row * columns + column;
      rowsAway = Math.min(rowsAway + 1, squared[i]);
      squared[i] = Math.min(FAR, (rowsAway * stepY) ** 2);
    }
  }

  const distance = new Float32Array(columns * rows);
  const apex = new Int32Array(columns);
  const from = new Float64Array(columns + 1);
  for (let row = 0; row < rows; row++) {
    const start = row * columns;
    const step2 = stepX[row] ** 2;
    let top = 0;
    apex[0] = 0;
    from[0] = -Infinity;
    from[1] = Infinity;
    for (let q = 1; q < columns; q++) {
      const height = squared[start + q] / step2 + q * q;
      let meet = crossing(height, q, squared[start + apex[top]] / step2, apex[top]);
      while (meet <= from[top]) {
        top--;
        meet = crossing(height, q, squared[start + apex[top]] / step2, apex[top]);
      }
      apex[++top] = q;
      from[top] = meet;
      from[top + 1] = Infinity;
    }
    let k = 0;
    for (let q = 0; q < columns; q++) {
      while (from[k + 1] < q) k++;
      distance[start + q] = Math.sqrt((q - apex[k]) ** 2 * step2 + squared[start + apex[k]]);
    }
  }
  return distance;
}

/** Where the parabola on `q`, of height f(q) + q^2, falls below the one on `p`. */
const crossing = (heightQ: number, q: number, squaredP: number, p: number): number => (heightQ - squaredP - p * p) / (2 * (q - p));
