import { equalityDeep } from 'lib0/function';
import type * as Y from 'yjs';
import type { ProcessSet } from '../circuit/circuit-file';
import type { Clip } from '../circuit/clip';
import {
  type DrawnPart,
  drawnPartSchema,
  isComponent,
  isFet,
  type PartId,
  partIdSchema,
  type SheetSettings,
  type WireId,
  wireIdSchema,
} from '../circuit/drawing';
import { freeGroupName, groupMembers, matchedValues, matchOf } from '../circuit/match-group';
import { byReference } from '../circuit/reference-order';
import type { Carry } from '../geometry/carry';
import type { IdSource } from './commands';
import { nextReference } from './next-reference';
import { readDrawing } from './read-drawing';
import { edit, processKey, sheetMaps } from './sheet-maps';

/** What came of it: the new parts and wires, and the processes that had to take another name here. */
export type Inserted =
  | {
      readonly ok: true;
      readonly parts: ReadonlySet<PartId>;
      readonly wires: ReadonlySet<WireId>;
      readonly renamedProcesses: readonly { readonly from: string; readonly to: string }[];
    }
  | { readonly ok: false; readonly reason: string };

/**
 * Puts a clip on a sheet. References that are taken become the next free ones, processes that the sheet lacks come
 * along, and one of the same name that says something else is brought under a new name; so are matched groups.
 */
export function insertClip(doc: Y.Doc, clip: Clip, carry: Carry, newId: IdSource): Inserted {
  const { drawing } = readDrawing(doc);
  const processNames = namesForProcesses(clip.processes, drawing.settings.processes);
  const references = freeReferences(clip.parts, drawing.parts);
  const carried = clip.parts.map((part) => withProcess(part, processNames));
  const groups = groupNames(carried, drawing.parts);
  const ids = new Map(clip.parts.map(({ id }) => [id, partIdSchema.parse(newId())]));

  const born: DrawnPart[] = [];
  for (const part of carried) {
    const match = groups.get(groupKey(part));
    const made = drawnPartSchema.safeParse({
      ...part,
      id: ids.get(part.id),
      place: carry.place(part.place),
      ...(isComponent(part) ? { ref: references.get(part.id) } : {}),
      ...(match === undefined ? {} : { values: { ...part.values, match } }),
    });
    if (!made.success)
      return { ok: false, reason: 'There is no room for it here: it would lie beyond the sheet’s edge.' };
    born.push(made.data);
  }
  return edit(doc, () => {
    const { parts, wires, routes, sheet } = sheetMaps(doc);
    for (const [name, process] of Object.entries(clip.processes)) {
      const here = processNames.get(name) ?? name;
      if (!Object.hasOwn(drawing.settings.processes, here)) sheet.set(processKey(here), process);
    }
    for (const { id, ...birth } of born) parts.set(id, birth);
    const made = new Set<WireId>();
    for (const { from, to, bends } of clip.wires) {
      const id = wireIdSchema.parse(newId());
      made.add(id);
      wires.set(id, { from: { ...from, part: ids.get(from.part) }, to: { ...to, part: ids.get(to.part) } });
      if (bends.length > 0) routes.set(id, bends.map(carry.point));
    }
    return {
      ok: true,
      parts: new Set(born.map(({ id }) => id)),
      wires: made,
      renamedProcesses: [...processNames].filter(([from, to]) => from !== to).map(([from, to]) => ({ from, to })),
    };
  });
}

/** Each keeps its reference where it is free, else takes the next of its letters. */
function freeReferences(parts: readonly DrawnPart[], present: readonly DrawnPart[]): Map<PartId, string> {
  const taken = new Set(present.filter(isComponent).map(({ ref }) => ref));
  const given = new Map<PartId, string>();
  for (const { id, ref } of parts.filter(isComponent).sort((a, b) => byReference(a.ref, b.ref))) {
    const free = taken.has(ref) ? nextReference(taken, ref.replace(/\d+$/, '')) : ref;
    taken.add(free);
    given.set(id, free);
  }
  return given;
}

function namesForProcesses(
  brought: Clip['processes'],
  present: SheetSettings['processes'],
): ReadonlyMap<string, string> {
  const names = new Map<string, string>();
  const isFree = (name: string, process: ProcessSet) =>
    !Object.hasOwn(present, name) || equalityDeep(present[name], process);
  const given = new Set<string>();
  for (const [name, process] of Object.entries(brought)) {
    let here = name;
    for (let n = 2; !isFree(here, process) || given.has(here); n++) here = `${name.slice(0, 60)}-${n}`;
    given.add(here);
    names.set(name, here);
  }
  return names;
}

function withProcess(part: DrawnPart, names: ReadonlyMap<string, string>): DrawnPart {
  if (!isFet(part) || part.values.process === undefined) return part;
  return { ...part, values: { ...part.values, process: names.get(part.values.process) ?? part.values.process } };
}

/** A group joins the one of its name here where their values are equal; otherwise it takes a name of its own. */
function groupNames(brought: readonly DrawnPart[], present: readonly DrawnPart[]): ReadonlyMap<string, string> {
  const names = new Map<string, string>();
  let taken = [...present, ...brought];
  for (const part of brought.filter(isComponent)) {
    const name = matchOf(part);
    if (name === undefined || names.has(groupKey(part))) continue;
    const here = groupMembers(present, part.kind, name);
    const own = groupMembers(brought, part.kind, name);
    const equal = here.every((member) => own.every((one) => equalityDeep(matchedValues(member), matchedValues(one))));
    const given = equal ? name : freeGroupName(taken);
    names.set(groupKey(part), given);
    taken = [...taken, { ...part, values: { ...part.values, match: given } } as DrawnPart];
  }
  return names;
}

function groupKey(part: DrawnPart): string {
  return `${part.kind} ${matchOf(part) ?? ''}`;
}
