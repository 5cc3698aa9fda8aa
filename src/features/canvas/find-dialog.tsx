import { type KeyboardEvent, useId, useState } from 'react';
import { type DrawnPart, isComponent } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import { byReference } from '#shared/circuit/reference-order';
import { Dialog } from '../../ui/dialog';
import type { Found } from './found-things';
import { describedPart, nameOf } from './part-text';

type FindDialogProps = {
  readonly open: boolean;
  readonly parts: readonly DrawnPart[];
  readonly nets: DrawnNets;
  /** What takes the focus on closing, where that is not what had it. */
  focusAfter(): HTMLElement | null;
  onClose(): void;
  onFound(found: Found): void;
};

/** More than this would be no find. */
const MOST_SHOWN = 12;

/** Type the beginning of a reference, a net or a value; arrows choose, Enter goes there. */
export function FindDialog({ open, parts, nets, focusAfter, onClose, onFound }: FindDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && onClose()}
      title="Find a part or a net"
      focusAfter={focusAfter}
    >
      {open && <Finder parts={parts} nets={nets} onFound={onFound} />}
    </Dialog>
  );
}

function Finder({ parts, nets, onFound }: Pick<FindDialogProps, 'parts' | 'nets' | 'onFound'>) {
  const id = useId();
  const [text, setText] = useState('');
  const [chosen, setChosen] = useState(0);
  const found = search(text, parts, nets);
  const now = found[Math.min(chosen, found.length - 1)];
  const press = (event: KeyboardEvent) => {
    const step = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    if (step !== 0 && found.length > 0) setChosen((chosen + step + found.length) % found.length);
    else if (event.key === 'Enter' && now) onFound(now.found);
    else return;
    event.preventDefault();
  };
  return (
    <>
      <input
        // The first of the dialog's fields, so the dialog gives it the focus.
        type="text"
        role="combobox"
        aria-label="Reference, net or value"
        aria-expanded={found.length > 0}
        aria-controls={`${id}-list`}
        aria-activedescendant={now && `${id}-${found.indexOf(now)}`}
        autoComplete="off"
        spellCheck={false}
        className="h-9 w-full border border-edge bg-sheet px-2.5"
        value={text}
        onChange={(event) => {
          setText(event.target.value);
          setChosen(0);
        }}
        onKeyDown={press}
      />
      {/* As high as it can be from the start, so that it does not jump while one types. */}
      <div id={`${id}-list`} role="listbox" aria-label="Found" className="mt-3 min-h-96 text-xs">
        {found.map((entry, index) => (
          // biome-ignore lint/a11y/useKeyWithClickEvents: the field above has the keys of its list
          <div
            key={entry.key}
            id={`${id}-${index}`}
            role="option"
            tabIndex={-1}
            aria-selected={entry === now}
            className="grid min-h-8 grid-cols-[4.5rem_minmax(0,1fr)] items-center gap-3 sm:grid-cols-[8rem_minmax(0,1fr)] px-2.5 aria-selected:bg-ink aria-selected:text-sheet"
            onPointerMove={() => setChosen(index)}
            onClick={() => onFound(entry.found)}
          >
            <span className="truncate font-bold">{entry.name}</span>
            <span className="truncate opacity-70">{entry.what}</span>
          </div>
        ))}
        {found.length === 0 && (
          <p className="px-2.5 text-faint">No part and no net of this sheet matches “{text.trim()}”.</p>
        )}
      </div>
    </>
  );
}

type Entry = { readonly key: string; readonly name: string; readonly what: string; readonly found: Found };

function search(text: string, parts: readonly DrawnPart[], { nets }: DrawnNets): Entry[] {
  const wanted = text.trim().toLowerCase();
  const components = parts.filter(isComponent).sort((a, b) => byReference(a.ref, b.ref));
  const notes = parts.filter(({ kind }) => kind === 'note');
  const entries: Entry[] = [
    ...[...components, ...notes].map((part): Entry => {
      const name = nameOf(part) ?? 'note';
      return { key: part.id, name, what: describedPart(part), found: { kind: 'part', part } };
    }),
    ...[...nets.values()].map(({ name, terminals }): Entry => {
      const what = `net, ${terminals.length} ${terminals.length === 1 ? 'terminal' : 'terminals'}`;
      return { key: `net ${name}`, name, what, found: { kind: 'net', net: name } };
    }),
  ];
  const rank = ({ name, what }: Entry) => {
    const lower = name.toLowerCase();
    if (lower === wanted) return 0;
    if (lower.startsWith(wanted)) return 1;
    return lower.includes(wanted) ? 2 : what.toLowerCase().includes(wanted) ? 3 : 4;
  };
  return entries
    .filter((entry) => rank(entry) < 4)
    .sort((a, b) => rank(a) - rank(b))
    .slice(0, MOST_SHOWN);
}
