import { useCallback, useEffect, useRef } from 'react';
import { useOnViewportChange, useReactFlow, useStoreApi, type Viewport } from 'reactflow';
import type { SharedView } from '../../live/presence';
import { LEAST_ZOOM, MOST_ZOOM } from './use-view';

type ViewSharingProps = {
  /** The view of the person who is followed. */
  readonly followed: SharedView | undefined;
  onView(view: SharedView): void;
  /** The view was moved by hand, so it follows nobody any more. */
  onLeave(): void;
};

/** Tells the others what is in view here, and shows what one of them has in view. */
export function ViewSharing({ followed, onView, onLeave }: ViewSharingProps) {
  const flow = useReactFlow();
  const store = useStoreApi();
  const set = useRef<Viewport>(undefined);

  const tell = useCallback(
    ({ x, y, zoom }: Viewport) => {
      const { width, height } = store.getState();
      onView({ x: (width / 2 - x) / zoom, y: (height / 2 - y) / zoom, zoom });
    },
    [store, onView],
  );
  const changed = useCallback(
    (viewport: Viewport) => {
      tell(viewport);
      if (set.current && !same(set.current, viewport)) {
        set.current = undefined;
        onLeave();
      }
    },
    [tell, onLeave],
  );
  useOnViewportChange({ onChange: changed });
  useEffect(() => tell(flow.getViewport()), [tell, flow]);

  useEffect(() => {
    set.current = undefined;
    if (!followed) return;
    const { width, height } = store.getState();
    const zoom = Math.min(MOST_ZOOM, Math.max(LEAST_ZOOM, followed.zoom));
    const viewport = { x: width / 2 - followed.x * zoom, y: height / 2 - followed.y * zoom, zoom };
    set.current = viewport;
    flow.setViewport(viewport);
  }, [followed, flow, store]);
  return null;
}

function same(a: Viewport, b: Viewport): boolean {
  return Math.abs(a.x - b.x) < 0.5 && Math.abs(a.y - b.y) < 0.5 && Math.abs(a.zoom - b.zoom) < 1e-3;
}
