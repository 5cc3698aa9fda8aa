import type { MouseEvent, PointerEvent, RefObject } from 'react';
import { useEffect, useRef } from 'react';
import type { GridPoint } from '#shared/geometry/place';
import type { Desk } from './desk';
import type { View } from './use-view';

type BoardPointer = {
  readonly desk: Desk;
  readonly view: View;
  /** Where the pointer is on the sheet, while it is on it. */
  readonly pointer: RefObject<GridPoint | undefined>;
  readonly several: boolean;
  /** Something was pressed or typed: what was said is read. */
  hush(): void;
  onPress(): void;
  onPointer: ((at: GridPoint | undefined) => void) | undefined;
};

/** What pointers do on the sheet beside what React Flow does with them. */
export function useBoardPointer({ desk, view, pointer, several, hush, onPress, onPointer }: BoardPointer) {
  const { placing, wiring, marquee } = desk;
  const space = useSpace();
  const onPointerMove = (event: PointerEvent) => {
    const at = view.toSheet({ x: event.clientX, y: event.clientY });
    pointer.current = at;
    onPointer?.(at);
    placing.follow(at);
    if (!wiring.now()?.held) wiring.follow(at);
  };
  const onPointerLeave = () => {
    pointer.current = undefined;
    onPointer?.(undefined);
  };
  const onPointerDownCapture = (event: PointerEvent) => {
    hush();
    onPress();
    wiring.newPress();
    marquee.newPress();
    space.current = space.current === undefined ? undefined : 'pressed';
    const onEmptySheet = event.target instanceof Element && event.target.classList.contains('react-flow__pane');
    const frames = event.pointerType !== 'touch' || several;
    const free = !placing.now() && !wiring.now() && space.current === undefined;
    if (onEmptySheet && frames && free && event.button === 0 && event.isPrimary) marquee.press(event);
  };
  /** While something is in the hand, a click anywhere on the sheet is about that alone. */
  const onClickCapture = (event: MouseEvent) => {
    if (event.target instanceof Element && event.target.closest('[data-own-keys]')) return;
    const at = view.toSheet({ x: event.clientX, y: event.clientY });
    const meaning = wiring.meaningOfClick();
    if (placing.now()) {
      placing.follow(at);
      placing.put();
    } else if (meaning === 'ties') {
      wiring.follow(at);
      wiring.tie();
    } else if (meaning === 'not-ours' && !marquee.tookClick()) return;
    event.stopPropagation();
  };
  /** The other button, a long touch, or the menu key. */
  const onContextMenu = (event: MouseEvent) => {
    if (event.target instanceof Element && event.target.closest('[data-own-keys]')) return;
    event.preventDefault();
    const byKey = event.clientX === 0 && event.clientY === 0;
    desk.show('actions', byKey ? undefined : { x: event.clientX, y: event.clientY });
  };
  const onKeyDownCapture = hush;
  return {
    /** Whether Space was let go of without anything having been pressed meanwhile. */
    spaceWasTap: () => space.current === 'held',
    handlers: { onPointerMove, onPointerLeave, onPointerDownCapture, onClickCapture, onContextMenu, onKeyDownCapture },
  };
}

/** Whether Space is held, and whether the pointer was pressed while it was. React Flow pans by it wherever it is pressed. */
function useSpace(): RefObject<'held' | 'pressed' | undefined> {
  const space = useRef<'held' | 'pressed'>(undefined);
  useEffect(() => {
    const onDown = (event: KeyboardEvent) => {
      if (event.key === ' ') space.current ??= 'held';
    };
    const onUp = (event: KeyboardEvent) => {
      if (event.key === ' ') space.current = undefined;
    };
    const onBlur = () => {
      space.current = undefined;
    };
    // Going down before and coming up after what the sheet itself does with the key.
    window.addEventListener('keydown', onDown, { capture: true });
    window.addEventListener('keyup', onUp);
    window.addEventListener('blur', onBlur);
    return () => {
      window.removeEventListener('keydown', onDown, { capture: true });
      window.removeEventListener('keyup', onUp);
      window.removeEventListener('blur', onBlur);
    };
  }, []);
  return space;
}
