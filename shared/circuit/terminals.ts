import type { CircuitPart, PartKind } from './circuit-file';

/** The terminals of each kind, in the order the circuit file lists them. A FET's body may be left out. */
export const TERMINALS = {
  resistor: ['a', 'b'],
  voltage: ['plus', 'minus'],
  current: ['from', 'to'],
  capacitor: ['a', 'b'],
  inductor: ['a', 'b'],
  nfet: ['drain', 'gate', 'source', 'body'],
  pfet: ['drain', 'gate', 'source', 'body'],
} as const satisfies Record<PartKind, readonly string[]>;

export type TerminalName = (typeof TERMINALS)[PartKind][number];

export interface Terminal {
  readonly name: TerminalName;
  readonly net: string;
}

/** The terminals that are wired to a net. A body left out is tied to the source inside the part and is none. */
export function terminalsOf(part: CircuitPart): Terminal[] {
  const nets: Partial<Record<TerminalName, string | undefined>> = part;
  return TERMINALS[part.kind].flatMap((name) => {
    const net = nets[name];
    return net === undefined ? [] : [{ name, net }];
  });
}
