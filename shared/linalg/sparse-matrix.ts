/** A square sparse pattern by columns: rows of column j are `rows[starts[j] … starts[j + 1] − 1]`, ascending. */
export interface SparsePattern {
  readonly size: number;
  readonly starts: Int32Array;
  readonly rows: Int32Array;
}

/** Gathers places of a pattern, then tells each one's slot in the array of values. Every diagonal place is present. */
export class PatternBuilder {
  readonly #size: number;
  readonly #rows: number[] = [];
  readonly #columns: number[] = [];

  constructor(size: number) {
    this.#size = size;
    for (let index = 0; index < size; index++) this.add(index, index);
  }

  add(row: number, column: number): void {
    this.#rows.push(row);
    this.#columns.push(column);
  }

  /** Sorts by row, then stably by column, and drops what was added twice: linear in the number of places. */
  build(): SparsePattern {
    const size = this.#size;
    const places = new Int32Array(this.#rows.length);
    for (let place = 0; place < places.length; place++) places[place] = place;
    const byRow = countingSort(places, this.#rows, size);
    const byColumn = countingSort(byRow, this.#columns, size);
    const starts = new Int32Array(size + 1);
    const rows = new Int32Array(byColumn.length);
    let count = 0;
    let column = -1;
    for (const place of byColumn) {
      const row = this.#rows[place] as number;
      if (this.#columns[place] === column && rows[count - 1] === row) continue;
      column = this.#columns[place] as number;
      rows[count++] = row;
      starts[column + 1] = count;
    }
    return { size, starts, rows: rows.slice(0, count) };
  }
}

function countingSort(places: Int32Array, keys: readonly number[], size: number): Int32Array {
  const next = new Int32Array(size + 1);
  for (const key of keys) next[key + 1] = (next[key + 1] as number) + 1;
  for (let key = 0; key < size; key++) next[key + 1] = (next[key + 1] as number) + (next[key] as number);
  const sorted = new Int32Array(places.length);
  for (const place of places) {
    const key = keys[place] as number;
    const at = next[key] as number;
    sorted[at] = place;
    next[key] = at + 1;
  }
  return sorted;
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
