import { ChevronDown } from 'lucide-react';
import type { Ref, SelectHTMLAttributes } from 'react';

interface SelectProps extends SelectHTMLAttributes<HTMLSelectElement> {
  readonly ref?: Ref<HTMLSelectElement>;
}

/** The browser's own list to choose from, in our outline; `className` gives its size. */
export function Select({ className = 'h-8 w-full', ...select }: SelectProps) {
  return (
    <span className={`relative flex min-w-0 ${className}`}>
      <select
        {...select}
        className="h-full w-full min-w-0 appearance-none border border-edge bg-sheet pr-7 pl-2.5 aria-invalid:border-missed"
      />
      <ChevronDown
        size={16}
        strokeWidth={1.5}
        className="pointer-events-none absolute top-1/2 right-1.5 -translate-y-1/2"
        aria-hidden
      />
    </span>
  );
}
