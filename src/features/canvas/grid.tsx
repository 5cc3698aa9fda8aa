import { useId } from 'react';
import { useStore } from 'reactflow';
import { GRID } from '#shared/geometry/place';

/** Grid steps between crosses where every one would run into the next, and the zoom below which they would. */
const SPARSE = 5;
const DENSE_FROM = 0.5;

/**
 * Small crosses at the grid's points, every fifth from far. A layer of its own that a pan only shifts by less than one
 * step: the pattern is drawn again when the zoom changes, not for each frame.
 */
export function Grid() {
  const [x, y, zoom] = useStore(({ transform }) => transform);
  const pattern = useId();
  const dense = zoom >= DENSE_FROM;
  const gap = GRID * (dense ? 1 : SPARSE) * zoom;
  const arm = (dense ? 1.5 : 3) * zoom;
  // A cross stands in the middle of each tile; wires run half a pixel beside the grid's points.
  const shift = (at: number) => ((((at + zoom / 2 - gap / 2) % gap) + gap) % gap) - gap;
  return (
    <div className="grid-layer">
      <svg className="grid-crosses" aria-hidden="true" style={{ transform: `translate(${shift(x)}px, ${shift(y)}px)` }}>
        <pattern id={pattern} width={gap} height={gap} patternUnits="userSpaceOnUse">
          <path d={`M${gap / 2 - arm} ${gap / 2}h${2 * arm}M${gap / 2} ${gap / 2 - arm}v${2 * arm}`} />
        </pattern>
        <rect width="100%" height="100%" fill={`url(#${pattern})`} />
      </svg>
    </div>
  );
}
