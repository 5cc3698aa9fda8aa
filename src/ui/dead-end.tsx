import type { ReactNode } from 'react';
import { ButtonLink } from './button';
import { Mark } from './mark';
import { PageTitle } from './page-title';

interface DeadEndProps {
  readonly title: string;
  readonly children: ReactNode;
  readonly action?: ReactNode;
}

/** A page that cannot be shown: why, and where to go on. */
export function DeadEnd({ title, children, action }: DeadEndProps) {
  return (
    <main className="crosses flex min-h-dvh flex-col items-center justify-center bg-sheet p-4">
      <div className="flex w-full max-w-md flex-col items-start gap-4 border border-ink bg-sheet p-6">
        <Mark />
        <PageTitle>{title}</PageTitle>
        <div className="break-words">{children}</div>
        {action ?? <ButtonLink to="/">To your sheets</ButtonLink>}
      </div>
    </main>
  );
}
