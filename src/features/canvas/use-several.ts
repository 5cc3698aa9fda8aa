import { type RefObject, useEffect, useState } from 'react';

/**
 * A way to select many without a key to hold: clicks and touches add to the selection and take from it, and one finger
 * frames parts as a mouse does.
 */
export function useSeveral(board: RefObject<HTMLElement | null>) {
  const [several, setSeveral] = useState(false);
  useEffect(() => {
    const element = board.current;
    if (!several || !element) return;
    // One finger would move the sheet; two still do.
    const keepFromPanning = (event: TouchEvent) => {
      const onSheet = event.target instanceof Element && event.target.closest('.react-flow__pane');
      if (event.touches.length === 1 && onSheet) event.stopPropagation();
    };
    element.addEventListener('touchstart', keepFromPanning, { capture: true, passive: true });
    return () => element.removeEventListener('touchstart', keepFromPanning, { capture: true });
  }, [several, board]);
  return { several, setSeveral };
}
