import { describe, expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { circuit, N, P, R, V } from './parts';

interface Example {
  readonly file: CircuitFile;
  readonly region: string;
  /** A, and V by net, as printed or worked out in the example. */
  readonly id: number;
  readonly nets: Record<string, number>;
}

/** kn = 1 mA/V², |Vt| = 1 V, λ = 0. */
const unity = { k: 1e-3, overrides: { threshold: 1 } };
const unityP = { k: 1e-3, overrides: { threshold: -1 } };

/** Values from memory of worked examples in Sedra and Smith, Microelectronic Circuits, the chapter on MOS devices at DC. */
const EXAMPLES: Record<string, Example> = {
  'a device designed for 0.4 mA and VD = 0.5 V on ±2.5 V': {
    file: circuit(
      V('V1', 'vdd', 2.5),
      V('V2', 'gnd', 2.5, 'vss'),
      R('RD', 'vdd', 'd', 5e3),
      R('RS', 's', 'vss', 3.25e3),
      N('Q1', 'd', 'gnd', 's', { k: 3.2e-3, overrides: { threshold: 0.7 } }),
    ),
    region: 'saturated',
    id: 0.4e-3,
    nets: { d: 0.5, s: -1.2 },
  },
  'a diode-connected device at 80 µA through 25 kΩ': {
    file: circuit(
      V('V1', 'vdd', 3),
      R('R1', 'vdd', 'd', 25e3),
      N('Q1', 'd', 'd', 'gnd', { k: 1e-3, overrides: { threshold: 0.6 } }),
    ),
    region: 'saturated',
    id: 80e-6,
    nets: { d: 1 },
  },
  'four-resistor bias with 10 MΩ and 6 kΩ: 18·ID² − 25·ID + 8 = 0': {
    file: circuit(
      V('V1', 'vdd', 10),
      R('RG1', 'vdd', 'g', 10e6),
      R('RG2', 'g', 'gnd', 10e6),
      R('RD', 'vdd', 'd', 6e3),
      R('RS', 's', 'gnd', 6e3),
      N('Q1', 'd', 'g', 's', unity),
    ),
    region: 'saturated',
    id: 0.5e-3,
    nets: { g: 5, s: 3, d: 7 },
  },
  'a P device at 0.5 mA with VD = 3 V': {
    file: circuit(
      V('V1', 'vdd', 5),
      R('RG1', 'vdd', 'g', 2e6),
      R('RG2', 'g', 'gnd', 3e6),
      R('RD', 'd', 'gnd', 6e3),
      P('Q1', 'd', 'g', 'vdd', unityP),
    ),
    region: 'saturated',
    id: 0.5e-3,
    nets: { d: 3 },
  },
  'a complementary pair with both gates at ground': {
    file: circuit(
      V('V1', 'vdd', 2.5),
      V('V2', 'vss', -2.5),
      P('Q1', 'out', 'gnd', 'vdd', unityP),
      N('Q2', 'out', 'gnd', 'vss', unity),
      R('R1', 'out', 'gnd', 1e4),
    ),
    region: 'saturated',
    id: 1.125e-3,
    nets: { out: 0 },
  },
};

describe('worked examples of a textbook', () => {
  test.each(Object.entries(EXAMPLES))('%s', (_, { file, region, id, nets }) => {
    const record = operatingPoint(file);
    expect(record.fets.Q1?.region).toBe(region);
    expect(record.fets.Q1?.id).toBeCloseTo(id, 12);
    for (const [net, voltage] of Object.entries(nets)) expect(record.nets[net]).toBeCloseTo(voltage, 9);
  });

  test('a triode device at VD = 0.1 V through 12.4 kΩ, which the book rounds', () => {
    const record = operatingPoint(
      circuit(V('V1', 'vdd', 5), R('R1', 'vdd', 'd', 12.4e3), N('Q1', 'd', 'vdd', 'gnd', unity)),
    );
    expect(record.fets.Q1?.region).toBe('triode');
    expect(record.nets.d).toBeCloseTo(0.1, 3);
    expect(record.fets.Q1?.id).toBeCloseTo(0.395e-3, 6);
  });
});
