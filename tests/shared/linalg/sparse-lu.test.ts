import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { approximateMinimumDegree } from '#shared/linalg/approximate-minimum-degree';
import { analyse } from '#shared/linalg/lu-analysis';
import { SparseLu } from '#shared/linalg/sparse-lu';
import { PatternBuilder, slotOf } from '#shared/linalg/sparse-matrix';
import { strongComponents } from '#shared/linalg/strong-components';

type Entry = readonly [row: number, column: number, value: number];

function matrixOf(size: number, entries: readonly Entry[]) {
  const builder = new PatternBuilder(size);
  for (const [row, column] of entries) builder.add(row, column);
  const pattern = builder.build();
  const values = new Float64Array(pattern.rows.length);
  const dense = Array.from({ length: size }, () => new Float64Array(size));
  for (const [row, column, value] of entries) {
    const slot = slotOf(pattern, row, column);
    values[slot] = (values[slot] ?? 0) + value;
    const line = dense[row];
    if (line) line[column] = (line[column] ?? 0) + value;
  }
  return { pattern, values, dense };
}

function times(dense: readonly Float64Array[], x: Float64Array): Float64Array {
  return Float64Array.from(dense, (row) => row.reduce((sum, value, column) => sum + value * (x[column] ?? 0), 0));
}

/** Laplace expansion: slow, and nothing like an elimination. */
function determinant(rows: readonly (readonly number[])[]): number {
  const [first, ...rest] = rows;
  if (!first) return 1;
  return first.reduce(
    (sum, value, column) =>
      value === 0
        ? sum
        : sum + (column % 2 ? -value : value) * determinant(rest.map((row) => row.filter((_, at) => at !== column))),
    0,
  );
}

const entries = (size: number) =>
  fc.array(
    fc.tuple(
      fc.nat(size - 1),
      fc.nat(size - 1),
      fc.double({ min: -1, max: 1, noNaN: true }).filter((v) => Math.abs(v) > 1e-3),
    ),
    { maxLength: 3 * size },
  );

describe('sparse LU', () => {
  test('gives back the vector that a sparse matrix multiplied', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 40 }).chain((size) => fc.tuple(fc.constant(size), entries(size))),
        ([size, off]) => {
          const diagonal = Array.from({ length: size }, (_, index): Entry => [index, index, 4 + 3 * size]);
          const { pattern, values, dense } = matrixOf(size, [...off, ...diagonal]);
          const lu = new SparseLu(pattern);
          expect(lu.factor(values)).toBe(true);
          const wanted = Float64Array.from({ length: size }, (_, index) => Math.sin(index + 1));
          const x = times(dense, wanted);
          lu.solve(x);
          for (let index = 0; index < size; index++) expect(x[index]).toBeCloseTo(wanted[index] ?? 0, 10);
        },
      ),
      { seed: 1 },
    );
  });

  test('pivots away from zero diagonals and tells the sign of the determinant', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 6 }).chain((size) => fc.tuple(fc.constant(size), entries(size))),
        ([size, list]) => {
          const { pattern, values, dense } = matrixOf(size, list);
          const exact = determinant(dense.map((row) => [...row]));
          const lu = new SparseLu(pattern);
          const factored = lu.factor(values);
          fc.pre(Math.abs(exact) > 1e-6);
          expect(factored).toBe(true);
          expect(lu.determinantSign(0)).toBe(Math.sign(exact));
          const wanted = Float64Array.from({ length: size }, (_, index) => index - 1.5);
          const x = times(dense, wanted);
          lu.solve(x);
          for (let index = 0; index < size; index++) expect(x[index]).toBeCloseTo(wanted[index] ?? 0, 4);
        },
      ),
      { seed: 2, numRuns: 300 },
    );
  });

  test('is indifferent to rows of very different size', () => {
    const { pattern, values } = matrixOf(3, [
      [0, 0, 1e-12],
      [1, 0, 1e-3],
      [1, 1, 2e-3],
      [2, 1, 5],
      [2, 2, 40],
    ]);
    const lu = new SparseLu(pattern);
    expect(lu.factor(values)).toBe(true);
    const x = Float64Array.of(1e-12, 1e-3 + 4e-3, 10 + 120);
    lu.solve(x);
    expect([...x]).toEqual([1, 2, 3]);
  });

  test('refuses a singular matrix and one that is not finite, and serves again afterwards', () => {
    const { pattern, values } = matrixOf(2, [
      [0, 0, 1],
      [0, 1, 2],
      [1, 0, 2],
      [1, 1, 4],
    ]);
    const lu = new SparseLu(pattern);
    expect(lu.factor(values)).toBe(false);
    expect(lu.factor(Float64Array.of(Number.NaN, 1, 1, 1))).toBe(false);
    expect(lu.factor(Float64Array.of(2, 0, 0, 4))).toBe(true);
    const x = Float64Array.of(2, 4);
    lu.solve(x);
    expect([...x]).toEqual([1, 1]);
  });

  test('orders a star from its tips, so that the hub fills nothing in', () => {
    const builder = new PatternBuilder(5);
    for (const tip of [1, 2, 3, 4]) builder.add(0, tip);
    expect([...approximateMinimumDegree(builder.build())].indexOf(0)).toBeGreaterThanOrEqual(3);
  });

  test('keeps its pattern while pivots are good, exchanges rows when one turns poor, and is right both times', () => {
    const { pattern } = matrixOf(2, [
      [0, 0, 1],
      [0, 1, 1],
      [1, 0, 1],
      [1, 1, 1],
    ]);
    const lu = new SparseLu(pattern);
    for (const first of [2, 1e-9, 0, 3]) {
      // By columns: (first, 1), (1, 1); the exact solution of (first + 2, 3) is (1, 2).
      expect(lu.factor(Float64Array.of(first, 1, 1, 1))).toBe(true);
      const x = Float64Array.of(first + 2, 3);
      lu.solve(x);
      expect(x[0]).toBeCloseTo(1, 12);
      expect(x[1]).toBeCloseTo(2, 12);
      expect(lu.determinantSign(0)).toBe(Math.sign(first - 1));
    }
  });

  test('gives bit by bit what a new object gives when the analysis is shared', () => {
    const list: Entry[] = Array.from({ length: 60 }, (_, at) => [(at * 7) % 20, (at * 11 + 3) % 20, 1 + (at % 5)]);
    const diagonal = Array.from({ length: 20 }, (_, index): Entry => [index, index, 30]);
    const { pattern, values } = matrixOf(20, [...list, ...diagonal]);
    const analysis = analyse(pattern);
    const [used, fresh] = [new SparseLu(pattern, analysis), new SparseLu(pattern, analysis)];
    used.factor(values.map((value, slot) => value * (1 + slot)));
    const [one, other] = [used, fresh].map((lu) => {
      lu.factor(values);
      const x = new Float64Array(20).fill(1);
      lu.solve(x);
      return x;
    });
    expect(one).toEqual(other);
  });
});

