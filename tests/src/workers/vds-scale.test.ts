import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { withoutSolution } from '#shared/analyses/operating-point';
import type { FetPoint, OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { vdsScale } from '../../../src/workers/vds-scale';

function recordOf(points: readonly Pick<FetPoint, 'vds' | 'vdsSat'>[]): OperatingPointRecord {
  const rest = { region: 'saturated', id: 0, vgs: 0, vsb: 0, vt: 0, vov: 0, saturationMargin: 0 } as const;
  const small = { gm: 0, gds: 0, gmb: 0, power: 0, reversed: false };
  const fets = Object.fromEntries(points.map((point, index) => [`Q${index}`, { ...rest, ...small, ...point }]));
  return { ...withoutSolution('invalid', []), status: 'solved', fets };
}

describe('the common scale of the margin rulers', () => {
  test.each([
    [1.37, 0.3, 1],
    [0.86, 0.3, 1],
    [4.9, 0.3, 5],
    [11.8, 0.4, 10],
    [0.04, 0.03, 0.05],
  ])('a largest VDS of %d V with its knee at %d V ends it at %d V', (vds, vdsSat, end) => {
    expect(vdsScale(recordOf([{ vds, vdsSat }]))).toBe(end);
    expect(vdsScale(recordOf([{ vds: -vds, vdsSat }]))).toBe(end);
  });

  test('it is long enough for every knee and every margin asked for, and its end is a 1-2-5 number', () => {
    const volts = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.record({ vds: volts, vdsSat: volts }), { minLength: 1 }), volts, (points, asked) => {
        const end = vdsScale(recordOf(points), () => asked);
        expect(end).toBeGreaterThanOrEqual(Math.max(...points.map(({ vdsSat }) => vdsSat + asked)) * (1 - 1e-6));
        expect(['1', '2', '5']).toContain(end.toExponential(6).replace(/\.0+e.*/, ''));
      }),
    );
  });

  test('a sheet without a voltage still has a scale', () => {
    expect(vdsScale(recordOf([{ vds: 0, vdsSat: 0 }]))).toBe(1);
    expect(vdsScale(recordOf([]))).toBe(1);
  });
});
