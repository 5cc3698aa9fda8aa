import type { PointerEvent as ReactPointerEvent } from 'react';
import type { WireId } from '#shared/circuit/drawing';
import type { GridPoint } from '#shared/geometry/place';
import type { BendingHands } from './use-bending';

/** Follows a press on a wire, by mouse, pen or touch, until it is let go of. */
export function pressWire(
  wire: WireId,
  event: ReactPointerEvent,
  hands: BendingHands,
  toSheet: (point: GridPoint) => GridPoint,
): void {
  if (event.button !== 0 || !event.isPrimary) return;
  // A touch stays with the element otherwise, which is drawn anew under it.
  if (event.currentTarget.hasPointerCapture(event.pointerId)) {
    event.currentTarget.releasePointerCapture(event.pointerId);
  }
  const { pointerId } = event;
  hands.hold(wire, toSheet({ x: event.clientX, y: event.clientY }));
  const ours = (next: PointerEvent) => next.pointerId === pointerId;
  const onMove = (next: PointerEvent) => {
    if (ours(next)) hands.follow(toSheet({ x: next.clientX, y: next.clientY }));
  };
  const end = (letGo: () => void) => (next: PointerEvent) => {
    if (!ours(next)) return;
    window.removeEventListener('pointermove', onMove);
    window.removeEventListener('pointerup', onUp);
    window.removeEventListener('pointercancel', onCancel);
    letGo();
  };
  const onUp = end(() => hands.drop());
  const onCancel = end(() => hands.abort());
  window.addEventListener('pointermove', onMove);
  window.addEventListener('pointerup', onUp);
  window.addEventListener('pointercancel', onCancel);
}
