import { LuDecomposition, Matrix } from 'ml-matrix';
import type { SparsePattern } from '#shared/linalg/sparse-matrix';
import type { LinearSolver } from '#shared/solver/equations';

/** The solver's factorisation done by a general-purpose library: ml-matrix, dense with partial pivoting. */
export class DenseLu implements LinearSolver {
  readonly #pattern: SparsePattern;
  #decomposition: LuDecomposition | undefined;

  constructor(pattern: SparsePattern) {
    this.#pattern = pattern;
  }

  factor(values: Float64Array): boolean {
    const { size, starts, rows } = this.#pattern;
    const dense = Matrix.zeros(size, size);
    for (let column = 0; column < size; column++) {
      for (let slot = starts[column] ?? 0; slot < (starts[column + 1] ?? 0); slot++) {
        dense.set(rows[slot] ?? 0, column, values[slot] ?? 0);
      }
    }
    this.#decomposition = new LuDecomposition(dense);
    return !this.#decomposition.isSingular();
  }

  solve(x: Float64Array): void {
    const solution = this.#decomposition?.solve(Matrix.columnVector(x));
    for (let index = 0; index < x.length; index++) x[index] = solution?.get(index, 0) ?? Number.NaN;
  }

  determinantSign(): -1 | 0 | 1 {
    const determinant = this.#decomposition?.determinant ?? 0;
    return determinant > 0 ? 1 : determinant < 0 ? -1 : 0;
  }
}
