import type { PartKind } from './circuit-file';
import { type Problem, problem } from './problem';
import { TERMINALS, type Terminal, type TerminalName } from './terminals';
import { UnionFind } from './union-find';

/** As much of a part as its wiring needs: known even where a value of it is wrong. */
export interface WiredPart {
  readonly ref: string;
  readonly kind: PartKind;
  readonly terminals: readonly Terminal[];
}

/** The ends of the path that a part offers to direct current, whatever the devices do; null where there is none. */
const CURRENT_PATH: Record<PartKind, readonly [TerminalName, TerminalName] | null> = {
  resistor: TERMINALS.resistor,
  voltage: TERMINALS.voltage,
  inductor: TERMINALS.inductor,
  nfet: ['drain', 'source'],
  pfet: ['drain', 'source'],
  current: null,
  capacitor: null,
};

/** Loops of voltage sources and inductors. They stay loops whatever else the circuit holds. */
export function findVoltageLoops(parts: readonly WiredPart[]): Problem[] {
  const joined = new UnionFind();
  const forest = new Map<string, { ref: string; net: string }[]>();
  const problems: Problem[] = [];
  for (const part of byRef(parts)) {
    if (part.kind !== 'voltage' && part.kind !== 'inductor') continue;
    const [a, b] = pathOf(part) ?? [];
    if (a === undefined || b === undefined) continue;
    if (joined.join(a, b)) {
      forest.set(a, [...(forest.get(a) ?? []), { ref: part.ref, net: b }]);
      forest.set(b, [...(forest.get(b) ?? []), { ref: part.ref, net: a }]);
    } else {
      const path = pathThrough(forest, a, b);
      const refs = [part.ref, ...path.map((step) => step.ref)];
      problems.push(
        problem(
          'voltage-loop',
          refs.length === 1
            ? `${part.ref} has both of its terminals on net ${a}, so its current has no limit. Wire them to two different nets.`
            : `${refs.join(', ')} form a loop of voltage sources and inductors: their currents have no definite value. Put a resistor into the loop or take one of them out.`,
          { refs, nets: [...new Set([a, ...path.map((step) => step.net)])] },
        ),
      );
    }
  }
  return problems;
}

/** What is wrong with the wiring of a complete circuit: nothing at ground, pieces cut off from it, terminals alone on a net. */
export function checkPaths(parts: readonly WiredPart[], ground: string): Problem[] {
  const onNet = terminalsByNet(parts);
  const dangling = [...onNet].flatMap(([net, touching]) => {
    const [only, ...more] = touching;
    return only === undefined || more.length > 0 ? [] : [danglingTerminal(net, only)];
  });
  if (!onNet.has(ground)) {
    const message = `No part touches the ground net ${ground}. Wire the point that voltages are measured from to ${ground}.`;
    return [problem('no-ground', message, { nets: [ground] }), ...dangling];
  }

  const pieces = new UnionFind();
  for (const part of parts) {
    const path = pathOf(part);
    if (path) pieces.join(path[0], path[1]);
  }
  const home = pieces.find(ground);
  const adrift = new Map<string, string[]>();
  for (const net of onNet.keys()) {
    const piece = pieces.find(net);
    if (piece !== home) adrift.set(piece, [...(adrift.get(piece) ?? []), net]);
  }

  const problems: Problem[] = [];
  for (const [piece, nets] of adrift) {
    const forced = byRef(parts).filter((part) => {
      const inside = part.terminals.filter((terminal) => pieces.find(terminal.net) === piece).length;
      return part.kind === 'current' && inside === 1;
    });
    if (forced.length > 0) {
      const refs = forced.map((part) => part.ref);
      problems.push(
        problem(
          'current-cutset',
          `${refs.join(', ')} ${refs.length === 1 ? 'forces' : 'force'} current into or out of ${named(nets)}, which ${nets.length === 1 ? 'has' : 'have'} no other path for direct current to ground. Give that current a path: a resistor or a device to ground or a supply.`,
          { refs, nets },
        ),
      );
    } else {
      for (const net of nets) problems.push(floatingNet(net, onNet.get(net) ?? []));
    }
  }
  return [...problems, ...dangling];
}

function floatingNet(net: string, touching: readonly { ref: string; terminal: TerminalName }[]): Problem {
  const refs = [...new Set(touching.map((touch) => touch.ref))];
  return problem(
    'floating-net',
    `Net ${net} (${touching.map((touch) => `${touch.ref} ${touch.terminal}`).join(', ')}) has no path for direct current to ground, whatever the devices do. Tie it to ground or a supply, through a resistor or directly.`,
    { refs, nets: [net] },
  );
}

function danglingTerminal(net: string, only: { ref: string; terminal: TerminalName }): Problem {
  return problem(
    'dangling-terminal',
    `${only.ref}'s ${only.terminal} is the only terminal on net ${net}. Wire it to something, or check the net's name.`,
    { refs: [only.ref], nets: [net] },
  );
}

function named(nets: readonly string[]): string {
  return nets.length === 1 ? `net ${nets[0]}` : `the nets ${nets.join(', ')}`;
}

/** Touching terminals of every net, nets and parts in the order of their names. */
function terminalsByNet(parts: readonly WiredPart[]): Map<string, { ref: string; terminal: TerminalName }[]> {
  const onNet = new Map<string, { ref: string; terminal: TerminalName }[]>();
  for (const part of byRef(parts)) {
    for (const { name, net } of part.terminals) {
      const touching = onNet.get(net);
      if (touching) touching.push({ ref: part.ref, terminal: name });
      else onNet.set(net, [{ ref: part.ref, terminal: name }]);
    }
  }
  return new Map([...onNet].sort(([a], [b]) => (a < b ? -1 : 1)));
}

function pathOf(part: WiredPart): [string, string] | null {
  const ends = CURRENT_PATH[part.kind];
  if (!ends) return null;
  const [from, to] = ends.map((end) => part.terminals.find((terminal) => terminal.name === end)?.net);
  return from === undefined || to === undefined ? null : [from, to];
}

function pathThrough(
  forest: ReadonlyMap<string, readonly { ref: string; net: string }[]>,
  from: string,
  to: string,
): { ref: string; net: string }[] {
  const cameBy = new Map<string, { ref: string; net: string; from: string }>();
  const queue = [from];
  for (const net of queue) {
    if (net === to) break;
    for (const step of forest.get(net) ?? []) {
      if (step.net === from || cameBy.has(step.net)) continue;
      cameBy.set(step.net, { ...step, from: net });
      queue.push(step.net);
    }
  }
  const path: { ref: string; net: string }[] = [];
  for (let step = cameBy.get(to); step; step = cameBy.get(step.from)) path.push({ ref: step.ref, net: step.net });
  return path;
}

function byRef(parts: readonly WiredPart[]): WiredPart[] {
  return [...parts].sort((a, b) => (a.ref < b.ref ? -1 : a.ref > b.ref ? 1 : 0));
}
