import { useMemo } from 'react';
import { useReactFlow, useStoreApi } from 'reactflow';
import { around, type Box } from '#shared/geometry/box';
import type { GridPoint } from '#shared/geometry/place';
import type { SheetGeometry } from './sheet-geometry';
import { type SheetTexts, tagBoxes } from './sheet-texts';
import { partBox } from './symbol-box';
import { cornersOf } from './text-blocks';

export const LEAST_ZOOM = 0.2;
export const MOST_ZOOM = 4;
/** Below it 12 px text is under 7 px, too small to read. */
export const FAR_ZOOM = 7 / 12;

/** Free space about a fitted drawing, in px of the window: room for the labels at its edge. */
const PADDING = 48;

export type View = {
  /** Shows the whole drawing, at most at its own size. */
  fit(geometry: SheetGeometry, texts: SheetTexts): void;
  /** Puts a box in the middle. */
  frame(box: Box): void;
  /** Brings a box into view if it is not. */
  reveal(box: Box): void;
  /** The middle of what is seen. */
  middle(): GridPoint;
  toSheet(point: GridPoint): GridPoint;
};

export function useView(): View {
  const flow = useReactFlow();
  const store = useStoreApi();
  return useMemo((): View => {
    const size = () => store.getState();
    // Whole pixels: hairlines blur on fractions.
    const centre = ({ left, top, right, bottom }: Box, zoom = flow.getZoom()) => {
      const { width, height } = size();
      flow.setViewport({
        x: Math.round(width / 2 - (zoom * (left + right)) / 2),
        y: Math.round(height / 2 - (zoom * (top + bottom)) / 2),
        zoom,
      });
    };
    return {
      fit(geometry, texts) {
        const { width, height } = size();
        const bounds = extent(geometry, texts);
        if (!bounds) {
          centre({ left: 0, top: 0, right: 0, bottom: 0 }, 1);
          return;
        }
        const fitting = Math.min(
          1,
          (width - 2 * PADDING) / (bounds.right - bounds.left),
          (height - 2 * PADDING) / (bounds.bottom - bounds.top),
        );
        centre(bounds, Math.max(LEAST_ZOOM, fitting));
      },
      frame: centre,
      reveal(box) {
        const { width, height } = size();
        const { x, y, zoom } = flow.getViewport();
        const inside =
          box.left * zoom + x >= 0 &&
          box.top * zoom + y >= 0 &&
          box.right * zoom + x <= width &&
          box.bottom * zoom + y <= height;
        if (!inside) centre(box);
      },
      middle() {
        const { width, height } = size();
        const { x, y, zoom } = flow.getViewport();
        return { x: (width / 2 - x) / zoom, y: (height / 2 - y) / zoom };
      },
      // Not React Flow's own, which snaps to the grid.
      toSheet(point) {
        const { left, top } = store.getState().domNode?.getBoundingClientRect() ?? { left: 0, top: 0 };
        const { x, y, zoom } = flow.getViewport();
        return { x: (point.x - left - x) / zoom, y: (point.y - top - y) / zoom };
      },
    };
  }, [flow, store]);
}

function extent(geometry: SheetGeometry, texts: SheetTexts): Box | undefined {
  const corners = cornersOf([...[...geometry.parts.values()].map(partBox), ...tagBoxes(texts, geometry)]);
  for (const line of geometry.routes.values()) corners.push(...line);
  return corners.length > 0 ? around(corners) : undefined;
}
