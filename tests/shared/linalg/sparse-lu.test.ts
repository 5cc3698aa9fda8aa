import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { approximateMinimumDegree } from '#shared/linalg/approximate-minimum-degree';
import { SparseLu } from '#shared/linalg/sparse-lu';
import { PatternBuilder, slotOf } from '#shared/linalg/sparse-matrix';

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
});
