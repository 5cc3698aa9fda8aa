/** A square sparse pattern by columns: rows of column j are `rows[starts[j] … starts[j + 1] − 1]`, ascending. */
export interface SparsePattern {
  readonly size: number;
  readonly starts: Int32Array;
  readonly rows: Int32Array;
}

/** Gathers places of a pattern, then tells each one's slot in the array of values. Every diagonal place is present. */
export class PatternBuilder {
  readonly #columns: Set<number>[];

  constructor(size: number) {
    this.#columns = Array.from({ length: size }, (_, index) => new Set([index]));
  }

  add(row: number, column: number): void {
    this.#columns[column]?.add(row);
  }

  build(): SparsePattern {
    const sorted = this.#columns.map((rows) => Int32Array.from(rows).sort());
    const starts = new Int32Array(sorted.length + 1);
    for (const [column, rows] of sorted.entries()) starts[column + 1] = (starts[column] ?? 0) + rows.length;
    const rows = new Int32Array(starts[sorted.length] ?? 0);
    for (const [column, list] of sorted.entries()) rows.set(list, starts[column]);
    return { size: sorted.length, starts, rows };
  }
}

/** Slot of a place in the values of a pattern; −1 when the place is not in it. */
export function slotOf(pattern: SparsePattern, row: number, column: number): number {
  let low = pattern.starts[column] ?? 0;
  let high = (pattern.starts[column + 1] ?? 0) - 1;
  while (low <= high) {
    const middle = (low + high) >> 1;
    const at = pattern.rows[middle] ?? 0;
    if (at === row) return middle;
    if (at < row) low = middle + 1;
    else high = middle - 1;
  }
  return -1;
}
