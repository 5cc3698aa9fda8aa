import { memo } from 'react';
import type { EdgeProps } from 'reactflow';
import type { GridPoint } from '#shared/geometry/place';
import { useCanvasParts } from './canvas-context';
import { asWireId, type WireData } from './flow-elements';

/** How near a wire the pointer must come, in px of the sheet, on both sides together. */
const REACH = 14;

/** A wire, drawn along the drawing's own route; React Flow's idea of where its ends are is not asked for. */
export const WireEdge = memo(function WireEdge({ id, data }: EdgeProps<WireData>) {
  const { pressWire } = useCanvasParts();
  const path = pathOf(data?.line ?? []);
  return (
    <>
      <path className="react-flow__edge-path" d={path} fill="none" data-wire={id} />
      <path
        className={pressWire ? 'react-flow__edge-interaction nopan' : 'react-flow__edge-interaction'}
        d={path}
        fill="none"
        strokeOpacity={0}
        strokeWidth={REACH}
        onPointerDown={pressWire && ((event) => pressWire(asWireId(id), event))}
      />
    </>
  );
});

/** An SVG path along grid points, half a pixel aside so that a hairline falls on whole pixels. */
export function pathOf(line: readonly GridPoint[]): string {
  return line.map(({ x, y }, i) => `${i === 0 ? 'M' : 'L'}${x + 0.5} ${y + 0.5}`).join('');
}
