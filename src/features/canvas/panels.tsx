import { useRef } from 'react';
import type { DrawnNets } from '#shared/circuit/nets';
import type { GridPoint } from '#shared/geometry/place';
import { ActionsMenu } from './actions-menu';
import { AlignMenu } from './align-menu';
import type { Desk, Panel } from './desk';
import { FindDialog } from './find-dialog';
import type { Found } from './found-things';
import { KeysDialog } from './keys-dialog';

type PanelsProps = {
  readonly panel: Panel | undefined;
  /** Where a menu opens, in the window. */
  readonly at: GridPoint | undefined;
  readonly desk: Desk;
  readonly nets: DrawnNets;
  onClose(panel: Panel): void;
  /** Selects and frames what was found; returns what takes the focus. */
  goTo(found: Found): HTMLElement | null;
};

/** The menus and dialogs over the drawing. */
export function Panels({ panel, at, desk, nets, onClose, goTo }: PanelsProps) {
  const found = useRef<HTMLElement>(null);
  const closeFind = () => {
    found.current = null;
    onClose('find');
  };
  return (
    <>
      <ActionsMenu at={panel === 'actions' ? at : undefined} desk={desk} onClose={() => onClose('actions')} />
      <AlignMenu at={panel === 'alignments' ? at : undefined} desk={desk} onClose={() => onClose('alignments')} />
      <KeysDialog open={panel === 'keys'} onClose={() => onClose('keys')} />
      <FindDialog
        open={panel === 'find'}
        parts={desk.drawing.parts}
        nets={nets}
        focusAfter={() => found.current}
        onClose={closeFind}
        onFound={(thing) => {
          found.current = goTo(thing);
          onClose('find');
        }}
      />
    </>
  );
}
