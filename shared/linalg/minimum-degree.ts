import type { SparsePattern } from './sparse-matrix';

/**
 * Minimum degree ordering of A + Aᵀ (Markowitz, Management Science 3, 1957; Tinney and Walker, Proc. IEEE 55, 1967, both
 * from memory): eliminate the node with the fewest neighbours, join its neighbours, repeat. Ties go to the lower index.
 */
export function minimumDegreeOrder(pattern: SparsePattern): Int32Array {
  const { size, starts, rows } = pattern;
  const neighbours = Array.from({ length: size }, () => new Set<number>());
  for (let column = 0; column < size; column++) {
    for (let at = starts[column] ?? 0; at < (starts[column + 1] ?? 0); at++) {
      const row = rows[at] ?? 0;
      if (row === column) continue;
      neighbours[row]?.add(column);
      neighbours[column]?.add(row);
    }
  }
  const order = new Int32Array(size);
  const left = new Set(neighbours.keys());
  for (let position = 0; position < size; position++) {
    let next = -1;
    let least = Number.POSITIVE_INFINITY;
    for (const node of left) {
      const degree = neighbours[node]?.size ?? 0;
      if (degree < least) {
        least = degree;
        next = node;
      }
    }
    order[position] = next;
    left.delete(next);
    const clique = neighbours[next] ?? new Set<number>();
    for (const node of clique) {
      const around = neighbours[node];
      if (!around) continue;
      around.delete(next);
      for (const other of clique) if (other !== node) around.add(other);
    }
  }
  return order;
}
