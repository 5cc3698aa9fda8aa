import { DropdownMenu as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

type MenuAtProps = {
  /** A place of the window; undefined while the menu is closed. */
  readonly at: { readonly x: number; readonly y: number } | undefined;
  readonly label: string;
  readonly onClose: () => void;
  /** Puts the focus back where it was; not called when a choice has moved it on. */
  readonly onFocusBack: () => void;
  readonly children: ReactNode;
};

/** A menu that opens where it was asked for, by a pointer or a key, rather than at a button of its own. */
export function MenuAt({ at, label, onClose, onFocusBack, children }: MenuAtProps) {
  return (
    <Primitive.Root modal={false} open={at !== undefined} onOpenChange={(open) => !open && onClose()}>
      <Primitive.Trigger asChild>
        <span aria-hidden="true" tabIndex={-1} className="fixed size-px" style={{ left: at?.x, top: at?.y }} />
      </Primitive.Trigger>
      <Primitive.Portal>
        <Primitive.Content
          aria-label={label}
          align="start"
          sideOffset={2}
          collisionPadding={8}
          className="z-50 max-h-(--radix-dropdown-menu-content-available-height) max-w-[calc(100vw-1rem)] min-w-52 overflow-y-auto border border-ink bg-sheet py-1.5 text-xs"
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            if (document.activeElement === null || document.activeElement === document.body) onFocusBack();
          }}
        >
          {children}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
