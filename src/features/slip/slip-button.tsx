import type { ReactNode } from 'react';

/** Something a slip does beside holding values. */
export function SlipButton({ onClick, children }: { onClick: () => void; children: ReactNode }) {
  return (
    <button type="button" className="mt-1 min-h-6 border border-edge px-2 text-left hover:border-ink" onClick={onClick}>
      {children}
    </button>
  );
}
