import { useOperatingPoints } from '../../workers/solution';
import { pointWords } from './point-words';

/** Laid over the drawing while its figures are not those of the first point, and says so; nothing otherwise. */
export function OtherPointFrame() {
  const { points, shown, count, show } = useOperatingPoints();
  if (shown === 0) return null;
  const { name, meaning, grave } = pointWords(points, shown);
  return (
    <section
      aria-label="Another operating point is shown"
      className="pointer-events-none absolute inset-0 z-10 border-2 border-edge border-dashed"
    >
      <p className="pointer-events-auto mx-auto w-fit max-w-full border-edge border-x-2 border-b-2 border-dashed bg-sheet px-3 py-1 text-xs">
        <span className="font-bold">
          point {shown + 1} of {count}, not the first:
        </span>{' '}
        <span className={grave ? 'font-bold text-missed' : ''}>{name}</span>
        {meaning !== undefined && `: ${meaning}`}.{' '}
        <button
          type="button"
          className="min-h-6 underline decoration-edge underline-offset-4 hover:decoration-current"
          onClick={() => show(0)}
        >
          show the first
        </button>
      </p>
    </section>
  );
}
