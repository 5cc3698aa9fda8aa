import { equalityDeep } from 'lib0/function';
import { useCallback, useEffect, useMemo, useRef, useSyncExternalStore } from 'react';
import { z } from 'zod';
import { gridPointSchema, type PartId, partIdSchema } from '#shared/circuit/drawing';
import type { GridPoint } from '#shared/geometry/place';
import type { Room } from './room';
import type { Selection } from './selection';

/** The middle of what somebody has in view, in px of the sheet, and how large they see it. */
export type SharedView = GridPoint & { readonly zoom: number };

/** Somebody else on this sheet, as the server vouches for them. */
export type OtherPerson = {
  /** Of the connection: one person in two windows is there twice. */
  readonly id: number;
  readonly name: string;
  readonly initials: string;
  readonly selection: ReadonlySet<PartId>;
  readonly pointer: GridPoint | undefined;
  readonly view: SharedView | undefined;
  readonly editing: EditedField | undefined;
};

/** A value that somebody has the cursor in: of which part, and by what name. */
export type EditedField = { readonly part: PartId; readonly field: string };

/** Most often that a moving pointer or view is told to the others, in ms. */
const PRESENCE_INTERVAL = 50;

const presenceSchema = z.object({
  user: z.object({ name: z.string(), initials: z.string() }),
  selection: z.array(partIdSchema).max(1000).catch([]),
  pointer: gridPointSchema
    .or(z.object({ x: z.number(), y: z.number() }))
    .optional()
    .catch(undefined),
  view: z.object({ x: z.number(), y: z.number(), zoom: z.number().positive() }).optional().catch(undefined),
  editing: z
    .object({ part: partIdSchema, field: z.string().max(64) })
    .optional()
    .catch(undefined),
});

/** Everyone else who is here; what they say of themselves is read with suspicion, who they are comes from the server. */
export function useOthers(room: Room): readonly OtherPerson[] {
  const { awareness } = room;
  const last = useRef<readonly OtherPerson[]>([]);
  const subscribe = useCallback(
    (listener: () => void) => {
      awareness.on('change', listener);
      return () => awareness.off('change', listener);
    },
    [awareness],
  );
  return useSyncExternalStore(subscribe, () => {
    const others: OtherPerson[] = [];
    for (const [client, state] of awareness.getStates()) {
      if (client === awareness.clientID) continue;
      const presence = presenceSchema.safeParse(state);
      if (!presence.success) continue;
      const { user, selection, pointer, view, editing } = presence.data;
      others.push({ id: client, ...user, selection: new Set(selection), pointer, view, editing });
    }
    others.sort((a, b) => a.id - b.id);
    if (!equalityDeep(last.current, others)) last.current = others;
    return last.current;
  });
}

/** Somebody else who is at a value of a part. */
export type FieldEditor = Pick<OtherPerson, 'id' | 'name' | 'initials'> & { readonly field: string };

/** Who else is at which value of this part. */
export function useFieldEditors(others: readonly OtherPerson[], part: PartId | undefined): readonly FieldEditor[] {
  const last = useRef<readonly FieldEditor[]>([]);
  const now = others.flatMap(({ id, name, initials, editing }) =>
    editing && editing.part === part ? [{ id, name, initials, field: editing.field }] : [],
  );
  // Others' pointers move all the time; who edits what hardly ever does.
  if (!equalityDeep(last.current, now)) last.current = now;
  return last.current;
}

/** Tells the others what is selected here; returns how to tell where the pointer is, what is in view and what is edited. */
export function usePresence(room: Room, selection: Selection) {
  const { awareness } = room;
  useEffect(() => awareness.setLocalStateField('selection', [...selection.parts]), [awareness, selection]);
  const pointer = useThrottledField<GridPoint | undefined>(room, 'pointer');
  const view = useThrottledField<SharedView>(room, 'view');
  return useMemo(
    () => ({
      tellPointer: pointer,
      tellView: view,
      tellEditing: (editing: EditedField | undefined) => awareness.setLocalStateField('editing', editing),
    }),
    [awareness, pointer, view],
  );
}

function useThrottledField<T extends GridPoint | undefined>({ awareness }: Room, field: string): (value: T) => void {
  const throttled = useMemo(() => {
    let waiting: ReturnType<typeof setTimeout> | undefined;
    let latest: T | undefined;
    return {
      tell(value: T) {
        latest = value && { ...value, x: Math.round(value.x), y: Math.round(value.y) };
        waiting ??= setTimeout(() => {
          waiting = undefined;
          awareness.setLocalStateField(field, latest);
        }, PRESENCE_INTERVAL);
      },
      stop: () => clearTimeout(waiting),
    };
  }, [awareness, field]);
  useEffect(() => throttled.stop, [throttled]);
  return throttled.tell;
}
