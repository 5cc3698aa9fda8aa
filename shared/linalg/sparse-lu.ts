import { minimumDegreeOrder } from './minimum-degree';
import type { SparsePattern } from './sparse-matrix';

/** A diagonal pivot is kept while it is at least this share of the largest in its column. */
const DIAGONAL_PREFERENCE = 0.1;

/**
 * Left-looking sparse LU with partial pivoting: Gilbert and Peierls, SIAM J. Sci. Stat. Comput. 9, 1988 (from memory).
 * Each column of L and U comes from one sparse triangular solve, whose pattern a depth-first search finds beforehand.
 * Rows are scaled by their largest entry, since nets of microamperes stand beside nets of amperes. One object serves
 * one pattern: `factor` new values, then `solve` as often as wanted.
 */
export class SparseLu {
  readonly #pattern: SparsePattern;
  readonly #order: Int32Array;
  readonly #rowScale: Float64Array;
  /** Step at which a row became pivot, −1 before. */
  readonly #stepOfRow: Int32Array;
  readonly #rowOfStep: Int32Array;
  readonly #lowerStarts: Int32Array;
  readonly #upperStarts: Int32Array;
  readonly #pivots: Float64Array;
  /** L below its unit diagonal, by original rows; U above its diagonal, by steps. */
  #lowerRows: number[] = [];
  #lowerValues: number[] = [];
  #upperSteps: number[] = [];
  #upperValues: number[] = [];
  readonly #work: Float64Array;
  readonly #mark: Int32Array;
  readonly #reach: Int32Array;
  readonly #stack: Int32Array;
  readonly #stackAt: Int32Array;

  constructor(pattern: SparsePattern) {
    const { size } = pattern;
    this.#pattern = pattern;
    this.#order = minimumDegreeOrder(pattern);
    this.#rowScale = new Float64Array(size);
    this.#stepOfRow = new Int32Array(size);
    this.#rowOfStep = new Int32Array(size);
    this.#lowerStarts = new Int32Array(size + 1);
    this.#upperStarts = new Int32Array(size + 1);
    this.#pivots = new Float64Array(size);
    this.#work = new Float64Array(size);
    this.#mark = new Int32Array(size);
    this.#reach = new Int32Array(size);
    this.#stack = new Int32Array(size);
    this.#stackAt = new Int32Array(size);
  }

