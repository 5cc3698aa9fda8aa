import { ChevronDown, ChevronLeft, ChevronRight } from 'lucide-react';
import { Popover } from 'radix-ui';
import { type ReactNode, useEffect, useId, useRef, useState } from 'react';
import type { Solution as Point } from '#shared/analyses/operating-point-record';
import { dimmed } from '../../formats/dimmed';
import { useOperatingPoints, useSolvedCircuit } from '../../workers/solution';
import { pointFigures, pointWords } from './point-words';

/** Which of a circuit's operating points the page shows, and the way to the others; nothing where there is one that may last. */
export function OperatingPoints() {
  const { points, shown, count, show } = useOperatingPoints();
  const busy = points.length < count;
  const step = (by: number) => show((shown + by + points.length) % points.length);
  return (
    <>
      <PointAnnouncer />
      {shown === 0 && points[0]?.surelyUnstable && (
        <p className="font-bold text-missed" title="The circuit does not stay at this operating point.">
          surely unstable
        </p>
      )}
      {count > 1 && (
        <fieldset aria-label="Operating points" aria-busy={busy} className={`flex items-center ${dimmed(busy)}`}>
          <StepButton label="Previous operating point" onClick={() => step(-1)}>
            <ChevronLeft size={16} aria-hidden="true" />
          </StepButton>
          <Popover.Root>
            <Popover.Trigger
              className={`flex min-h-8 items-center gap-1.5 whitespace-nowrap ${shown > 0 ? 'font-bold' : ''}`}
            >
              point {shown + 1} of {count}
              <ChevronDown size={14} aria-hidden="true" />
            </Popover.Trigger>
            <Popover.Portal>
              <Popover.Content
                align="end"
                sideOffset={6}
                collisionPadding={8}
                aria-label="Operating points of this circuit"
                className="z-50 max-h-[60dvh] w-[min(30rem,calc(100vw-1rem))] overflow-auto border border-ink bg-sheet text-xs"
              >
                <PointList points={points} shown={shown} onShow={show} />
              </Popover.Content>
            </Popover.Portal>
          </Popover.Root>
          <StepButton label="Next operating point" onClick={() => step(1)}>
            <ChevronRight size={16} aria-hidden="true" />
          </StepButton>
        </fieldset>
      )}
    </>
  );
}

function StepButton({ label, onClick, children }: { label: string; onClick: () => void; children: ReactNode }) {
  return (
    <button
      type="button"
      aria-label={label}
      title={label}
      className="grid h-8 w-6 place-items-center text-faint hover:text-ink"
      onClick={onClick}
    >
      {children}
    </button>
  );
}

function PointList({
  points,
  shown,
  onShow,
}: {
  points: readonly Point[];
  shown: number;
  onShow: (index: number) => void;
}) {
  const circuit = useSolvedCircuit();
  const group = useId();
  const named = points.map((point, index) => ({ number: index + 1, point, ...pointWords(points, index) }));
  return (
    <fieldset>
      <legend className="px-3 pt-2 pb-1 text-faint">Kirchhoff’s laws hold at each of these points</legend>
      {named.map(({ number, point, name, meaning, grave }) => (
        <label
          key={number}
          className="grid cursor-pointer grid-cols-[auto_minmax(0,1fr)] gap-x-3 border-rule border-b px-3 py-2 last:border-b-0"
        >
          <input
            type="radio"
            name={group}
            className="mt-1 self-start accent-ink"
            checked={number === shown + 1}
            onChange={() => onShow(number - 1)}
          />
          <span>
            <span className={grave ? 'font-bold text-missed' : 'font-bold'}>
              {number} · {name}
            </span>
            {meaning !== undefined && <span className="block">{meaning}</span>}
            {circuit && <span className="block text-faint">{pointFigures(circuit, point)}</span>}
          </span>
        </label>
      ))}
    </fieldset>
  );
}

/** Tells a polite live region of its own that there are several points, and which one is shown. */
function PointAnnouncer() {
  const { points, shown, count } = useOperatingPoints();
  const [message, setMessage] = useState('');
  const told = useRef({ shown: 0, count: 0, points });
  useEffect(() => {
    const before = told.current;
    told.current = { shown, count, points };
    if (shown !== before.shown) {
      const back = shown === 0 && points[0] !== before.points[0];
      setMessage(
        back
          ? 'The circuit changed: showing its first operating point again.'
          : `Showing point ${shown + 1} of ${count}, ${pointWords(points, shown).name}.`,
      );
    } else if (count !== before.count) {
      setMessage(count > 1 ? `This circuit has ${count} operating points.` : '');
    }
  }, [points, shown, count]);
  return (
    <p role="status" className="sr-only">
      {message}
    </p>
  );
}
