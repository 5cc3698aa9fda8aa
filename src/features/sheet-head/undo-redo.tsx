import { Redo2, Undo2 } from 'lucide-react';
import type { ReactNode } from 'react';
import type { SheetCommands } from '../../live/sheet-commands';

/** One's own changes, back and forth. */
export function UndoRedo({ commands }: { commands: SheetCommands }) {
  return (
    <div className="flex">
      <Step label="Undo your last change" enabled={commands.canUndo} onClick={commands.undo}>
        <Undo2 size={16} strokeWidth={1.5} aria-hidden />
      </Step>
      <Step label="Redo your change" enabled={commands.canRedo} onClick={commands.redo}>
        <Redo2 size={16} strokeWidth={1.5} aria-hidden />
      </Step>
    </div>
  );
}

type StepProps = { label: string; enabled: boolean; onClick: () => void; children: ReactNode };

function Step({ label, enabled, onClick, children }: StepProps) {
  return (
    <button
      type="button"
      aria-label={label}
      title={label}
      // Kept in the tab order while there is nothing to take back, so that the focus does not jump.
      aria-disabled={!enabled}
      className="flex size-8 items-center justify-center aria-disabled:text-edge"
      onClick={enabled ? onClick : undefined}
    >
      {children}
    </button>
  );
}
