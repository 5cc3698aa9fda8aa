import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';

/** Reference circuits with their solutions, kept beside the project and not part of it. */
const FOLDER = new URL('../../../../shared/cases/', import.meta.url);

interface Case {
  circuit: unknown;
  expect: {
    status: OperatingPointRecord['status'];
    points?: ExpectedPoint[];
    codes?: string[];
    alsoAllowed?: string[];
    problems?: { code: string; refs?: string[]; nets?: string[] }[];
  };
}
type ExpectedPoint = Record<'nets' | 'fets' | 'sources' | 'resistors', Record<string, Figure>>;
type Figure = number | Record<string, number | string | boolean>;

const files = existsSync(FOLDER) ? readdirSync(FOLDER).filter((name) => name.endsWith('.json')) : [];

function flatten(point: ExpectedPoint): [place: string, value: number | string | boolean][] {
  return Object.entries(point).flatMap(([part, entries]) =>
    Object.entries(entries).flatMap(([name, figure]): [string, number | string | boolean][] =>
      typeof figure === 'object'
        ? Object.entries(figure).map(([quantity, value]) => [`${part} ${name} ${quantity}`, value])
        : [[`${part} ${name}`, figure]],
    ),
  );
}

/** What differs by more than 1 nV (or nA …) + 1 ppm. */
function differences(record: OperatingPointRecord, point: ExpectedPoint): string[] {
  const { nets, fets, sources, resistors } = record;
  const got = new Map(flatten({ nets, fets, sources, resistors }));
  return flatten(point).flatMap(([place, wanted]) => {
    const value = got.get(place);
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
      // A point that is surely unstable is not listed first while another is known, whatever the reference's order.
      expect(record.surelyUnstable).toBe(false);
      const misses = wanted.points.map((point) => differences(record, point));
      if (misses.every((miss) => miss.length > 0)) expect(misses[0]).toEqual([]);
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
