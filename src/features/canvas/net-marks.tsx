import { type ComponentType, memo } from 'react';
import { EdgeLabelRenderer } from 'reactflow';
import type { GridPoint } from '#shared/geometry/place';
import type { LitNet } from './lit-net';
import type { NetSpot } from './net-spots';
import { pathOf } from './wire-edge';

type NetMarksProps = {
  readonly dots: readonly GridPoint[];
  readonly spots: readonly NetSpot[];
  /** The net under the pointer. */
  readonly lit: LitNet | undefined;
  readonly voltages: boolean;
  readonly NetVoltage: ComponentType<{ net: string }>;
};

/** What belongs to nets rather than to single wires: dots, names, voltages, the net that is lit. */
export const NetMarks = memo(function NetMarks({ dots, spots, lit, voltages, NetVoltage }: NetMarksProps) {
  return (
    <EdgeLabelRenderer>
      <svg className="net-marks" width="1" height="1" aria-hidden="true">
        {lit?.lines.map((line) => (
          <path key={pathOf(line)} className="net-lit" d={pathOf(line)} />
        ))}
        {lit?.terminals.map(({ x, y }) => (
          <circle key={`${x} ${y}`} className="net-lit" cx={x + 0.5} cy={y + 0.5} r={4} />
        ))}
        {dots.map(({ x, y }) => (
          <Dot key={`${x} ${y}`} x={x} y={y} />
        ))}
      </svg>
      {spots.map((spot) =>
        spot.named || voltages ? (
          <NetLabel
            key={spot.net}
            spot={spot}
            lit={lit?.net === spot.net}
            NetVoltage={voltages ? NetVoltage : undefined}
          />
        ) : null,
      )}
    </EdgeLabelRenderer>
  );
});

const Dot = memo(function Dot({ x, y }: GridPoint) {
  return <circle className="dot" cx={x + 0.5} cy={y + 0.5} r={3} />;
});

type NetLabelProps = {
  readonly spot: NetSpot;
  readonly lit: boolean;
  readonly NetVoltage: ComponentType<{ net: string }> | undefined;
};

const NetLabel = memo(function NetLabel({ spot: { net, named, at }, lit, NetVoltage }: NetLabelProps) {
  return (
    <div className="net-label" data-lit={lit || undefined} style={{ left: at.x, top: at.y }}>
      {named && <span className="net-name">{net}</span>}
      {NetVoltage && <NetVoltage net={net} />}
    </div>
  );
});