  /** Factors values in the pattern's slots. False when a pivot is zero or not finite. */
  factor(values: Float64Array): boolean {
    const { size } = this.#pattern;
    if (!this.#scaleRows(values)) return false;
    this.#stepOfRow.fill(-1);
    this.#mark.fill(-1);
    this.#lowerRows = [];
    this.#lowerValues = [];
    this.#upperSteps = [];
    this.#upperValues = [];
    for (let step = 0; step < size; step++) {
      const column = at(this.#order, step);
      const top = this.#findReach(column, step);
      this.#eliminate(column, top, values);
      if (!this.#choosePivot(column, step, top)) return false;
    }
    return true;
  }

  /** Solves A·x = b in place. */
  solve(x: Float64Array): void {
    const { size } = this.#pattern;
    const work = this.#work;
    for (let row = 0; row < size; row++) x[row] = at(x, row) * at(this.#rowScale, row);
    for (let step = 0; step < size; step++) {
      const value = at(x, at(this.#rowOfStep, step));
      work[step] = value;
      if (value === 0) continue;
      for (let entry = at(this.#lowerStarts, step); entry < at(this.#lowerStarts, step + 1); entry++) {
        const row = at(this.#lowerRows, entry);
        x[row] = at(x, row) - at(this.#lowerValues, entry) * value;
      }
    }
    for (let step = size - 1; step >= 0; step--) {
      const value = at(work, step) / at(this.#pivots, step);
      work[step] = value;
      for (let entry = at(this.#upperStarts, step); entry < at(this.#upperStarts, step + 1); entry++) {
        const above = at(this.#upperSteps, entry);
        work[above] = at(work, above) - at(this.#upperValues, entry) * value;
      }
    }
    for (let step = 0; step < size; step++) x[at(this.#order, step)] = at(work, step);
    work.fill(0);
  }

  /** Sign of the determinant of what was factored; 0 when a scaled pivot is within `doubt` of zero. */
  determinantSign(doubt: number): -1 | 0 | 1 {
    const { size } = this.#pattern;
    let sign: -1 | 1 = permutationSign(this.#order) === permutationSign(this.#rowOfStep) ? 1 : -1;
    for (let step = 0; step < size; step++) {
      const pivot = at(this.#pivots, step);
      if (Math.abs(pivot) <= doubt) return 0;
      if (pivot < 0) sign = sign === 1 ? -1 : 1;
    }
    return sign;
  }

  #scaleRows(values: Float64Array): boolean {
    const { rows } = this.#pattern;
    const scale = this.#rowScale.fill(0);
    for (let slot = 0; slot < rows.length; slot++) {
      const row = at(rows, slot);
      const size = Math.abs(at(values, slot));
      if (!(size <= Number.MAX_VALUE)) return false;
      if (size > at(scale, row)) scale[row] = size;
    }
    for (let row = 0; row < scale.length; row++) {
      if (at(scale, row) < Number.MIN_VALUE * 2 ** 52) return false;
      scale[row] = 1 / at(scale, row);
    }
    return true;
  }

  /** Rows that this column's triangular solve touches, in topological order, at the end of #reach. */
  #findReach(column: number, step: number): number {
    const { size, starts, rows } = this.#pattern;
    let top = size;
    for (let slot = at(starts, column); slot < at(starts, column + 1); slot++) {
      if (at(this.#mark, at(rows, slot)) === step) continue;
      let depth = 0;
      this.#push(depth, at(rows, slot), step);
      while (depth >= 0) {
        const row = at(this.#stack, depth);
        const from = at(this.#stepOfRow, row);
        const end = from < 0 ? 0 : at(this.#lowerStarts, from + 1);
        let entry = at(this.#stackAt, depth);
        while (entry < end && at(this.#mark, at(this.#lowerRows, entry)) === step) entry++;
        if (from < 0 || entry >= end) {
          this.#reach[--top] = row;
          depth--;
        } else {
          this.#stackAt[depth] = entry + 1;
          this.#push(++depth, at(this.#lowerRows, entry), step);
        }
      }
    }
    return top;
  }

  #push(depth: number, row: number, step: number): void {
    this.#mark[row] = step;
    this.#stack[depth] = row;
    const from = at(this.#stepOfRow, row);
    this.#stackAt[depth] = from < 0 ? 0 : at(this.#lowerStarts, from);
  }

  #eliminate(column: number, top: number, values: Float64Array): void {
    const { size, starts, rows } = this.#pattern;
    const work = this.#work;
    for (let slot = at(starts, column); slot < at(starts, column + 1); slot++) {
      const row = at(rows, slot);
      work[row] = at(values, slot) * at(this.#rowScale, row);
    }
    for (let index = top; index < size; index++) {
      const row = at(this.#reach, index);
      const from = at(this.#stepOfRow, row);
      if (from < 0) continue;
      const value = at(work, row);
      for (let entry = at(this.#lowerStarts, from); entry < at(this.#lowerStarts, from + 1); entry++) {
        const below = at(this.#lowerRows, entry);
        work[below] = at(work, below) - at(this.#lowerValues, entry) * value;
      }
    }
  }

  #choosePivot(column: number, step: number, top: number): boolean {
    const { size } = this.#pattern;
    const work = this.#work;
    let pivotRow = -1;
    let largest = 0;
    for (let index = top; index < size; index++) {
      const row = at(this.#reach, index);
      const from = at(this.#stepOfRow, row);
      if (from >= 0) {
        this.#upperSteps.push(from);
        this.#upperValues.push(at(work, row));
      } else if (Math.abs(at(work, row)) > largest) {
        largest = Math.abs(at(work, row));
        pivotRow = row;
      }
    }
    const diagonalFree = at(this.#mark, column) === step && at(this.#stepOfRow, column) < 0;
    if (diagonalFree && Math.abs(at(work, column)) >= DIAGONAL_PREFERENCE * largest) pivotRow = column;
    if (pivotRow < 0 || !(largest > 0 && largest <= Number.MAX_VALUE)) {
      work.fill(0);
      return false;
    }
    const pivot = at(work, pivotRow);
    this.#pivots[step] = pivot;
    this.#stepOfRow[pivotRow] = step;
    this.#rowOfStep[step] = pivotRow;
    for (let index = top; index < size; index++) {
      const row = at(this.#reach, index);
      if (at(this.#stepOfRow, row) < 0 && at(work, row) !== 0) {
        this.#lowerRows.push(row);
        this.#lowerValues.push(at(work, row) / pivot);
      }
      work[row] = 0;
    }
    this.#lowerStarts[step + 1] = this.#lowerRows.length;
    this.#upperStarts[step + 1] = this.#upperSteps.length;
    return true;
  }
}

/** An entry known to be there. */
function at(list: ArrayLike<number>, index: number): number {
  return list[index] as number;
}

function permutationSign(order: Int32Array): -1 | 1 {
  const seen = new Uint8Array(order.length);
  let sign: -1 | 1 = 1;
  for (let start = 0; start < order.length; start++) {
    for (let next = start, length = 0; !seen[next]; next = at(order, next), length++) {
      seen[next] = 1;
      if (length > 0) sign = sign === 1 ? -1 : 1;
    }
  }
  return sign;
}
