import type { PartId } from '#shared/circuit/drawing';

/** How a row was chosen: alone, added or taken away (Ctrl), or all from the last one chosen up to it (Shift). */
export type Choice = 'alone' | 'toggled' | 'through';

export function choiceOf({
  shiftKey,
  ctrlKey,
  metaKey,
}: {
  shiftKey: boolean;
  ctrlKey: boolean;
  metaKey: boolean;
}): Choice {
  if (shiftKey) return 'through';
  return ctrlKey || metaKey ? 'toggled' : 'alone';
}

/** The parts selected after a row is chosen; `order` is that of the rows as they stand, `anchor` where a run begins. */
export function chosen(
  before: ReadonlySet<PartId>,
  part: PartId,
  choice: Choice,
  order: readonly PartId[],
  anchor: PartId | undefined,
): ReadonlySet<PartId> {
  switch (choice) {
    case 'alone':
      return new Set([part]);
    case 'toggled': {
      const next = new Set(before);
      if (!next.delete(part)) next.add(part);
      return next;
    }
    case 'through': {
      const [from, to] = [order.indexOf(anchor ?? part), order.indexOf(part)];
      if (from < 0 || to < 0) return new Set([part]);
      return new Set(order.slice(Math.min(from, to), Math.max(from, to) + 1));
    }
  }
}
