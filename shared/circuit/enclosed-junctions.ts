import type { Drawing, PartId } from './drawing';

/** Junctions that only join these parts to each other, though nobody named them: they belong to a copy of the parts. */
export function enclosedJunctions({ parts, wires }: Drawing, chosen: ReadonlySet<PartId>): Set<PartId> {
  const junctions = new Set(parts.filter(({ kind, id }) => kind === 'junction' && !chosen.has(id)).map(({ id }) => id));
  const inside = new Set([...chosen, ...junctions]);
  // What hangs loose goes, and what hung on it: of a chain of junctions that leads out of the parts none is left.
  for (let dropped = true; dropped; ) {
    dropped = false;
    for (const junction of junctions) {
      const ends = wires.filter(
        ({ from, to }) =>
          (from.part === junction && inside.has(to.part)) || (to.part === junction && inside.has(from.part)),
      );
      if (ends.length >= 2) continue;
      junctions.delete(junction);
      inside.delete(junction);
      dropped = true;
    }
  }
  return junctions;
}
