import { type Elimination, pivot } from './gilbert-peierls';
import { analyse, type LuAnalysis } from './lu-analysis';
import type { SparsePattern } from './sparse-matrix';

/** A pivot smaller than this share of what stands below it is poor: the rows are then exchanged anew. */
const LEAST_PIVOT = 1e-3;

/**
 * Numerical sparse LU on a pattern that was analysed beforehand (Davis and Palamadai Natarajan, ACM TOMS Algorithm 907,
 * 2010). Every factorisation runs through the fixed pattern of the last one; only where a pivot turns out poor is a new
 * one looked for. A new object begins along the diagonal, so what it computes depends on nothing that was solved before it
 * was made. Rows are scaled by their largest entry, since nets of microamperes stand beside nets of amperes.
 */
export class SparseLu {
  readonly #analysis: LuAnalysis;
  #elimination: Elimination;
  /** Step of the row of each entry within and above the diagonal blocks. */
  #innerSteps: Int32Array;
  #outerSteps: Int32Array;
  #lowerValues: Float64Array;
  #upperValues: Float64Array;
  readonly #outerValues: Float64Array;
  readonly #pivots: Float64Array;
  /** 1/largest entry, by original row. */
  readonly #rowScale: Float64Array;
  readonly #work: Float64Array;

  constructor(pattern: SparsePattern, analysis: LuAnalysis = analyse(pattern)) {
    const { inner, outer, alongDiagonal } = analysis;
    this.#analysis = analysis;
    this.#elimination = alongDiagonal;
    // Along the diagonal steps and places are the same.
    this.#innerSteps = inner.rows;
    this.#outerSteps = outer.rows;
    this.#lowerValues = new Float64Array(alongDiagonal.lower.rows.length);
    this.#upperValues = new Float64Array(alongDiagonal.upper.rows.length);
    this.#outerValues = new Float64Array(outer.rows.length);
    this.#pivots = new Float64Array(pattern.size);
    this.#rowScale = new Float64Array(pattern.size);
    this.#work = new Float64Array(pattern.size);
  }

