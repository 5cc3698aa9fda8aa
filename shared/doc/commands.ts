import { equalityDeep } from 'lib0/function';
import type * as Y from 'yjs';
import { catalogueEntry } from '../circuit/catalogue';
import {
  bodyLedOut,
  type DrawnKind,
  type DrawnPart,
  isComponent,
  MOST_BENDS,
  type PartId,
  partIdSchema,
  type Wire,
  type WireEnd,
  type WireId,
  wireIdSchema,
} from '../circuit/drawing';
import { cutLine } from '../geometry/bend-wire';
import { pinPlaces } from '../geometry/pins';
import type { GridPoint, Place } from '../geometry/place';
import { routeWire } from '../geometry/route-wire';
import { sharedByGroups } from './match';
import { nextReference } from './next-reference';
import { readDrawing } from './read-drawing';
import { renameInSpread } from './renumber';
import { edit, sheetMaps } from './sheet-maps';
import { type ValueChanges, writeValues } from './write-values';

/** Gives ids that nobody else gives; letters, digits, `_` and `-`. */
export type IdSource = () => string;

/** Places a part with the values that its kind is born with, under the next free reference. */
export function addPart(
  doc: Y.Doc,
  kind: DrawnKind,
  place: Place,
  newId: IdSource,
  values?: DrawnPart['values'],
): PartId {
  return edit(doc, () => {
    const id = partIdSchema.parse(newId());
    const { refLetter, initialValues } = catalogueEntry(kind);
    const ref = refLetter === undefined ? {} : { ref: nextReference(referencesIn(doc), refLetter) };
    sheetMaps(doc).parts.set(id, { kind, ...ref, place, values: values ?? initialValues });
    return id;
  });
}

/** Joins two terminals by a wire. Nothing happens where they are one terminal or already joined directly. */
export function connect(doc: Y.Doc, from: WireEnd, to: WireEnd, newId: IdSource): WireId | undefined {
  if (sameEnd(from, to)) return undefined;
  const joined = readDrawing(doc).drawing.wires.some(
    (wire) => (sameEnd(wire.from, from) && sameEnd(wire.to, to)) || (sameEnd(wire.from, to) && sameEnd(wire.to, from)),
  );
  if (joined) return undefined;
  return edit(doc, () => {
    const id = wireIdSchema.parse(newId());
    sheetMaps(doc).wires.set(id, { from, to });
    return id;
  });
}

/**
 * Ties a terminal to the middle of a wire: a junction there, the wire in two halves that run where it ran, through its
 * own corners (the caller may give those of a wire that found its own way).
 */
export function connectToWire(doc: Y.Doc, from: WireEnd, wire: Wire, at: GridPoint, newId: IdSource): PartId {
  return edit(doc, () => {
    const { wires, routes } = sheetMaps(doc);
    const halves = halvesOf(doc, wire, at);
    const junction = addPart(doc, 'junction', { ...at, turn: 0, flip: false }, newId);
    const end: WireEnd = { part: junction, pin: 'net' };
    wires.delete(wire.id);
    routes.delete(wire.id);
    const tie = (other: WireEnd, bends: readonly GridPoint[]) => {
      if (sameEnd(other, end)) return;
      const id = wireIdSchema.parse(newId());
      wires.set(id, { from: other, to: end });
      if (bends.length > 0) routes.set(id, bends);
    };
    tie(wire.from, halves.before);
    tie(wire.to, halves.after.reverse());
    tie(from, []);
    return junction;
  });
}

/** Gives a wire corners of somebody's choice, in px on the grid; none lets it find its own way again. */
export function setBends(doc: Y.Doc, id: WireId, bends: readonly GridPoint[]): void {
  const { wires, routes } = sheetMaps(doc);
  const before = routes.get(id) ?? [];
  if (!wires.has(id) || bends.length > MOST_BENDS || equalityDeep(before, bends)) return;
  edit(doc, () => {
    if (bends.length > 0) routes.set(id, [...bends]);
    else routes.delete(id);
  });
}

