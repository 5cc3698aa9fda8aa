import { useCallback, useMemo, useSyncExternalStore } from 'react';
import type { Clip } from '#shared/circuit/clip';
import type { DrawnKind, DrawnPart, PartId, Wire, WireEnd, WireId } from '#shared/circuit/drawing';
import {
  addPart,
  connect,
  connectToWire,
  placeParts,
  remove,
  setBends,
  setReference,
  setTemperature,
  setValues,
} from '#shared/doc/commands';
import { type Inserted, insertClip } from '#shared/doc/insert-clip';
import { equalise, type Matched, matchParts, unmatchParts } from '#shared/doc/match';
import { type ReadingOrder, renumber } from '#shared/doc/renumber';
import type { ValueChanges } from '#shared/doc/write-values';
import type { Carry } from '#shared/geometry/carry';
import type { GridPoint, Place } from '#shared/geometry/place';
import type { Room } from './room';

/** Everything a person can do to a drawing; each call is one undo step, and none does anything where they may only look. */
export type SheetCommands = {
  readonly canEdit: boolean;
  addPart(kind: DrawnKind, place: Place, values?: DrawnPart['values']): PartId | undefined;
  connect(from: WireEnd, to: WireEnd): void;
  connectToWire(from: WireEnd, wire: Wire, at: GridPoint): void;
  /** Corners of one's own choice for a wire; none lets it find its own way. */
  setBends(wire: WireId, bends: readonly GridPoint[]): void;
  placeParts(places: ReadonlyMap<PartId, Place>): void;
  remove(parts: ReadonlySet<PartId>, wires: ReadonlySet<WireId>): void;
  /** SI base units; null takes the value away. */
  setValue(part: DrawnPart, name: string, value: unknown): void;
  /** Several values of one part, or the same of many, in one step. */
  setValues(changes: ReadonlyMap<PartId, ValueChanges>): void;
  setReference(part: DrawnPart, ref: string): { ok: true } | { ok: false; reason: string };
  setTemperature(celsius: number): void;
  insertClip(clip: Clip, carry: Carry): Inserted;
  /** Of the parts given, or of all; how many have another reference now. */
  renumber(order: ReadingOrder, parts?: ReadonlySet<PartId>): number;
  /** Keeps the values of parts of one kind equal, as a new group or in the one of that name. */
  matchParts(parts: ReadonlySet<PartId>, name?: string): Matched | undefined;
  unmatchParts(parts: ReadonlySet<PartId>): void;
  /** Gives a part's values to the rest of its group. */
  equalise(part: PartId): void;
  undo(): void;
  redo(): void;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
};

const ONLY_LOOKING = {
  ok: false,
  reason: 'You may only look at this sheet: ask an owner for the designer role.',
} as const;

export function useSheetCommands(room: Room, canEdit: boolean): SheetCommands {
  const { doc, undo } = room;
  const subscribe = useCallback(
    (listener: () => void) => {
      const events = ['stack-item-added', 'stack-item-popped', 'stack-cleared'] as const;
      for (const event of events) undo.on(event, listener);
      return () => {
        for (const event of events) undo.off(event, listener);
      };
    },
    [undo],
  );
  const canUndo = useSyncExternalStore(subscribe, () => undo.canUndo()) && canEdit;
  const canRedo = useSyncExternalStore(subscribe, () => undo.canRedo()) && canEdit;
  return useMemo((): SheetCommands => {
    /** Runs a change as an undo step of its own. */
    const step = <T>(change: () => T): T | undefined => {
      if (!canEdit) return undefined;
      undo.stopCapturing();
      return change();
    };
    const newId = () => crypto.randomUUID();
    return {
      canEdit,
      canUndo,
      canRedo,
      addPart: (kind, place, values) => step(() => addPart(doc, kind, place, newId, values)),
      connect: (from, to) => void step(() => connect(doc, from, to, newId)),
      connectToWire: (from, wire, at) => void step(() => connectToWire(doc, from, wire, at, newId)),
      setBends: (wire, bends) => void step(() => setBends(doc, wire, bends)),
      placeParts: (places) => void step(() => placeParts(doc, places)),
      remove: (parts, wires) => void step(() => remove(doc, parts, wires)),
      setValue: (part, name, value) => void step(() => setValues(doc, new Map([[part.id, { [name]: value }]]))),
      setValues: (changes) => void step(() => setValues(doc, changes)),
      setReference: (part, ref) => step(() => setReference(doc, part, ref)) ?? ONLY_LOOKING,
      setTemperature: (celsius) => void step(() => setTemperature(doc, celsius)),
      insertClip: (clip, carry) => step(() => insertClip(doc, clip, carry, newId)) ?? ONLY_LOOKING,
      renumber: (order, parts) => step(() => renumber(doc, order, parts)) ?? 0,
      matchParts: (parts, name) => step(() => matchParts(doc, parts, name)),
      unmatchParts: (parts) => void step(() => unmatchParts(doc, parts)),
      equalise: (part) => void step(() => equalise(doc, part)),
      undo: () => void step(() => undo.undo()),
      redo: () => void step(() => undo.redo()),
    };
  }, [doc, undo, canEdit, canUndo, canRedo]);
}
