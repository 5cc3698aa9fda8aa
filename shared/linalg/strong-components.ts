import type { SparsePattern } from './sparse-matrix';

/** Indices grouped into blocks: block b is `order[starts[b] … starts[b + 1] − 1]`. */
export interface Blocks {
  readonly order: Int32Array;
  readonly starts: Int32Array;
}

/**
 * Block triangular form: strong components of the graph of a matrix, by Tarjan's algorithm (SIAM J. Comput. 1, 1972, from
 * memory). A column leads to the rows that use it, and a component comes out after all it leads to, so no entry lies
 * below the diagonal blocks. The maximum transversal that the form starts from is the diagonal itself, which a pattern
 * always has. The recursion is unrolled onto `path`, as circuits are deeper than a call stack.
 */
export function strongComponents({ size, starts, rows }: SparsePattern): Blocks {
  const order = new Int32Array(size);
  const blockStarts = [0];
  /** When an index was first met, 0 before; `size + 1` once its component is out. */
  const met = new Int32Array(size);
  const lowest = new Int32Array(size);
  const path = new Int32Array(size);
  const next = new Int32Array(size);
  const open = new Int32Array(size);
  const finished = size + 1;
  let openCount = 0;
  let out = 0;
  let clock = 0;

  for (let root = 0; root < size; root++) {
    if (met[root] !== 0) continue;
    let depth = 0;
    path[0] = root;
    while (depth >= 0) {
      const index = path[depth] as number;
      if (met[index] === 0) {
        clock++;
        met[index] = clock;
        lowest[index] = clock;
        next[index] = starts[index] as number;
        open[openCount++] = index;
      }
      const at = next[index] as number;
      if (at < (starts[index + 1] as number)) {
        const row = rows[at] as number;
        next[index] = at + 1;
        if (met[row] === 0) path[++depth] = row;
        else if (met[row] !== finished) lowest[index] = Math.min(lowest[index] as number, met[row] as number);
        continue;
      }
      depth--;
      if (depth >= 0) {
        const parent = path[depth] as number;
        lowest[parent] = Math.min(lowest[parent] as number, lowest[index] as number);
      }
      if (lowest[index] !== met[index]) continue;
      let member: number;
      do {
        member = open[--openCount] as number;
        met[member] = finished;
        order[out++] = member;
      } while (member !== index);
      blockStarts.push(out);
    }
  }
  return { order, starts: Int32Array.from(blockStarts) };
}
