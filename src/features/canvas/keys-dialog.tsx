import { Fragment } from 'react';
import { CATALOGUE } from '#shared/circuit/catalogue';
import { Dialog } from '../../ui/dialog';
import { ACTIONS } from './actions';

type KeyRow = readonly [keys: string, does: string];

const BY_KEYS: readonly KeyRow[] = [
  ['arrows', 'next part or terminal; move what is being placed'],
  ['Ctrl arrows', 'next part, the selection stays'],
  ['Space', 'take the part into the selection, or out of it'],
  ['Shift arrows', 'move the selected parts; push a stretch of the selected wire'],
  ['Enter', 'place; begin a wire at a terminal, tie it'],
  ['. ,', 'next and previous terminal'],
  ['w', 'the next wire of a terminal; the middle of a wire, to tie another to'],
  ['Delete', 'at a terminal: its wires'],
  ['Ctrl Z', 'undo what you did last'],
  ['Ctrl Y', 'redo it'],
  ['Escape', 'let go: of the move, the frame, the wire, the part, the slip'],
  ['a', 'all actions; a click with the other button does too'],
  ['?', 'these keys'],
];

/** A key that does one thing or its opposite is listed once. */
const ACTION_KEYS: readonly KeyRow[] = [...new Set(ACTIONS.flat().map(({ keys }) => keys))].map((wanted) => {
  const labels = ACTIONS.flat().flatMap(({ keys, label }) => (keys === wanted ? [lowered(label)] : []));
  return [wanted, labels.join('; ')];
});

const BY_POINTER: readonly KeyRow[] = [
  ['click', 'select; a second click opens the slip'],
  ['Shift click', 'take into the selection, or out of it'],
  ['drag', 'frame parts on the empty sheet; move parts; draw a wire from a terminal'],
  ['Space drag', 'move the sheet; so does the middle button, or one finger'],
  ['wheel', 'zoom; so do two fingers'],
];

/** The keys that act while the drawing has the focus. */
export function KeysDialog({ open, onClose }: { open: boolean; onClose(): void }) {
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && onClose()}
      title="Keys"
      description="They act while the drawing has the focus. On a Mac, Cmd stands for Ctrl."
    >
      <Rows title="to move about and to draw" rows={BY_KEYS} />
      <Rows title="to act on what is selected" rows={ACTION_KEYS} />
      <Rows
        title="to place"
        rows={CATALOGUE.flatMap(({ letter, label }) => (letter === undefined ? [] : [[letter, label]]))}
      />
      <Rows title="by pointer" rows={BY_POINTER} />
    </Dialog>
  );
}

function Rows({ title, rows }: { title: string; rows: readonly KeyRow[] }) {
  return (
    <section className="mb-4">
      <h3 className="mb-1 text-faint text-xs">{title}</h3>
      <dl className="grid grid-cols-[7rem_1fr] gap-x-4 gap-y-0.5 text-xs">
        {rows.map(([keys, does]) => (
          <Fragment key={`${keys} ${does}`}>
            <dt className="font-bold">{keys}</dt>
            <dd>{does}</dd>
          </Fragment>
        ))}
      </dl>
    </section>
  );
}

function lowered(label: string): string {
  return label.charAt(0).toLowerCase() + label.slice(1);
}
