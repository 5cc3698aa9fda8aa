export function SortMark({ falling }: { falling: boolean }) {
  return (
    <svg width="8" height="6" viewBox="0 0 8 6" aria-hidden="true">
      <path d={falling ? 'M0 0H8L4 6Z' : 'M0 6H8L4 0Z'} fill="currentColor" />
    </svg>
  );
}
