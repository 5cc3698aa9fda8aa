import type * as Y from 'yjs';
import type { ZodError } from 'zod';
import { type ProcessSet, processSetSchema } from '../circuit/circuit-file';
import {
  type Drawing,
  type DrawnComponent,
  type DrawnPart,
  drawnPartSchema,
  hasPin,
  isComponent,
  placeSchema,
  type SheetSettings,
  sheetSettingsSchema,
  type Wire,
  wireSchema,
} from '../circuit/drawing';
import { nextReference } from './next-reference';
import { processNameOf, sheetMaps } from './sheet-maps';

/** A record that could not be read; the rest of the sheet works without it. */
export type SetAside = {
  readonly map: 'parts' | 'params' | 'wires' | 'sheet';
  readonly key: string;
  readonly reason: string;
};

export const DEFAULT_SETTINGS: SheetSettings = { ground: 'gnd', temperature: 27, processes: {} };

/**
 * The drawing that a live document holds. Total: whatever is in the document, it returns what can be read and lists what
 * cannot. Wires to parts that are gone are left out; designators given twice are settled by the order of ids, so every
 * reader sees the same.
 */
export function readDrawing(doc: Y.Doc): { drawing: Drawing; setAside: SetAside[] } {
  const setAside: SetAside[] = [];
  const parts = uniqueReferences(readParts(doc, setAside));
  const wires = readWires(doc, parts, setAside);
  return { drawing: { parts, wires, settings: readSettings(doc, setAside) }, setAside };
}

function readParts(doc: Y.Doc, setAside: SetAside[]): DrawnPart[] {
  const { parts, places, params } = sheetMaps(doc);
  const paramsOf = new Map<string, [name: string, value: unknown][]>();
  for (const [key, value] of params) {
    const slash = key.indexOf('/');
    const id = key.slice(0, slash);
    const list = paramsOf.get(id);
    if (list) list.push([key.slice(slash + 1), value]);
    else paramsOf.set(id, [[key.slice(slash + 1), value]]);
  }
  const read: DrawnPart[] = [];
  for (const id of [...parts.keys()].sort()) {
    const birth = drawnPartSchema.safeParse(withId(parts.get(id), id));
    if (!birth.success) {
      setAside.push({ map: 'parts', key: id, reason: firstReason(birth.error) });
      continue;
    }
    const place = placeSchema.safeParse(places.get(id));
    const placed = place.success ? { ...birth.data, place: place.data } : birth.data;
    read.push(overlay(placed, paramsOf.get(id) ?? [], setAside));
  }
  return read;
}

/** The part with its later values; one that would make the part unreadable is set aside alone. */
function overlay(part: DrawnPart, values: readonly [name: string, value: unknown][], setAside: SetAside[]): DrawnPart {
  const all = drawnPartSchema.safeParse(values.reduce(withValue, part));
  if (all.success) return all.data;
  let kept = part;
  for (const [name, value] of values) {
    const next = drawnPartSchema.safeParse(withValue(kept, [name, value]));
    if (next.success) kept = next.data;
    else
      setAside.push({
        map: 'params',
        key: `${part.id}/${name}`,
        reason: firstReason(next.error),
      });
  }
  return kept;
}

function withValue(part: object, [name, value]: readonly [name: string, value: unknown]): object {
  if (name === 'ref') return { ...part, ref: value };
  const before: object = 'values' in part && typeof part.values === 'object' && part.values !== null ? part.values : {};
  const values = Object.entries(before).filter(([key]) => key !== name);
  if (value !== null) values.push([name, value]);
  return { ...part, values: Object.fromEntries(values) };
}

function readWires(doc: Y.Doc, parts: readonly DrawnPart[], setAside: SetAside[]): Wire[] {
  const { wires, routes } = sheetMaps(doc);
  const byId = new Map<string, DrawnPart>(parts.map((part) => [part.id, part]));
  const read: Wire[] = [];
  for (const id of [...wires.keys()].sort()) {
    const ends = wireSchema.safeParse({ ...objectOf(wires.get(id)), id, bends: [] });
    if (!ends.success) {
      setAside.push({ map: 'wires', key: id, reason: firstReason(ends.error) });
      continue;
    }
    const { from, to } = ends.data;
    const fromPart = byId.get(from.part);
    const toPart = byId.get(to.part);
    if (!fromPart || !toPart || !hasPin(fromPart, from.pin) || !hasPin(toPart, to.pin)) continue;
    const routed = wireSchema.safeParse({ ...ends.data, bends: routes.get(id) ?? [] });
    read.push(routed.success ? routed.data : ends.data);
  }
  return read;
}

function readSettings(doc: Y.Doc, setAside: SetAside[]): SheetSettings {
  const { sheet } = sheetMaps(doc);
  const processes: [name: string, process: ProcessSet][] = [];
  let settings = DEFAULT_SETTINGS;
  for (const key of [...sheet.keys()].sort()) {
    const name = processNameOf(key);
    if (name === undefined) {
      const next = sheetSettingsSchema.safeParse({ ...settings, [key]: sheet.get(key) });
      if (next.success) settings = next.data;
      else setAside.push({ map: 'sheet', key, reason: firstReason(next.error) });
    } else {
      const process = processSetSchema.safeParse(sheet.get(key));
      if (process.success) processes.push([name, process.data]);
      else setAside.push({ map: 'sheet', key, reason: firstReason(process.error) });
    }
  }
  return { ...settings, processes: Object.fromEntries(processes) };
}

function firstReason(error: ZodError): string {
  return error.issues[0]?.message ?? 'It cannot be read.';
}

/** The lowest id keeps a reference given twice; the others take the next free number of the same letters. */
function uniqueReferences(parts: readonly DrawnPart[]): DrawnPart[] {
  const taken = new Set<string>();
  const doubled = new Set<DrawnComponent>();
  for (const part of parts.filter(isComponent)) {
    if (taken.has(part.ref)) doubled.add(part);
    else taken.add(part.ref);
  }
  if (doubled.size === 0) return [...parts];
  return parts.map((part) => {
    if (!isComponent(part) || !doubled.has(part)) return part;
    const ref = nextReference(taken, part.ref.replace(/\d+$/, ''));
    taken.add(ref);
    return { ...part, ref };
  });
}

function withId(record: unknown, id: string): unknown {
  return { ...objectOf(record), id };
}

function objectOf(value: unknown): object {
  return typeof value === 'object' && value !== null && !Array.isArray(value) ? value : {};
}
