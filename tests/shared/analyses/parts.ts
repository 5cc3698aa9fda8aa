import type { CircuitFile, CircuitPart, FetPart } from '#shared/circuit/circuit-file';

/** Short forms for circuits in tests. */
export const V = (ref: string, plus: string, voltage: number, minus = 'gnd'): CircuitPart => ({
  ref,
  kind: 'voltage',
  plus,
  minus,
  voltage,
});
export const I = (ref: string, from: string, to: string, current: number): CircuitPart => ({
  ref,
  kind: 'current',
  from,
  to,
  current,
});
export const R = (ref: string, a: string, b: string, resistance: number): CircuitPart => ({
  ref,
  kind: 'resistor',
  a,
  b,
  resistance,
});

type More = Partial<Omit<FetPart, 'kind'>>;
/** kn = 2 mA/V², Vt = 0.5 V, λ = 0. */
export const N = (ref: string, drain: string, gate: string, source: string, more: More = {}): FetPart => ({
  ref,
  kind: 'nfet',
  drain,
  gate,
  source,
  k: 2e-3,
  overrides: { threshold: 0.5 },
  ...more,
});
/** kn = 2 mA/V², Vt = −0.5 V, λ = 0. */
export const P = (ref: string, drain: string, gate: string, source: string, more: More = {}): FetPart => ({
  ref,
  kind: 'pfet',
  drain,
  gate,
  source,
  k: 2e-3,
  overrides: { threshold: -0.5 },
  ...more,
});

export function circuit(...parts: CircuitPart[]): CircuitFile {
  return { format: 'stillpoint.circuit', version: 1, ground: 'gnd', parts };
}
