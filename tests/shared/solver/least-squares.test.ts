import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { describe, expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import { circuit, N, P, R, V } from '../analyses/parts';

/**
 * The same circuits solved another way: node equations written out by hand for each one, minimised as a sum of squares
 * by ml-levenberg-marquardt (a general-purpose package) with difference quotients for slopes.
 */
function minimise(residuals: (v: readonly number[]) => readonly number[], start: number[]): number[] {
  const equations = Array.from(residuals(start), (_, index) => index);
  let voltages = start;
  // Started anew from each answer: its difference quotients are crude, and every pass takes up where they stopped.
  for (let pass = 0; pass < 40; pass++) {
    voltages = levenbergMarquardt(
      { x: equations, y: equations.map(() => 0) },
      (v: number[]) => (index: number) => residuals(v)[index] ?? Number.NaN,
      {
        initialValues: voltages,
        gradientDifference: 1e-7,
        centralDifference: true,
        damping: 1e-6,
        maxIterations: 100,
        errorTolerance: 1e-28,
      },
    ).parameterValues;
  }
  return voltages;
}

/** mA of an N channel whose drain is above its source, Vt0 = 0.5 V, kn in mA/V². */
function current(kn: number, vgs: number, vds: number, lambda: number, vt = 0.5): number {
  const vov = vgs - vt;
  if (vov <= 0) return 0;
  return (vds >= vov ? (kn / 2) * vov ** 2 : kn * (vov - vds / 2) * vds) * (1 + lambda * vds);
}

const GAMMA = 0.4;
const bulk = (vsb: number): number => 0.5 + GAMMA * (Math.sqrt(0.7 + vsb) - Math.sqrt(0.7));

describe('equations of our own, minimised by a general-purpose library', () => {
  test('a degenerated stage with body effect and modulation', () => {
    const record = operatingPoint(
      circuit(
        V('V1', 'vdd', 3),
        R('R1', 'vdd', 'g', 2e4),
        R('R2', 'g', 'gnd', 1e4),
        R('RD', 'vdd', 'd', 5e3),
        R('RS', 's', 'gnd', 1e3),
        N('Q1', 'd', 'g', 's', { body: 'gnd', overrides: { threshold: 0.5, lambda: 0.06, gamma: GAMMA } }),
      ),
    );
    const [g, d, s] = minimise(
      ([g = 0, d = 0, s = 0]) => {
        const id = current(2, g - s, d - s, 0.06, bulk(s));
        return [(3 - g) / 20 - g / 10, (3 - d) / 5 - id, s / 1 - id];
      },
      [1, 2, 0.3],
    );
    for (const [net, voltage] of Object.entries({ g, d, s }))
      expect(record.nets[net]).toBeCloseTo(voltage ?? Number.NaN, 6);
  });

  test('a differential pair with a mirror load and unequal inputs', () => {
    const modulated = (threshold: number) => ({ overrides: { threshold, lambda: 0.1 } });
    const record = operatingPoint(
      circuit(
        V('V1', 'vdd', 3),
        V('VA', 'a', 1.52),
        V('VB', 'b', 1.5),
        R('RT', 't', 'gnd', 5e3),
        N('Q1', 'm', 'a', 't', modulated(0.5)),
        N('Q2', 'out', 'b', 't', modulated(0.5)),
        P('Q3', 'm', 'm', 'vdd', modulated(-0.5)),
        P('Q4', 'out', 'm', 'vdd', modulated(-0.5)),
      ),
    );
    const [t, m, out] = minimise(
      ([t = 0, m = 0, out = 0]) => {
        const left = current(2, 1.52 - t, m - t, 0.1);
        const right = current(2, 1.5 - t, out - t, 0.1);
        return [t / 5 - left - right, left - current(2, 3 - m, 3 - m, 0.1), right - current(2, 3 - m, 3 - out, 0.1)];
      },
      [0.7, 2.2, 2],
    );
    for (const [net, voltage] of Object.entries({ t, m, out }))
      expect(record.nets[net]).toBeCloseTo(voltage ?? Number.NaN, 6);
  });
});
