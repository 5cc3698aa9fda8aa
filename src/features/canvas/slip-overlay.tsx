import { type ReactNode, type RefObject, useLayoutEffect, useRef, useState } from 'react';
import { useStore, useViewport } from 'reactflow';
import type { DrawnPart } from '#shared/circuit/drawing';
import type { Box } from '#shared/geometry/box';
import type { GridPoint } from '#shared/geometry/place';
import { outset } from './brackets';
import { partBox } from './symbol-box';
import { useLatest } from './use-latest';

type Size = { readonly width: number; readonly height: number };

/** Free space kept about the slip, in px of the window. */
const GAP = 10;

type SlipOverlayProps = {
  readonly part: DrawnPart;
  /** On which side of the part its tag or label stands. */
  readonly beside: GridPoint | undefined;
  /** The slip closed with the focus in it. */
  onFocusLost(): void;
  readonly children: ReactNode;
};

/** The open slip, at its own size beside its part whatever the zoom, and wholly within the drawing where it fits. */
export function SlipOverlay({ part, beside, onFocusLost, children }: SlipOverlayProps) {
  const { x, y, zoom } = useViewport();
  const width = useStore((state) => state.width);
  const height = useStore((state) => state.height);
  const ref = useRef<HTMLDivElement>(null);
  const size = useSize(ref);
  const focusLost = useLatest(onFocusLost);
  useLayoutEffect(() => {
    const element = ref.current;
    return () => {
      if (element?.contains(document.activeElement)) focusLost.current();
    };
  }, [focusLost]);
  const box = outset(partBox(part));
  const onScreen = {
    left: box.left * zoom + x,
    top: box.top * zoom + y,
    right: box.right * zoom + x,
    bottom: box.bottom * zoom + y,
  };
  const toTheRight = (beside?.x ?? 0) >= 0;
  const { left, top } = besidePart(onScreen, toTheRight, size, { width, height });
  return (
    // React Flow and the drawing's keys leave alone what happens in here.
    <div ref={ref} className="slip-overlay nodrag nopan nowheel nokey" data-own-keys style={{ left, top }}>
      {children}
    </div>
  );
}

/** Beside the part on the side asked for, else the other, else below or above it; moved into the window at last. */
function besidePart(part: Box, toTheRight: boolean, slip: Size, window: Size): { left: number; top: number } {
  const right = part.right + GAP;
  const left = part.left - GAP - slip.width;
  const clampX = (at: number) => Math.max(GAP, Math.min(at, window.width - slip.width - GAP));
  const clampY = (at: number) => Math.max(GAP, Math.min(at, window.height - slip.height - GAP));
  const fitsX = (at: number) => at >= GAP && at + slip.width + GAP <= window.width;
  for (const at of toTheRight ? [right, left] : [left, right]) {
    if (fitsX(at)) return { left: at, top: clampY(part.top) };
  }
  const below = part.bottom + GAP;
  const above = part.top - GAP - slip.height;
  if (below + slip.height + GAP > window.height && above >= GAP) return { left: clampX(part.left), top: above };
  return { left: clampX(part.left), top: clampY(below) };
}

function useSize(ref: RefObject<HTMLElement | null>): Size {
  const [size, setSize] = useState<Size>({ width: 0, height: 0 });
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const measure = () => setSize({ width: element.offsetWidth, height: element.offsetHeight });
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, [ref]);
  return size;
}
