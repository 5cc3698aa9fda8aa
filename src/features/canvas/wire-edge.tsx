import { memo } from 'react';
import { BaseEdge, type EdgeProps } from 'reactflow';
import type { GridPoint } from '#shared/geometry/place';
import type { WireData } from './flow-elements';

/** A wire, drawn along the drawing's own route; React Flow's idea of where its ends are is not asked for. */
export const WireEdge = memo(function WireEdge({ id, data }: EdgeProps<WireData>) {
  return <BaseEdge id={id} path={pathOf(data?.line ?? [])} interactionWidth={14} />;
});

/** An SVG path along grid points, half a pixel aside so that a hairline falls on whole pixels. */
export function pathOf(line: readonly GridPoint[]): string {
  return line.map(({ x, y }, i) => `${i === 0 ? 'M' : 'L'}${x + 0.5} ${y + 0.5}`).join('');
}
