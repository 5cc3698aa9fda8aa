import type { ReactNode } from 'react';
import { Button } from './button';

/** What went wrong with a page's part or a form, beside it, read out when it appears. */
export function Failure({ children, onRetry }: { readonly children: ReactNode; readonly onRetry?: () => void }) {
  return (
    <div
      role="alert"
      className="flex flex-wrap items-center gap-x-4 gap-y-2 border border-missed bg-sheet px-3.5 py-2.5 text-missed"
    >
      <div className="min-w-0 flex-1 basis-56 break-words">{children}</div>
      {onRetry !== undefined && <Button onClick={onRetry}>Try again</Button>}
    </div>
  );
}

/** Where a list would stand if it had anything in it: what it is for, and the way to begin. */
export function Empty({ title, children }: { readonly title: string; readonly children?: ReactNode }) {
  return (
    <div className="border border-dashed border-edge px-6 py-10">
      <p className="font-bold">{title}</p>
      {children !== undefined && <div className="mt-2 flex max-w-lg flex-col items-start gap-4">{children}</div>}
    </div>
  );
}
