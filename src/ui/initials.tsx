interface InitialsProps {
  readonly text: string;
  /** Filled, for oneself. */
  readonly own?: boolean;
}

/** A person's initials in a square; the name stands beside it or in the label of what holds it. */
export function Initials({ text, own = false }: InitialsProps) {
  return (
    <span
      aria-hidden="true"
      className={`inline-flex h-6 min-w-6 shrink-0 items-center justify-center border px-0.5 text-xs ${own ? 'border-ink bg-ink text-sheet' : 'border-edge text-ink'}`}
    >
      {text}
    </span>
  );
}
