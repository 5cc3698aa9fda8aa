import type { DrawnPart } from '#shared/circuit/drawing';
import type { Box } from '#shared/geometry/box';
import { partBox } from './symbol-box';

const MARGIN = 6;
const ARM = 8;

/** Corner brackets about a part: they mark it without boxing it in. */
export function Brackets({ part, look }: { part: DrawnPart; look: 'selected' | 'lit' | 'other' }) {
  const { left, top, right, bottom } = outset(partBox(part));
  return (
    <path
      className={`brackets brackets-${look}`}
      d={
        `M${left} ${top + ARM}V${top}H${left + ARM}M${right - ARM} ${top}H${right}V${top + ARM}` +
        `M${right} ${bottom - ARM}V${bottom}H${right - ARM}M${left + ARM} ${bottom}H${left}V${bottom - ARM}`
      }
    />
  );
}

/** The place of brackets about a part's box, on half pixels. */
export function outset({ left, top, right, bottom }: Box): Box {
  return {
    left: left - MARGIN + 0.5,
    top: top - MARGIN + 0.5,
    right: right + MARGIN + 0.5,
    bottom: bottom + MARGIN + 0.5,
  };
}