/** The corners of a wire on either side of a point on it, both in the wire's own direction. */
function halvesOf(doc: Y.Doc, { from, to, bends }: Wire, at: GridPoint) {
  const { parts } = readDrawing(doc).drawing;
  const endAt = (end: WireEnd) => {
    const part = parts.find(({ id }) => id === end.part);
    return part && pinPlaces(part.kind, part.place, bodyLedOut(part)).find(({ pin }) => pin === end.pin);
  };
  const [start, stop] = [endAt(from), endAt(to)];
  if (!start || !stop) return { before: [], after: [] };
  const [before, after] = cutLine(routeWire(start, stop, bends), at);
  return { before, after };
}

/**
 * Moves, turns or mirrors parts. Corners chosen on a wire move along when both its ends moved alike and are given up
 * when they did not, for they would no longer lead anywhere sensible.
 */
export function placeParts(doc: Y.Doc, places: ReadonlyMap<PartId, Place>): void {
  const { drawing } = readDrawing(doc);
  const before = new Map(drawing.parts.map((part) => [part.id, part.place]));
  const moved = new Map([...places].filter(([id, place]) => before.has(id) && !equalityDeep(before.get(id), place)));
  if (moved.size === 0) return;
  edit(doc, () => {
    const maps = sheetMaps(doc);
    for (const [id, place] of moved) maps.places.set(id, place);
    for (const wire of drawing.wires) {
      if (wire.bends.length === 0) continue;
      const from = shift(before.get(wire.from.part), moved.get(wire.from.part));
      const to = shift(before.get(wire.to.part), moved.get(wire.to.part));
      if (from === undefined && to === undefined) continue;
      if (from && to && equalityDeep(from, to)) {
        maps.routes.set(
          wire.id,
          wire.bends.map((bend) => ({ x: bend.x + from.x, y: bend.y + from.y })),
        );
      } else maps.routes.delete(wire.id);
    }
  });
}

/** Sets values of parts, all in one step, and of whatever is matched with them. Those that are so already are not written again. */
export function setValues(doc: Y.Doc, changes: ReadonlyMap<PartId, ValueChanges>): void {
  const { parts } = readDrawing(doc).drawing;
  edit(doc, () => writeValues(doc, parts, sharedByGroups(parts, changes)));
}

/** Gives a part another reference; refused where another part has it. */
export function setReference(doc: Y.Doc, part: DrawnPart, ref: string): { ok: true } | { ok: false; reason: string } {
  if (!isComponent(part) || part.ref === ref) return { ok: true };
  if (referencesIn(doc).has(ref))
    return { ok: false, reason: `${ref} is taken: choose another, or rename that part first.` };
  edit(doc, () => {
    sheetMaps(doc).params.set(`${part.id}/ref`, ref);
    renameInSpread(doc, new Map([[part.ref, ref]]));
  });
  return { ok: true };
}

/** Removes parts with the wires that end on them, and wires. Only the records go, so that an undo finds all values. */
export function remove(doc: Y.Doc, partIds: ReadonlySet<PartId>, wireIds: ReadonlySet<WireId>): void {
  const { drawing } = readDrawing(doc);
  const wires = drawing.wires.filter(
    (wire) => wireIds.has(wire.id) || partIds.has(wire.from.part) || partIds.has(wire.to.part),
  );
  const parts = drawing.parts.filter((part) => partIds.has(part.id));
  if (wires.length + parts.length === 0) return;
  edit(doc, () => {
    const maps = sheetMaps(doc);
    for (const wire of wires) maps.wires.delete(wire.id);
    for (const part of parts) maps.parts.delete(part.id);
  });
}

/** Sets the sheet's temperature in °C. */
export function setTemperature(doc: Y.Doc, celsius: number): void {
  const { sheet } = sheetMaps(doc);
  if (sheet.get('temperature') !== celsius) edit(doc, () => sheet.set('temperature', celsius));
}

function referencesIn(doc: Y.Doc): Set<string> {
  return new Set(
    readDrawing(doc)
      .drawing.parts.filter(isComponent)
      .map((part) => part.ref),
  );
}

function sameEnd(a: WireEnd, b: WireEnd): boolean {
  return a.part === b.part && a.pin === b.pin;
}

/** How far a part was moved; not a number where it was turned or mirrored too, so that it equals nothing. */
function shift(before: Place | undefined, after: Place | undefined): GridPoint | undefined {
  if (!before || !after) return undefined;
  const turnedToo = before.turn !== after.turn || before.flip !== after.flip;
  return turnedToo ? { x: Number.NaN, y: Number.NaN } : { x: after.x - before.x, y: after.y - before.y };
}
