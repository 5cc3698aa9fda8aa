import { useCallback, useState } from 'react';
import type { GridPoint } from '#shared/geometry/place';
import type { Selection } from '../../live/selection';
import type { Panel } from './desk';

/** What is open over the drawing, one thing at a time, and for a menu where in the window. */
export function usePanels() {
  const [open, setOpen] = useState<{ readonly panel: Panel; readonly at: GridPoint }>();
  const show = useCallback((panel: Panel, at: GridPoint) => setOpen({ panel, at }), []);
  // A menu closes after its choice has opened another panel, which must stay.
  const close = useCallback((panel: Panel) => setOpen((now) => (now?.panel === panel ? undefined : now)), []);
  return { panel: open?.panel, at: open?.at, show, close };
}

/** Where a menu opens that no pointer asked for: at the first part that is selected, else in the drawing's middle. */
export function menuPlace(board: HTMLElement | null, { parts }: Selection): GridPoint {
  const [id] = parts;
  const part = id === undefined ? undefined : board?.querySelector(`[data-part="${id}"]`);
  const window = board?.getBoundingClientRect();
  const at = part?.getBoundingClientRect();
  if (!window) return { x: 0, y: 0 };
  const seen =
    at && at.right > window.left && at.left < window.right && at.bottom > window.top && at.top < window.bottom;
  return seen ? { x: at.right, y: at.top } : { x: window.left + window.width / 2, y: window.top + window.height / 3 };
}
