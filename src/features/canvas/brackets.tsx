import type { DrawnPart } from '#shared/circuit/drawing';
import type { Box } from '#shared/geometry/box';
import { partBox } from './symbol-box';

const MARGIN = 6;
const ARM = 8;
/** A dot is small, and others stand close to it. */
const DOT = { margin: -3, arm: 4 };

/** Corner brackets about a part: they mark it without boxing it in. */
export function Brackets({ part, look }: { part: DrawnPart; look: 'selected' | 'lit' | 'other' }) {
  const dot = part.kind === 'junction';
  const { left, top, right, bottom } = outset(partBox(part), dot ? DOT.margin : MARGIN);
  const arm = dot ? DOT.arm : ARM;
  return (
    <path
      className={`brackets brackets-${look}`}
      d={
        `M${left} ${top + arm}V${top}H${left + arm}M${right - arm} ${top}H${right}V${top + arm}` +
        `M${right} ${bottom - arm}V${bottom}H${right - arm}M${left + arm} ${bottom}H${left}V${bottom - arm}`
      }
    />
  );
}

/** The place of brackets about a part's box, on half pixels. */
export function outset({ left, top, right, bottom }: Box, margin = MARGIN): Box {
  return {
    left: left - margin + 0.5,
    top: top - margin + 0.5,
    right: right + margin + 0.5,
    bottom: bottom + margin + 0.5,
  };
}
