import { CATALOGUE } from '#shared/circuit/catalogue';
import { Dialog } from '../../ui/dialog';

const KEYS: readonly (readonly [keys: string, does: string])[] = [
  ['Arrows', 'go to the next part or terminal, or move what is being placed'],
  ['Shift + arrows', 'move the selected parts; what is being placed, by 50'],
  ['Enter', 'open the slip of a part; place; begin a wire at a terminal, tie it'],
  ['. and ,', 'go through the terminals of a part; of the sheet, with a wire in the hand'],
  ['[ and ]', 'turn left, turn right'],
  ['=', 'mirror left for right'],
  ['Delete', 'remove what is selected; at a terminal, the wires that end there'],
  ['Ctrl + Z', 'undo what you did last'],
  ['Shift + Ctrl + Z, Ctrl + Y', 'redo it'],
  ['Escape', 'end placing, drop the wire or the move, close the slip'],
  ['?', 'show these keys'],
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
      <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-1">
        {KEYS.map(([keys, does]) => (
          <Row key={keys} keys={keys} does={does} />
        ))}
        {CATALOGUE.map(({ letter, label }) => letter && <Row key={letter} keys={letter} does={`place: ${label}`} />)}
      </dl>
    </Dialog>
  );
}

function Row({ keys, does }: { keys: string; does: string }) {
  return (
    <>
      <dt className="font-bold">{keys}</dt>
      <dd>{does}</dd>
    </>
  );
}
