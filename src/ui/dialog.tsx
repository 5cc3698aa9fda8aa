import { X } from 'lucide-react';
import { Dialog as Primitive } from 'radix-ui';
import { type ReactNode, useRef } from 'react';

interface DialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly title: string;
  readonly description?: ReactNode;
  /** Where the focus goes on closing, where that is not where it was. */
  readonly focusAfter?: () => HTMLElement | null | undefined;
  readonly children: ReactNode;
}

/** A card over the page; Escape, the cross and a click beside it close it, and the focus returns to where it was, or goes where it is sent. */
export function Dialog({ open, onOpenChange, title, description, focusAfter, children }: DialogProps) {
  const opener = useRef<Element | null>(null);
  return (
    <Primitive.Root open={open} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        {/* Not the primitive's own overlay: it adds a style element, which the content policy refuses. */}
        <div className="fixed inset-0 z-40 bg-paper/80" />
        <Primitive.Content
          className="fixed top-[12vh] left-1/2 z-50 max-h-[80vh] w-[min(30rem,calc(100vw-2rem))] -translate-x-1/2 overflow-y-auto border border-ink bg-sheet p-6 shadow-slip outline-none"
          onOpenAutoFocus={() => {
            opener.current = document.activeElement;
          }}
          // The primitive gives the focus back to a trigger of its own only, and ours is wherever the reader was.
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            const to = focusAfter?.() ?? opener.current;
            if (to instanceof HTMLElement) to.focus({ preventScroll: true });
          }}
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
        >
          <Primitive.Title className="mb-4 pr-8 text-xl">{title}</Primitive.Title>
          {description !== undefined && <Primitive.Description className="mb-4">{description}</Primitive.Description>}
          {children}
          {/* Last, so that the first field and not the cross takes the focus. */}
          <Primitive.Close
            className="absolute top-5 right-4 flex size-8 items-center justify-center"
            aria-label="Close"
          >
            <X size={18} strokeWidth={1.5} aria-hidden />
          </Primitive.Close>
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
