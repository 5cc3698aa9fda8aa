import { useEffect, useRef, useState } from 'react';
import { CATALOGUE } from '#shared/circuit/catalogue';
import { Dialog } from '../../ui/dialog';

const KEYS: readonly (readonly [keys: string, does: string])[] = [
  ['arrows', 'next part or terminal; move what is being placed'],
  ['Shift arrows', 'move the selected parts'],
  ['Enter', 'open a part’s slip; place; begin a wire at a terminal, tie it'],
  ['. ,', 'next and previous terminal'],
  ['[ ]', 'turn left, turn right'],
  ['=', 'mirror left for right'],
  ['Delete', 'remove what is selected; at a terminal, its wires'],
  ['Ctrl Z', 'undo what you did last'],
  ['Ctrl Y', 'redo it'],
  ['Escape', 'let go: of the move, the wire, the part, the slip'],
  ['?', 'these keys'],
];

/** The keys that act while the drawing has the focus. */
export function KeysDialog({ open, onOpenChange }: { open: boolean; onOpenChange(open: boolean): void }) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Keys"
      description="They act while the drawing has the focus."
    >
      <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-0.5 text-xs">
        {KEYS.map(([keys, does]) => (
          <Row key={keys} keys={keys} does={does} />
        ))}
        {CATALOGUE.map(({ letter, label }) => letter && <Row key={letter} keys={letter} does={`place: ${label}`} />)}
      </dl>
    </Dialog>
  );
}

/** The dialog was opened by a key, so it has no button to give the focus back to: it goes to where it was. */
export function useKeysDialog() {
  const [shown, setShown] = useState(false);
  const before = useRef<HTMLElement>(null);
  useEffect(() => {
    if (!shown) before.current?.focus({ preventScroll: true });
  }, [shown]);
  return {
    shown,
    show() {
      before.current = document.activeElement instanceof HTMLElement ? document.activeElement : null;
      setShown(true);
    },
    onOpenChange: setShown,
  };
}

function Row({ keys, does }: { keys: string; does: string }) {
  return (
    <>
      <dt className="font-bold">{keys}</dt>
      <dd>{does}</dd>
    </>
  );
}
