import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { OperatingPointRecord, Solution } from '#shared/analyses/operating-point-record';

/** Reference circuits with their solutions, kept beside the project and not part of it. */
const FOLDER = new URL('../../../../shared/cases/', import.meta.url);

interface Case {
  circuit: unknown;
  expect: {
    status: OperatingPointRecord['status'];
    points?: ExpectedPoint[];
    pointsComplete?: boolean;
    codes?: string[];
    alsoAllowed?: string[];
    problems?: { code: string; refs?: string[]; nets?: string[] }[];
  };
}
type ExpectedPoint = Record<'nets' | 'fets' | 'sources' | 'resistors', Record<string, Figure>> & {
  /** Nets that leakage alone holds: where they lie is no part of the point. */
  undriven?: string[];
};
type Figure = number | Record<string, number | string | boolean>;

const files = existsSync(FOLDER) ? readdirSync(FOLDER).filter((name) => name.endsWith('.json')) : [];

function flatten({
  nets,
  fets,
  sources,
  resistors,
}: ExpectedPoint): [place: string, value: number | string | boolean][] {
  return Object.entries({ nets, fets, sources, resistors }).flatMap(([part, entries]) =>
    Object.entries(entries).flatMap(([name, figure]): [string, number | string | boolean][] =>
      typeof figure === 'object'
        ? Object.entries(figure).map(([quantity, value]) => [`${part} ${name} ${quantity}`, value])
        : [[`${part} ${name}`, figure]],
    ),
  );
}

/** What differs by more than 1 nV (or nA …) + 1 ppm. */
function differences(got: Solution, point: ExpectedPoint): string[] {
  const { nets, fets, sources, resistors } = got;
  const figures = new Map(flatten({ nets, fets, sources, resistors }));
  const undriven = new Set(point.undriven);
  const settled = flatten(point).filter(([place, wanted]) => {
    const [part, name = '', quantity] = place.split(' ');
    if (part === 'nets') return !undriven.has(name);
    // A device that may have an undriven net on it: its voltages are not settled, what it does is.
    return undriven.size === 0 || part !== 'fets' || quantity === 'region' || wanted === 0;
  });
  return settled.flatMap(([place, wanted]) => {
    const value = figures.get(place);
    const same =
      typeof wanted === 'number' && typeof value === 'number'
        ? Math.abs(value - wanted) <= 1e-9 + 1e-6 * Math.abs(wanted)
        : value === wanted;
    return same ? [] : [`${place} is ${value}, wanted ${wanted}`];
  });
}

describe.skipIf(files.length === 0)('reference circuits', () => {
  test.each(files)('%s comes out as its solution says', (name) => {
    const { circuit, expect: wanted } = JSON.parse(readFileSync(new URL(name, FOLDER), 'utf8')) as Case;
    const record = operatingPoint(circuit);
    expect(record.status, JSON.stringify(record.problems)).toBe(wanted.status);

    if (wanted.points) {
      const found = [record, ...record.alternatives];
      for (const point of wanted.points) {
        const misses = found.map((one) => differences(one, point));
        if (misses.every((miss) => miss.length > 0)) expect(misses[0], 'a point that was not found').toEqual([]);
      }
      if (wanted.pointsComplete) expect(record.alternatives).toHaveLength(wanted.points.length - 1);
      expect(record.alternativesSearched).toBe(true);
      // A point that is surely unstable is not listed first while another is known, whatever the reference's order.
      expect(record.surelyUnstable).toBe(false);
    }
    if (wanted.codes) {
      const codes = new Set<string>(record.problems.map(({ code }) => code));
      for (const code of wanted.codes) expect(codes).toContain(code);
      for (const code of codes) expect([...wanted.codes, ...(wanted.alsoAllowed ?? [])]).toContain(code);
    }
    for (const problem of wanted.problems ?? []) {
      expect(record.problems).toContainEqual(
        expect.objectContaining({
          code: problem.code,
          ...(problem.refs && { refs: expect.arrayContaining(problem.refs) }),
          ...(problem.nets && { nets: expect.arrayContaining(problem.nets) }),
        }),
      );
    }
  });

  test('of the three points of a started reference the one with every device on is reported, not the rest at zero', () => {
    const { circuit } = JSON.parse(readFileSync(new URL('reference-three-points.json', FOLDER), 'utf8')) as Case;
    expect(operatingPoint(circuit).nets.n1).toBeCloseTo(0.548719151246047, 9);
  });
});
