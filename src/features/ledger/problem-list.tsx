import { type Drawing, isComponent, type PartId } from '#shared/circuit/drawing';
import type { Problem } from '#shared/circuit/problem';
import { byGravity } from '../../formats/problem-words';

/** Problems with their whole message; the parts they name lead to the drawing. */
export function ProblemList({
  problems,
  drawing,
  onFrame,
}: {
  problems: readonly Problem[];
  drawing: Drawing;
  onFrame: (part: PartId) => void;
}) {
  const idOf = new Map(drawing.parts.filter(isComponent).map(({ ref, id }) => [ref, id]));
  return (
    <ul className="grid gap-px py-1 text-xs">
      {byGravity(problems).map((problem) => (
        <li
          key={`${problem.code} ${problem.message}`}
          className="flex flex-wrap items-baseline gap-x-4 border-rule border-b px-4 py-1 last:border-b-0 sm:px-6"
        >
          <span className={`w-16 ${problem.severity === 'note' ? 'text-faint' : 'text-missed'} ${weight(problem)}`}>
            {problem.severity}
          </span>
          <span className="min-w-0 flex-1 basis-60">{problem.message}</span>
          <span className="flex gap-2">
            {problem.refs.map((ref) => {
              const id = idOf.get(ref);
              return id === undefined ? (
                <span key={ref}>{ref}</span>
              ) : (
                <button
                  key={ref}
                  type="button"
                  aria-label={`Show ${ref}`}
                  className="min-h-6 min-w-6 underline decoration-edge underline-offset-4 hover:decoration-current"
                  onClick={() => onFrame(id)}
                >
                  {ref}
                </button>
              );
            })}
          </span>
        </li>
      ))}
    </ul>
  );
}

function weight({ severity }: Problem): string {
  return severity === 'error' ? 'font-bold' : '';
}
