import { type ComponentType, memo } from 'react';
import { EdgeLabelRenderer } from 'reactflow';
import type { GridPoint } from '#shared/geometry/place';
import type { NetSpot } from './net-spots';
import { pathOf } from './wire-edge';

type NetMarksProps = {
  readonly dots: readonly GridPoint[];
  readonly spots: readonly NetSpot[];
  /** Routes of the net under the pointer. */
  readonly lit: readonly (readonly GridPoint[])[];
  readonly voltages: boolean;
  readonly NetVoltage: ComponentType<{ net: string }>;
};

/** What belongs to nets rather than to single wires: dots, names, voltages, the net that is lit. */
export const NetMarks = memo(function NetMarks({ dots, spots, lit, voltages, NetVoltage }: NetMarksProps) {
  return (
    <EdgeLabelRenderer>
      <svg className="net-marks" width="1" height="1" aria-hidden="true">
        {lit.map((line) => (
          <path key={pathOf(line)} className="net-lit" d={pathOf(line)} />
        ))}
        {dots.map(({ x, y }) => (
          <circle key={`${x} ${y}`} className="dot" cx={x + 0.5} cy={y + 0.5} r={3} />
        ))}
      </svg>
      {spots.map(({ net, named, at }) => (
        <div key={net} className="net-label" style={{ left: at.x, top: at.y }}>
          {named && <span className="net-name">{net}</span>}
          {voltages && <NetVoltage net={net} />}
        </div>
      ))}
    </EdgeLabelRenderer>
  );
});