  /** Factors values in the pattern's slots. False when a pivot is zero or not finite. */
  factor(values: Float64Array): boolean {
    if (!this.#scaleRows(values)) return false;
    if (this.#eliminate(values, LEAST_PIVOT)) return true;
    return this.#pivotAnew(values) && this.#eliminate(values, 0);
  }

  /** Solves A·x = b in place. */
  solve(x: Float64Array): void {
    const { order, blockStarts, outer } = this.#analysis;
    const { pivotRows, lower, upper } = this.#elimination;
    const size = order.length;
    const work = this.#work;
    const pivots = this.#pivots;
    const scale = this.#rowScale;
    for (let step = 0; step < size; step++) {
      const row = pivotRows[step] as number;
      work[step] = (x[row] as number) * (scale[row] as number);
    }
    for (let block = blockStarts.length - 2; block >= 0; block--) {
      const from = blockStarts[block] as number;
      const to = blockStarts[block + 1] as number;
      for (let step = from; step < to; step++) {
        subtractColumn(lower.starts, lower.rows, this.#lowerValues, step, work[step] as number, work);
      }
      for (let step = to - 1; step >= from; step--) {
        const value = (work[step] as number) / (pivots[step] as number);
        work[step] = value;
        subtractColumn(upper.starts, upper.rows, this.#upperValues, step, value, work);
      }
      for (let step = from; step < to; step++) {
        subtractColumn(outer.starts, this.#outerSteps, this.#outerValues, step, work[step] as number, work);
      }
    }
    for (let step = 0; step < size; step++) {
      x[order[step] as number] = work[step] as number;
      work[step] = 0;
    }
  }

  /** Sign of the determinant of what was factored; 0 when a scaled pivot is within `doubt` of zero. */
  determinantSign(doubt: number): -1 | 0 | 1 {
    let isNegative = this.#elimination.isOdd;
    for (const value of this.#pivots) {
      if (Math.abs(value) <= doubt) return 0;
      if (value < 0) isNegative = !isNegative;
    }
    return isNegative ? -1 : 1;
  }

  #scaleRows(values: Float64Array): boolean {
    const { rows } = this.#analysis.pattern;
    const scale = this.#rowScale;
    scale.fill(0);
    for (let slot = 0; slot < rows.length; slot++) {
      const row = rows[slot] as number;
      const size = Math.abs(values[slot] as number);
      if (!(size <= Number.MAX_VALUE)) return false;
      if (size > (scale[row] as number)) scale[row] = size;
    }
    for (let row = 0; row < scale.length; row++) {
      if ((scale[row] as number) < Number.MIN_VALUE * 2 ** 52) return false;
      scale[row] = 1 / (scale[row] as number);
    }
    return true;
  }

  /** The numbers on the present pattern. False, with the work cleared, at a pivot below `least` of what is below it. */
  #eliminate(values: Float64Array, least: number): boolean {
    const { inner, outer, pattern } = this.#analysis;
    const { lower, upper } = this.#elimination;
    const innerSteps = this.#innerSteps;
    const lowerValues = this.#lowerValues;
    const upperValues = this.#upperValues;
    const outerValues = this.#outerValues;
    const pivots = this.#pivots;
    const scale = this.#rowScale;
    const work = this.#work;
    const { rows } = pattern;
    const size = pivots.length;
    for (let entry = 0; entry < outerValues.length; entry++) {
      const slot = outer.slots[entry] as number;
      outerValues[entry] = (values[slot] as number) * (scale[rows[slot] as number] as number);
    }
    for (let step = 0; step < size; step++) {
      for (let entry = inner.starts[step] as number; entry < (inner.starts[step + 1] as number); entry++) {
        const slot = inner.slots[entry] as number;
        work[innerSteps[entry] as number] = (values[slot] as number) * (scale[rows[slot] as number] as number);
      }
      for (let entry = upper.starts[step] as number; entry < (upper.starts[step + 1] as number); entry++) {
        const from = upper.rows[entry] as number;
        const value = work[from] as number;
        work[from] = 0;
        upperValues[entry] = value;
        subtractColumn(lower.starts, lower.rows, lowerValues, from, value, work);
      }
      const pivotValue = work[step] as number;
      work[step] = 0;
      let largest = Math.abs(pivotValue);
      const begin = lower.starts[step] as number;
      const end = lower.starts[step + 1] as number;
      for (let entry = begin; entry < end; entry++) {
        const below = work[lower.rows[entry] as number] as number;
        if (Math.abs(below) > largest) largest = Math.abs(below);
        lowerValues[entry] = below / pivotValue;
        work[lower.rows[entry] as number] = 0;
      }
      pivots[step] = pivotValue;
      if (!(largest > 0 && Math.abs(pivotValue) >= least * largest && largest <= Number.MAX_VALUE)) {
        work.fill(0);
        return false;
      }
    }
    return true;
  }

  #pivotAnew(values: Float64Array): boolean {
    const { inner, outer, order, pattern } = this.#analysis;
    const scaled = new Float64Array(inner.slots.length);
    for (let entry = 0; entry < scaled.length; entry++) {
      const slot = inner.slots[entry] as number;
      scaled[entry] = (values[slot] as number) * (this.#rowScale[pattern.rows[slot] as number] as number);
    }
    const elimination = pivot(inner, scaled, order);
    if (!elimination) return false;
    const stepOf = (row: number): number => elimination.stepOfRow[row] as number;
    this.#elimination = elimination;
    this.#innerSteps = inner.rows.map(stepOf);
    this.#outerSteps = outer.rows.map(stepOf);
    this.#lowerValues = new Float64Array(elimination.lower.rows.length);
    this.#upperValues = new Float64Array(elimination.upper.rows.length);
    return true;
  }
}

/** x −= value · (a column). */
function subtractColumn(
  starts: Int32Array,
  rows: Int32Array,
  values: Float64Array,
  column: number,
  value: number,
  x: Float64Array,
): void {
  if (value === 0) return;
  const end = starts[column + 1] as number;
  for (let entry = starts[column] as number; entry < end; entry++) {
    const row = rows[entry] as number;
    x[row] = (x[row] as number) - (values[entry] as number) * value;
  }
}
