import type * as Y from 'yjs';
import { type DrawnComponent, type DrawnPart, isComponent, type PartId } from '../circuit/drawing';
import { freeGroupName, groupMembers, isMatched, matchedValues } from '../circuit/match-group';
import { byReference } from '../circuit/reference-order';

import { readDrawing } from './read-drawing';
import { edit } from './sheet-maps';
import { type ValueChanges, writeValues } from './write-values';

export type Matched = { readonly name: string; readonly model: string };

/**
 * Makes parts of one kind a group of equal values, or lets them join the group of that name. They take the values of the
 * group's first part, or of their own first where the group is new. Says which part that was.
 */
export function matchParts(doc: Y.Doc, chosen: ReadonlySet<PartId>, name?: string): Matched | undefined {
  const { parts } = readDrawing(doc).drawing;
  const joining = parts
    .filter(isComponent)
    .filter(({ id }) => chosen.has(id))
    .sort((a, b) => byReference(a.ref, b.ref));
  const [first] = joining;
  if (!first || joining.some(({ kind }) => kind !== first.kind)) return undefined;
  const group = name ?? freeGroupName(parts);
  const model = groupMembers(parts, first.kind, group)[0] ?? first;
  edit(doc, () =>
    writeValues(doc, parts, new Map(joining.map((part) => [part.id, { ...changesTo(part, model), match: group }]))),
  );
  return { name: group, model: model.ref };
}

/** Takes parts out of their groups; their values stay as they are. */
export function unmatchParts(doc: Y.Doc, chosen: ReadonlySet<PartId>): void {
  const { parts } = readDrawing(doc).drawing;
  edit(doc, () => writeValues(doc, parts, new Map([...chosen].map((id) => [id, { match: null }]))));
}

/** Gives a part's values to the rest of its group, which edits made at once have left apart. */
export function equalise(doc: Y.Doc, model: PartId): void {
  const { parts } = readDrawing(doc).drawing;
  const part = parts.filter(isComponent).find(({ id }) => id === model);
  if (!part) return;
  const members = groupMembers(parts, part.kind, part.values.match);
  edit(doc, () => writeValues(doc, parts, new Map(members.map((member) => [member.id, changesTo(member, part)]))));
}

/** The changes with those that a changed part's group shares; where two members are changed apart, the last by reference counts. */
export function sharedByGroups(
  parts: readonly DrawnPart[],
  changes: ReadonlyMap<PartId, ValueChanges>,
): ReadonlyMap<PartId, ValueChanges> {
  const spread = new Map(changes);
  const changed = parts
    .filter(isComponent)
    .filter(({ id }) => changes.has(id))
    .sort((a, b) => byReference(a.ref, b.ref));
  for (const part of changed) {
    const shared = Object.fromEntries(Object.entries(changes.get(part.id) ?? {}).filter(([name]) => isMatched(name)));
    for (const { id } of groupMembers(parts, part.kind, part.values.match)) {
      spread.set(id, { ...spread.get(id), ...shared });
    }
  }
  return spread;
}

function changesTo(part: DrawnComponent, model: DrawnComponent): ValueChanges {
  const wanted = matchedValues(model);
  const gone = Object.keys(matchedValues(part)).map((name) => [name, null]);
  return { ...Object.fromEntries(gone), ...wanted };
}
