import { X } from 'lucide-react';
import { Dialog as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

interface DialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly title: string;
  readonly description?: ReactNode;
  readonly children: ReactNode;
}

/** A card over the page; Escape, the cross and a click beside it close it, and the focus returns to where it was. */
export function Dialog({ open, onOpenChange, title, description, children }: DialogProps) {
  return (
    <Primitive.Root open={open} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        {/* Not the primitive's own overlay: it adds a style element, which the content policy refuses. */}
        <div className="fixed inset-0 z-40 bg-paper/80" />
        <Primitive.Content
          className="fixed top-[12vh] left-1/2 z-50 max-h-[80vh] w-[min(30rem,calc(100vw-2rem))] -translate-x-1/2 overflow-y-auto border border-ink bg-sheet p-6 shadow-slip outline-none"
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
        >
          <div className="mb-4 flex items-start justify-between gap-4">
            <Primitive.Title className="text-xl">{title}</Primitive.Title>
            <Primitive.Close className="-mt-1 -mr-2 flex size-8 items-center justify-center" aria-label="Close">
              <X size={18} strokeWidth={1.5} aria-hidden />
            </Primitive.Close>
          </div>
          {description !== undefined && <Primitive.Description className="mb-4">{description}</Primitive.Description>}
          {children}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
