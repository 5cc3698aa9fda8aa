import { equalityDeep } from 'lib0/function';
import { type DrawnComponent, type DrawnPart, isComponent } from './drawing';
import { byReference } from './reference-order';

/** What a part keeps to itself though its group has equal values. */
const OF_ITS_OWN: ReadonlySet<string> = new Set(['match', 'bodyLedOut']);

export function isMatched(name: string): boolean {
  return !OF_ITS_OWN.has(name);
}

/** The name of the group that a part belongs to. */
export function matchOf(part: DrawnPart): string | undefined {
  return isComponent(part) ? part.values.match : undefined;
}

/** The parts of one kind that bear a group's name, in order of reference. */
export function groupMembers(
  parts: readonly DrawnPart[],
  kind: DrawnPart['kind'],
  name: string | undefined,
): DrawnComponent[] {
  if (name === undefined) return [];
  return parts
    .filter(isComponent)
    .filter((part) => part.kind === kind && part.values.match === name)
    .sort((a, b) => byReference(a.ref, b.ref));
}

/** The values that a group has in common. */
export function matchedValues(part: DrawnComponent): Readonly<Record<string, unknown>> {
  return Object.fromEntries(Object.entries(part.values).filter(([name]) => isMatched(name)));
}

/** Whether edits made at once have left a group's values apart. */
export function membersDiffer(members: readonly DrawnComponent[]): boolean {
  const [first, ...others] = members;
  return first !== undefined && others.some((part) => !equalityDeep(matchedValues(part), matchedValues(first)));
}

const LETTERS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ';

/** A name that no group has yet: A, B, …, Z, A2, … */
export function freeGroupName(parts: readonly DrawnPart[]): string {
  const taken = new Set(parts.map(matchOf));
  for (let round = 1; ; round++) {
    for (const letter of LETTERS) {
      const name = round === 1 ? letter : `${letter}${round}`;
      if (!taken.has(name)) return name;
    }
  }
}
