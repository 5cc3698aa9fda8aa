import { pinPlaces } from '../geometry/pins';
import type { GridPoint } from '../geometry/place';
import { bodyLedOut, type Drawing, type DrawnPart, isComponent, type WireEnd } from './drawing';
import { byReference } from './reference-order';
import { UnionFind } from './union-find';

/** A terminal of a drawn part, where it lies on the sheet. */
export type Terminal = WireEnd & { readonly at: GridPoint };

export type DrawnNet = {
  readonly name: string;
  /** False where the name was made from the net's lowest terminal. */
  readonly named: boolean;
  /** Every terminal on it, those of ground, supply, net-name and junction symbols included. */
  readonly terminals: readonly Terminal[];
};

/** Two names given to one net; the circuit knows it by the first. */
export type NamesMeet = { readonly kept: string; readonly names: readonly string[] };

export type DrawnNets = {
  readonly nets: ReadonlyMap<string, DrawnNet>;
  readonly netOf: ReadonlyMap<string, string>;
  readonly namesMeet: readonly NamesMeet[];
};

export function terminalKey(end: WireEnd): string {
  return `${end.part}/${end.pin}`;
}

/** The nets of a drawing: terminals joined by wires, by touching each other, and by equal names. */
export function findNets(drawing: Drawing): DrawnNets {
  const parts = new Map(drawing.parts.map((part) => [part.id, part]));
  const terminals = drawing.parts.flatMap((part) =>
    pinPlaces(part.kind, part.place, bodyLedOut(part)).map(({ pin, at }): Terminal => ({ part: part.id, pin, at })),
  );
  const joined = new UnionFind();
  for (const terminal of terminals) joined.join(terminalKey(terminal), `at ${terminal.at.x} ${terminal.at.y}`);
  for (const wire of drawing.wires) joined.join(terminalKey(wire.from), terminalKey(wire.to));
  for (const part of drawing.parts) {
    const name = nameGiven(part, drawing.settings.ground);
    if (name !== undefined) joined.join(`${part.id}/net`, `named ${name}`);
  }

  const groups = new Map<string, Terminal[]>();
  for (const terminal of terminals) {
    const root = joined.find(terminalKey(terminal));
    const group = groups.get(root);
    if (group) group.push(terminal);
    else groups.set(root, [terminal]);
  }

  const nets = new Map<string, DrawnNet>();
  const netOf = new Map<string, string>();
  const namesMeet: NamesMeet[] = [];
  const enter = (name: string, named: boolean, group: readonly Terminal[]) => {
    nets.set(name, { name, named, terminals: group });
    for (const terminal of group) netOf.set(terminalKey(terminal), name);
  };
  const nameless: { lowest: string; group: Terminal[] }[] = [];
  for (const group of groups.values()) {
    const names = namesOf(group, parts, drawing.settings.ground);
    const [kept] = names;
    if (kept !== undefined) {
      enter(kept, true, group);
      if (names.length > 1) namesMeet.push({ kept, names });
      continue;
    }
    const lowest = lowestTerminal(group, parts);
    if (lowest !== undefined) nameless.push({ lowest, group });
  }
  for (const { lowest, group } of nameless) {
    let name = lowest;
    for (let n = 2; nets.has(name); n++) name = `${lowest}_${n}`;
    enter(name, false, group);
  }
  return { nets, netOf, namesMeet };
}

function nameGiven(part: DrawnPart, ground: string): string | undefined {
  if (part.kind === 'ground') return ground;
  return part.kind === 'supply' || part.kind === 'net-name' ? part.values.net : undefined;
}

/** Names given to a net, the one it takes first: ground, then supplies, then net names, each in order of spelling. */
function namesOf(group: readonly Terminal[], parts: ReadonlyMap<string, DrawnPart>, ground: string): string[] {
  const rank = new Map<string, number>();
  for (const { part: id } of group) {
    const part = parts.get(id);
    const name = part && nameGiven(part, ground);
    if (part === undefined || name === undefined) continue;
    const own = name === ground ? 0 : part.kind === 'supply' ? 1 : 2;
    rank.set(name, Math.min(own, rank.get(name) ?? own));
  }
  return [...rank].sort(([a, rankA], [b, rankB]) => rankA - rankB || (a < b ? -1 : 1)).map(([name]) => name);
}

/** A name that moving things never changes: the first terminal by reference, such as `Q1.drain`. */
function lowestTerminal(group: readonly Terminal[], parts: ReadonlyMap<string, DrawnPart>): string | undefined {
  let lowest: { ref: string; pin: string } | undefined;
  for (const { part: id, pin } of group) {
    const part = parts.get(id);
    if (!part || !isComponent(part)) continue;
    if (!lowest || byReference(part.ref, lowest.ref) < 0) lowest = { ref: part.ref, pin };
  }
  return lowest && `${lowest.ref}.${lowest.pin}`;
}
