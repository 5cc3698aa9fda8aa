import { approximateMinimumDegree } from './approximate-minimum-degree';
import { type Elimination, fillIn } from './gilbert-peierls';
import type { SparsePattern } from './sparse-matrix';
import { type Blocks, strongComponents } from './strong-components';

/** Part of a matrix by columns of the order: rows as places in the order, and each entry's slot in the pattern. */
export interface OrderedColumns {
  readonly starts: Int32Array;
  readonly rows: Int32Array;
  readonly slots: Int32Array;
}

/**
 * All of a factorisation that the pattern alone decides, after Davis and Palamadai Natarajan (ACM TOMS Algorithm 907,
 * 2010): block triangular form, each block in approximate minimum degree order, and the fill-in of elimination along the
 * diagonal. It never changes, so any number of factorisations may share it.
 */
export interface LuAnalysis {
  readonly pattern: SparsePattern;
  /** Original index of each place. Rows and columns move alike. */
  readonly order: Int32Array;
  readonly blockStarts: Int32Array;
  /** Entries within the diagonal blocks, and those above them, which no elimination touches. */
  readonly inner: OrderedColumns;
  readonly outer: OrderedColumns;
  readonly alongDiagonal: Elimination;
}

export function analyse(pattern: SparsePattern): LuAnalysis {
  const blocks = strongComponents(pattern);
  const order = orderWithin(pattern, blocks);
  const { inner, outer } = splitColumns(pattern, order, blocks.starts);
  const alongDiagonal = fillIn(inner, order);
  return { pattern, order, blockStarts: blocks.starts, inner, outer, alongDiagonal };
}

function orderWithin(pattern: SparsePattern, blocks: Blocks): Int32Array {
  const order = blocks.order.slice();
  const local = new Int32Array(pattern.size).fill(-1);
  for (let block = 0; block + 1 < blocks.starts.length; block++) {
    const members = blocks.order.subarray(blocks.starts[block], blocks.starts[block + 1]);
    if (members.length < 3) continue;
    // By index, so that ties fall the same way however the search came upon the members.
    members.sort();
    for (let place = 0; place < members.length; place++) local[members[place] as number] = place;
    const inside = approximateMinimumDegree(restrict(pattern, members, local));
    for (let place = 0; place < members.length; place++) {
      order[(blocks.starts[block] as number) + place] = members[inside[place] as number] as number;
    }
    for (const member of members) local[member] = -1;
  }
  return order;
}

/** The rows and columns of `members` alone; `local` is their place among them, −1 elsewhere. */
function restrict({ starts, rows }: SparsePattern, members: Int32Array, local: Int32Array): SparsePattern {
  const kept: number[] = [];
  const keptStarts = new Int32Array(members.length + 1);
  for (let place = 0; place < members.length; place++) {
    const column = members[place] as number;
    for (let slot = starts[column] as number; slot < (starts[column + 1] as number); slot++) {
      const row = local[rows[slot] as number] as number;
      if (row >= 0) kept.push(row);
    }
    keptStarts[place + 1] = kept.length;
  }
  return { size: members.length, starts: keptStarts, rows: Int32Array.from(kept) };
}

function splitColumns(
  { size, starts, rows }: SparsePattern,
  order: Int32Array,
  blockStarts: Int32Array,
): { inner: OrderedColumns; outer: OrderedColumns } {
  const placeOf = new Int32Array(size);
  for (let place = 0; place < size; place++) placeOf[order[place] as number] = place;
  const make = () => ({ starts: new Int32Array(size + 1), rows: [] as number[], slots: [] as number[] });
  const inner = make();
  const outer = make();
  let block = 0;
  for (let place = 0; place < size; place++) {
    if (place >= (blockStarts[block + 1] as number)) block++;
    const column = order[place] as number;
    for (let slot = starts[column] as number; slot < (starts[column + 1] as number); slot++) {
      const row = placeOf[rows[slot] as number] as number;
      const side = row < (blockStarts[block] as number) ? outer : inner;
      side.rows.push(row);
      side.slots.push(slot);
    }
    inner.starts[place + 1] = inner.rows.length;
    outer.starts[place + 1] = outer.rows.length;
  }
  const pack = (side: typeof inner): OrderedColumns => ({
    starts: side.starts,
    rows: Int32Array.from(side.rows),
    slots: Int32Array.from(side.slots),
  });
  return { inner: pack(inner), outer: pack(outer) };
}
