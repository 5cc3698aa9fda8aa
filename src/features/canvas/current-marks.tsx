import { memo } from 'react';
import { EdgeLabelRenderer } from 'reactflow';
import { formatValue } from '#shared/units/format-value';
import type { UseTerminalCurrent } from './canvas-context';
import { type CurrentSpot, figureBox } from './current-spots';

type CurrentMarksProps = { readonly spots: readonly CurrentSpot[]; readonly useTerminalCurrent: UseTerminalCurrent };

/** The currents of the branches: an arrowhead on the wire the way the current flows, its figure beside it. */
export const CurrentMarks = memo(function CurrentMarks({ spots, useTerminalCurrent }: CurrentMarksProps) {
  return (
    <EdgeLabelRenderer>
      {spots.map((spot) => (
        <CurrentMark key={`${spot.part.id} ${spot.pin}`} spot={spot} useTerminalCurrent={useTerminalCurrent} />
      ))}
    </EdgeLabelRenderer>
  );
});

/** Points right, its middle on the origin. */
const ARROWHEAD = 'M5 0L-5-4.5V4.5Z';

const CurrentMark = memo(function CurrentMark({
  spot,
  useTerminalCurrent,
}: {
  spot: CurrentSpot;
  useTerminalCurrent: UseTerminalCurrent;
}) {
  const current = useTerminalCurrent(spot.part, spot.pin);
  // Without a current there is no direction to show.
  if (current === undefined || current === 0) return null;
  const { at, outwards, side } = spot;
  const turn = Math.atan2(outwards.y, outwards.x) * (180 / Math.PI) + (current < 0 ? 180 : 0);
  const { left, top, right } = figureBox(spot);
  const align = side.x > 0 ? 'left' : side.x < 0 ? 'right' : 'center';
  return (
    <>
      <svg className="current-arrow" width="1" height="1" aria-hidden="true">
        <path d={ARROWHEAD} transform={`translate(${at.x + 0.5} ${at.y + 0.5}) rotate(${turn})`} />
      </svg>
      <p
        className="current-figure"
        style={{ left, top: side.y === 0 ? top : top - 1, width: right - left, textAlign: align }}
        title={formatValue(Math.abs(current), 'A', 4)}
        data-current={`${spot.part.ref}.${spot.pin}`}
      >
        {formatValue(Math.abs(current), 'A')}
      </p>
    </>
  );
});
