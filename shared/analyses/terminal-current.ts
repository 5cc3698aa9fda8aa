import type { CircuitPart } from '../circuit/circuit-file';
import type { Solution } from './operating-point-record';

type CurrentsOf = Pick<Solution, 'fets' | 'sources' | 'resistors'>;

/**
 * The current that leaves a part by one of its terminals into the net there, in A; undefined for a terminal of which the
 * record tells nothing (gates, bodies, capacitors, inductors) and for a part it does not hold.
 */
export function terminalCurrent(
  { fets, sources, resistors }: CurrentsOf,
  kind: CircuitPart['kind'],
  ref: string,
  pin: string,
): number | undefined {
  switch (kind) {
    case 'resistor':
      return signed(own(resistors, ref)?.current, pin, 'b', 'a');
    case 'voltage':
      return signed(own(sources, ref)?.current, pin, 'plus', 'minus');
    case 'current':
      return signed(own(sources, ref)?.current, pin, 'to', 'from');
    case 'nfet':
      return signed(own(fets, ref)?.id, pin, 'source', 'drain');
    case 'pfet':
      return signed(own(fets, ref)?.id, pin, 'drain', 'source');
    case 'capacitor':
    case 'inductor':
      return undefined;
  }
}

function own<T>(record: Readonly<Record<string, T>>, name: string): T | undefined {
  return Object.hasOwn(record, name) ? record[name] : undefined;
}

function signed(current: number | undefined, pin: string, leavesBy: string, entersBy: string): number | undefined {
  if (current === undefined) return undefined;
  if (pin === leavesBy) return current;
  return pin === entersBy ? 0 - current : undefined;
}
