import { lazy, Suspense } from 'react';
import type { DrawnFet } from '#shared/circuit/drawing';
import { dimmed } from '../../formats/dimmed';
import { formatVoltage } from '../../formats/figures';
import { MarginRuler } from '../../formats/margin-ruler';
import { useSolutionState } from '../../workers/solution';
import { CurveTable } from './curve-table';
import { useDeviceView } from './device-view';

const CurveChart = lazy(() => import('./curve-chart').catch(() => ({ default: NoChart })));

const SIZE = { width: 240, height: 164, axis: 38 };
const RULER = SIZE.width - SIZE.axis;

/** A FET's own curve with the margin ruler under it on the same scale, or the numbers of both. */
export function DeviceFigure({
  part,
  asTable,
  onTable,
}: {
  part: DrawnFet;
  asTable: boolean;
  onTable: (asTable: boolean) => void;
}) {
  const view = useDeviceView(part);
  const state = useSolutionState();
  if (!view) {
    const why = state === 'current' || state === 'failed' ? 'The circuit is not solved.' : 'Solving.';
    return <p className="text-faint">{why} There is no curve to show.</p>;
  }
  const { point, end, outdated } = view;
  return (
    <div aria-busy={outdated} className={`relative ${dimmed(outdated)}`} style={{ width: SIZE.width }}>
      <button
        type="button"
        aria-pressed={asTable}
        aria-keyshortcuts="t"
        title="The numbers of the curve (t)"
        className="absolute top-0 right-0 z-10 min-h-6 bg-sheet pl-2 text-faint hover:text-ink"
        onClick={() => onTable(!asTable)}
      >
        <span className="underline decoration-edge underline-offset-4">{asTable ? 'curve' : 'table'}</span>{' '}
        <kbd className="border border-edge px-1">t</kbd>
      </button>
      {asTable ? (
        <div className="pt-8">
          <CurveTable view={view} />
        </div>
      ) : (
        <>
          <Suspense fallback={<div style={{ height: SIZE.height }} />}>
            <CurveChart view={view} size={SIZE} />
          </Suspense>
          <div className="pt-1" style={{ marginLeft: SIZE.axis }}>
            <MarginRuler point={point} intent={part.values.intent} scaleEnd={end} width={RULER} />
            <p aria-hidden="true" className="relative flex justify-between text-faint">
              <span>0</span>
              <span>VDS</span>
              <span>{formatVoltage(end, 1)}</span>
            </p>
          </div>
        </>
      )}
    </div>
  );
}

function NoChart() {
  return <p className="text-faint">The chart could not be loaded. Press t for its numbers, or reload the page.</p>;
}
