import { useCallback, useState } from 'react';
import type { PartId } from '#shared/circuit/drawing';
import { NOTHING_SELECTED, type Selection } from '../live/selection';

/** The slip is attached to one part, and may be about others that are selected with it. */
export type OpenSlip = { readonly part: PartId; readonly parts: ReadonlySet<PartId> };

/** What is selected, and the slip that is open on it: it closes when something else is selected. */
export function useSelection() {
  const [{ selection, slip }, setState] = useState<{ selection: Selection; slip: OpenSlip | undefined }>({
    selection: NOTHING_SELECTED,
    slip: undefined,
  });
  const select = useCallback(
    (next: Selection) =>
      setState(({ slip }) => ({ selection: next, slip: slip && sameParts(slip.parts, next.parts) ? slip : undefined })),
    [],
  );
  const openSlip = useCallback(
    (part: PartId) =>
      setState(({ selection }) => ({
        selection,
        slip: { part, parts: selection.parts.has(part) ? selection.parts : new Set([part]) },
      })),
    [],
  );
  const closeSlip = useCallback(() => setState(({ selection }) => ({ selection, slip: undefined })), []);
  return { selection, select, slip, openSlip, closeSlip };
}

function sameParts(a: ReadonlySet<PartId>, b: ReadonlySet<PartId>): boolean {
  return a.size === b.size && [...a].every((id) => b.has(id));
}
