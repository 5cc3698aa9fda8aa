/**
 * Left-looking sparse LU: Gilbert and Peierls, SIAM J. Sci. Stat. Comput. 9, 1988 (from memory). Each column of L and U
 * comes from one sparse triangular solve, whose pattern a depth-first search through the columns of L finds beforehand,
 * in the order in which it is to be worked. What comes out is the pattern alone; `SparseLu` fills it with numbers as
 * often as wanted.
 */

/** A square matrix by columns: rows of column j are `rows[starts[j] … starts[j + 1] − 1]`. */
interface Columns {
  readonly starts: Int32Array;
  readonly rows: Int32Array;
}

/** The steps of an elimination, one column each, and where it makes entries. */
export interface Elimination {
  /** Original index of the row that is pivot at each step. */
  readonly pivotRows: Int32Array;
  /** Step at which each row of the input is pivot. */
  readonly stepOfRow: Int32Array;
  /** L below its unit diagonal and U above its diagonal, by columns, as steps; U in the order of the solve. */
  readonly lower: Columns;
  readonly upper: Columns;
  /** Whether the exchange of rows alone would change the determinant's sign. */
  readonly isOdd: boolean;
}

/** A diagonal pivot is kept while it is at least this share of the largest in its column. */
const DIAGONAL_PREFERENCE = 0.1;

/** The pattern when every pivot is on the diagonal. `originals` are the rows' original indices. */
export function fillIn(matrix: Columns, originals: Int32Array): Elimination {
  const search = new ColumnSearch(matrix);
  for (let step = 0; step < search.size; step++) search.accept(search.findReach(step), step, step);
  return search.finish(originals);
}

/** The pattern with partial pivoting for the given values, by entry of `matrix`; null when the matrix is singular. */
export function pivot(matrix: Columns, values: Float64Array, originals: Int32Array): Elimination | null {
  const search = new ColumnSearch(matrix);
  const { size, reach, lowerRows, lowerStarts, stepOfRow } = search;
  const lowerValues: number[] = [];
  const work = new Float64Array(size);
  for (let step = 0; step < size; step++) {
    const top = search.findReach(step);
    for (let entry = matrix.starts[step] as number; entry < (matrix.starts[step + 1] as number); entry++) {
      work[matrix.rows[entry] as number] = values[entry] as number;
    }
    let largest = 0;
    let pivotRow = -1;
    for (let index = top; index < size; index++) {
      const row = reach[index] as number;
      const value = work[row] as number;
      const from = stepOfRow[row] as number;
      if (from < 0) {
        if (Math.abs(value) > largest) {
          largest = Math.abs(value);
          pivotRow = row;
        }
        continue;
      }
      for (let entry = lowerStarts[from] as number; entry < (lowerStarts[from + 1] as number); entry++) {
        const below = lowerRows[entry] as number;
        work[below] = (work[below] as number) - (lowerValues[entry] as number) * value;
      }
    }
    if (pivotRow < 0 || !(largest <= Number.MAX_VALUE)) return null;
    const diagonal = work[step] as number;
    if (stepOfRow[step] === -1 && Math.abs(diagonal) >= DIAGONAL_PREFERENCE * largest) pivotRow = step;
    const pivotValue = work[pivotRow] as number;
    search.accept(top, step, pivotRow);
    for (let entry = lowerStarts[step] as number; entry < lowerRows.length; entry++) {
      lowerValues.push((work[lowerRows[entry] as number] as number) / pivotValue);
    }
    for (let index = top; index < size; index++) work[reach[index] as number] = 0;
  }
  return search.finish(originals);
}

class ColumnSearch {
  readonly size: number;
  /** Step at which a row became pivot, −1 before. */
  readonly stepOfRow: Int32Array;
  readonly lowerStarts: Int32Array;
  readonly lowerRows: number[] = [];
  /** Rows that the present column's solve touches, from `findReach` to the end. */
  readonly reach: Int32Array;
  readonly #matrix: Columns;
  readonly #rowOfStep: Int32Array;
  readonly #upperStarts: Int32Array;
  readonly #upperSteps: number[] = [];
  readonly #mark: Int32Array;
  readonly #stack: Int32Array;
  readonly #stackAt: Int32Array;

  constructor(matrix: Columns) {
    const size = matrix.starts.length - 1;
    this.size = size;
    this.#matrix = matrix;
    this.stepOfRow = new Int32Array(size).fill(-1);
    this.lowerStarts = new Int32Array(size + 1);
    this.reach = new Int32Array(size);
    this.#rowOfStep = new Int32Array(size);
    this.#upperStarts = new Int32Array(size + 1);
    this.#mark = new Int32Array(size).fill(-1);
    this.#stack = new Int32Array(size);
    this.#stackAt = new Int32Array(size);
  }

  /** Fills the end of `reach` in topological order and tells where it begins. */
  findReach(column: number): number {
    const { starts, rows } = this.#matrix;
    let top = this.size;
    for (let entry = starts[column] as number; entry < (starts[column + 1] as number); entry++) {
      const root = rows[entry] as number;
      if (this.#mark[root] === column) continue;
      let depth = 0;
      this.#push(depth, root, column);
      while (depth >= 0) {
        const row = this.#stack[depth] as number;
        const from = this.stepOfRow[row] as number;
        const end = from < 0 ? 0 : (this.lowerStarts[from + 1] as number);
        let at = this.#stackAt[depth] as number;
        while (at < end && this.#mark[this.lowerRows[at] as number] === column) at++;
        if (at >= end) {
          this.reach[--top] = row;
          depth--;
        } else {
          this.#stackAt[depth] = at + 1;
          this.#push(++depth, this.lowerRows[at] as number, column);
        }
      }
    }
    return top;
  }

  /** Takes a column whose reach was found, with its pivot. */
  accept(top: number, step: number, pivotRow: number): void {
    this.stepOfRow[pivotRow] = step;
    this.#rowOfStep[step] = pivotRow;
    for (let index = top; index < this.size; index++) {
      const row = this.reach[index] as number;
      const from = this.stepOfRow[row] as number;
      if (from < 0) this.lowerRows.push(row);
      else if (from < step) this.#upperSteps.push(from);
    }
    this.lowerStarts[step + 1] = this.lowerRows.length;
    this.#upperStarts[step + 1] = this.#upperSteps.length;
  }

  finish(originals: Int32Array): Elimination {
    const { stepOfRow } = this;
    const lowerSteps = Int32Array.from(this.lowerRows);
    for (let entry = 0; entry < lowerSteps.length; entry++) {
      lowerSteps[entry] = stepOfRow[lowerSteps[entry] as number] as number;
    }
    return {
      pivotRows: this.#rowOfStep.map((row) => originals[row] as number),
      stepOfRow,
      lower: { starts: this.lowerStarts, rows: lowerSteps },
      upper: { starts: this.#upperStarts, rows: Int32Array.from(this.#upperSteps) },
      isOdd: isOddPermutation(stepOfRow),
    };
  }

  #push(depth: number, row: number, column: number): void {
    this.#mark[row] = column;
    this.#stack[depth] = row;
    const from = this.stepOfRow[row] as number;
    this.#stackAt[depth] = from < 0 ? 0 : (this.lowerStarts[from] as number);
  }
}

function isOddPermutation(order: Int32Array): boolean {
  const seen = new Uint8Array(order.length);
  let isOdd = false;
  for (let start = 0; start < order.length; start++) {
    for (let next = start, length = 0; !seen[next]; next = order[next] as number, length++) {
      seen[next] = 1;
      if (length > 0) isOdd = !isOdd;
    }
  }
  return isOdd;
}
