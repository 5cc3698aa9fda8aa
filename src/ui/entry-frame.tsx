import type { ReactNode } from 'react';
import { Mark } from './mark';
import { SkipLink } from './page-frame';

interface EntryFrameProps {
  /** Fills the drawing's place where the window is wide enough for it. */
  readonly figure: ReactNode;
  readonly children: ReactNode;
}

/** The pages before one is signed in: a drawing, and the form in the margin where notes will stand later. */
export function EntryFrame({ figure, children }: EntryFrameProps) {
  return (
    <div className="grid min-h-dvh grid-cols-1 lg:grid-cols-[minmax(0,1fr)_27rem]">
      <SkipLink />
      <div className="crosses hidden items-center justify-center bg-sheet p-10 lg:flex" aria-hidden="true">
        {figure}
      </div>
      <div className="flex flex-col border-double border-rule px-4 pt-6 pb-12 sm:px-10 lg:border-l-4 lg:pt-10">
        <header className="mx-auto w-full max-w-88">
          <p className="flex items-center gap-3 text-xl">
            <Mark />
            Stillpoint
          </p>
          <p className="mt-2 text-xs text-balance text-faint">Settle the DC bias of a transistor stage together.</p>
        </header>
        <main id="main" tabIndex={-1} className="mx-auto w-full max-w-88 pt-10 outline-none lg:my-auto">
          {children}
        </main>
      </div>
    </div>
  );
}