/** Entries below the diagonal that eliminating A + Aᵀ in an order makes, by playing it through. */
function fill(size: number, edges: readonly (readonly [number, number])[], order: Int32Array): number {
  const around = Array.from({ length: size }, () => new Set<number>());
  for (const [a, b] of edges) {
    around[a]?.add(b);
    around[b]?.add(a);
  }
  let count = 0;
  for (const node of order) {
    const clique = [...(around[node] ?? [])];
    count += clique.length;
    for (const one of clique) {
      around[one]?.delete(node);
      for (const other of clique) if (other !== one) around[one]?.add(other);
    }
  }
  return count;
}

describe('orderings', () => {
  const mesh = (side: number) =>
    Array.from({ length: side * side }, (_, node) => node).flatMap((node): [number, number][] => [
      ...(node % side < side - 1 ? [[node, node + 1] as [number, number]] : []),
      ...(node + side < side * side ? [[node, node + side] as [number, number]] : []),
    ]);

  test('approximate minimum degree is a permutation that fills a mesh in far less than its natural order', () => {
    const side = 24;
    const edges = mesh(side);
    const builder = new PatternBuilder(side * side);
    for (const [a, b] of edges) builder.add(a, b);
    const order = approximateMinimumDegree(builder.build());
    expect([...order].sort((a, b) => a - b)).toEqual(Array.from({ length: side * side }, (_, index) => index));
    const natural = Int32Array.from({ length: side * side }, (_, index) => index);
    // In natural order a mesh fills its band: side³ entries or so.
    expect(fill(side * side, edges, natural)).toBeGreaterThan(0.9 * side ** 3);
    expect(fill(side * side, edges, order)).toBeLessThan(0.5 * side ** 3);
  });

  test('strong components come out so that no entry lies below the blocks', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 30 }).chain((size) => fc.tuple(fc.constant(size), entries(size))),
        ([size, list]) => {
          const { pattern } = matrixOf(size, list);
          const { order, starts } = strongComponents(pattern);
          const blockOf = new Map<number, number>();
          for (let block = 0; block + 1 < starts.length; block++) {
            for (const index of order.subarray(starts[block], starts[block + 1])) blockOf.set(index, block);
          }
          expect(blockOf.size).toBe(size);
          for (const [row, column] of list) expect(blockOf.get(row)).toBeLessThanOrEqual(blockOf.get(column) ?? -1);
        },
      ),
      { seed: 3 },
    );
  });

  test('a chain splits into blocks of one, a ring stays whole', () => {
    const chain = new PatternBuilder(4);
    for (const [row, column] of [
      [1, 0],
      [2, 1],
      [3, 2],
    ] as const)
      chain.add(row, column);
    expect([...strongComponents(chain.build()).order]).toEqual([3, 2, 1, 0]);
    chain.add(0, 3);
    expect([...strongComponents(chain.build()).starts]).toEqual([0, 4]);
  });
});
