import { terminalKey } from '#shared/circuit/nets';
import { snap } from '#shared/geometry/place';
import { routeWire } from '#shared/geometry/route-wire';
import type { SheetGeometry } from './sheet-geometry';
import { orientation, PartSymbol } from './symbols';
import type { Marquee } from './use-marquee';
import type { Placing } from './use-placing';
import type { Wiring } from './use-wiring';
import { pathOf } from './wire-edge';

type HandMarksProps = {
  readonly placing: Placing | undefined;
  readonly wiring: Wiring | undefined;
  readonly marquee: Marquee | undefined;
  readonly geometry: SheetGeometry;
};

/** What is in the hand and not yet on the sheet: a part to place, a wire with one end, a frame about parts. */
export function HandMarks({ placing, wiring, marquee, geometry }: HandMarksProps) {
  return (
    <svg className="hand" width="1" height="1" aria-hidden="true">
      {placing && (
        <g
          className="symbol ghost"
          data-testid="ghost"
          transform={`translate(${placing.place.x + 0.5} ${placing.place.y + 0.5}) ${orientation(placing.place)}`}
        >
          <PartSymbol kind={placing.kind} />
        </g>
      )}
      {marquee && <Frame {...marquee} />}
      {wiring && <WireInHand wiring={wiring} geometry={geometry} />}
    </svg>
  );
}

function Frame({ box: { left, top, right, bottom } }: Marquee) {
  return <rect className="marquee" x={left} y={top} width={right - left} height={bottom - top} />;
}

function WireInHand({ wiring: { from, at, target }, geometry }: { wiring: Wiring; geometry: SheetGeometry }) {
  const start = geometry.terminals.get(terminalKey(from));
  if (!start) return null;
  const terminal = target?.kind === 'terminal' ? geometry.terminals.get(terminalKey(target.end)) : undefined;
  const free = { at: target?.kind === 'wire' ? target.at : snap(at), leaves: { x: 0, y: 0 } };
  const end = terminal ?? free;
  return (
    <>
      <path className="hand-wire" d={pathOf(routeWire(start, end))} />
      <circle className="hand-end" cx={start.at.x + 0.5} cy={start.at.y + 0.5} r={4} />
      {target && <circle className="hand-end" cx={end.at.x + 0.5} cy={end.at.y + 0.5} r={6} />}
    </>
  );
}
