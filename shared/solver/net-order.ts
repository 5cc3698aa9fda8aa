import type { CircuitPart } from '../circuit/circuit-file';

/** Rounds of refinement: nets whose surroundings are alike further out than this are told apart by name. */
const ROUNDS = 12;

/**
 * An order of nets that their names hardly decide, so that renaming them leaves the order of every sum and every
 * elimination as it is: nets are coloured by what is wired to them, again and again with their neighbours' colours (colour
 * refinement: Weisfeiler and Leman, 1968, from memory), and sorted by colour. Names decide among nets that the wiring
 * does not tell apart. Values play no part, so a circuit keeps its order when they change. The result is the place of each net;
 * `numberOf` numbers nets in the order of their names.
 */
export function orderNets(
  parts: readonly CircuitPart[],
  netCount: number,
  numberOf: (net: string) => number,
): Int32Array {
  const wired = parts.map((part) => wiringOf(part, numberOf));
  let colours = new Int32Array(netCount);
  for (let round = 0; round < ROUNDS; round++) {
    const next = colours.map((colour) => mix(colour, 1));
    for (const { kind, like, other } of wired) {
      for (const net of like) next[net] = (next[net] as number) + surroundings(kind, 1, colours, like, other, net);
      for (const net of other) next[net] = (next[net] as number) + surroundings(kind, 2, colours, other, like, net);
    }
    colours = next;
  }
  const places = Int32Array.from({ length: netCount }, (_, net) => net);
  const ordered = places.sort((a, b) => (colours[a] as number) - (colours[b] as number) || a - b);
  const placeOf = new Int32Array(netCount);
  for (let place = 0; place < netCount; place++) placeOf[ordered[place] as number] = place;
  return placeOf;
}

/** A part's terminals in two lots: within `like` they may change places without changing the part; `other` are in order. */
interface Wiring {
  readonly kind: number;
  readonly like: readonly number[];
  readonly other: readonly number[];
}

function wiringOf(part: CircuitPart, numberOf: (net: string) => number): Wiring {
  switch (part.kind) {
    case 'resistor':
    case 'capacitor':
    case 'inductor':
      return { kind: KIND[part.kind], like: [numberOf(part.a), numberOf(part.b)], other: [] };
    case 'voltage':
      return { kind: KIND.voltage, like: [numberOf(part.plus)], other: [numberOf(part.minus)] };
    case 'current':
      return { kind: KIND.current, like: [numberOf(part.from)], other: [numberOf(part.to)] };
    case 'nfet':
    case 'pfet': {
      const [drain, gate, source] = [numberOf(part.drain), numberOf(part.gate), numberOf(part.source)];
      // A body tied to the labelled source makes that end another than the drain.
      if (part.body === undefined) return { kind: KIND[part.kind] + 2, like: [drain], other: [gate, source] };
      return { kind: KIND[part.kind], like: [drain, source], other: [gate, numberOf(part.body)] };
    }
  }
}

/** Numbers that tell the kinds apart; a FET with a tied body counts two higher. */
export const KIND = { resistor: 1, capacitor: 2, inductor: 3, voltage: 4, current: 5, nfet: 6, pfet: 7 } as const;

function surroundings(
  kind: number,
  side: number,
  colours: Int32Array,
  own: readonly number[],
  others: readonly number[],
  net: number,
): number {
  let hash = mix(kind, side);
  if (own.length + others.length > 2 && side === 2) hash = mix(hash, own.indexOf(net));
  let alike = 0;
  for (const other of own) alike = (alike + mix(colours[other] as number, 3)) | 0;
  hash = mix(hash, alike);
  for (const other of others) hash = mix(hash, colours[other] as number);
  return hash;
}

/** A hash of two 32-bit numbers. */
function mix(a: number, b: number): number {
  let hash = Math.imul(a ^ (b + 0x9e3779b9 + (a << 6) + (a >>> 2)), 0x85ebca6b);
  hash = Math.imul(hash ^ (hash >>> 13), 0xc2b2ae35);
  return hash ^ (hash >>> 16);
}
