import { type RefObject, useEffect } from 'react';
import { clipOf, clipText, readClip } from '#shared/circuit/clip';
import { countOf, insertAt } from './copies';
import type { Desk } from './desk';
import { removeSelected } from './part-keys';

/** Copy, cut and paste by the browser's own keys and events while the drawing has the focus. */
export function useClipboard(board: RefObject<HTMLElement | null>, desk: RefObject<Desk>): void {
  useEffect(() => {
    const ours = () => {
      const { activeElement } = document;
      const inside = activeElement !== null && board.current?.contains(activeElement);
      return inside && !activeElement.closest('input, textarea, select, [data-own-keys]');
    };
    const onCopy = (event: ClipboardEvent) => {
      // Text that somebody marked elsewhere on the page is what they mean to copy.
      if (!ours() || window.getSelection()?.isCollapsed === false) return;
      const text = takeCopy(desk.current);
      if (text === undefined) return;
      event.clipboardData?.setData('text/plain', text);
      event.preventDefault();
      if (event.type === 'cut') removeSelected(desk.current);
      tellCopied(desk.current, event.type === 'cut');
    };
    const onPaste = (event: ClipboardEvent) => {
      if (!ours()) return;
      event.preventDefault();
      pasteText(desk.current, event.clipboardData?.getData('text/plain') ?? '');
    };
    document.addEventListener('copy', onCopy);
    document.addEventListener('cut', onCopy);
    document.addEventListener('paste', onPaste);
    return () => {
      document.removeEventListener('copy', onCopy);
      document.removeEventListener('cut', onCopy);
      document.removeEventListener('paste', onPaste);
    };
  }, [board, desk]);
}

/** The same from a menu, which has no such event. */
export async function copyByMenu(desk: Desk, cut: boolean): Promise<void> {
  const text = takeCopy(desk);
  if (text === undefined) return;
  try {
    await navigator.clipboard.writeText(text);
  } catch {
    desk.say(`This browser lets no menu copy: press Ctrl ${cut ? 'X' : 'C'} in the drawing instead.`);
    return;
  }
  if (cut) removeSelected(desk);
  tellCopied(desk, cut);
}

/** Whether this browser lets a page read the clipboard when a menu asks; none does where the page comes without TLS. */
export function canPasteByMenu(): boolean {
  return typeof navigator.clipboard?.readText === 'function';
}

export function pasteByMenu(desk: Desk): Promise<void> {
  return navigator.clipboard.readText().then(
    (text) => pasteText(desk, text),
    () => desk.say('This browser did not hand over the clipboard: press Ctrl V in the drawing instead.'),
  );
}

function takeCopy(desk: Desk): string | undefined {
  if (desk.selection.parts.size > 0) return clipText(clipOf(desk.drawing, desk.selection.parts));
  desk.say('Nothing is selected: select parts, then copy.');
  return undefined;
}

function tellCopied({ selection, say }: Desk, cut: boolean): void {
  say(`${cut ? 'Cut' : 'Copied'} ${countOf(selection.parts.size)}: paste here or on another sheet.`);
}

function pasteText(desk: Desk, text: string): void {
  if (!desk.commands.canEdit) return;
  const read = readClip(text);
  if (read.ok) insertAt(desk, read.clip, desk.pointerOrMiddle());
  else desk.say(read.reason);
}
