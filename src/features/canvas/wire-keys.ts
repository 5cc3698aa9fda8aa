import type { WireId } from '#shared/circuit/drawing';
import { longestStretch } from '#shared/geometry/bend-wire';
import { type GridPoint, snap } from '#shared/geometry/place';
import type { Desk } from './desk';
import type { ShownTerminal } from './sheet-geometry';
import { nextInRing } from './walk';

/** With a wire alone selected, Shift and an arrow push its longest stretch that way. */
export function pushSelectedWire(arrow: GridPoint, { selection, bending }: Desk): boolean {
  const [wire] = selection.wires;
  return wire !== undefined && selection.wires.size === 1 && selection.parts.size === 0 && bending.step(wire, arrow);
}

/** Selects the wires that end on a terminal, one after the other. */
export function selectNextWire({ end }: ShownTerminal, desk: Desk): boolean {
  const wires = [...desk.wiresAt(end)];
  const next = nextInRing(wires, (wire) => desk.selection.wires.has(wire), 1);
  if (next === undefined) {
    desk.announce('No wire ends here.');
    return true;
  }
  desk.select({ parts: new Set(), wires: new Set([next]) });
  desk.announce(`Selected ${desk.spokenWire(next)}. Shift and arrows push it aside, Delete removes it.`);
  return true;
}

/** With a wire in the hand: aims at the middle of one wire after another, the nearest to the other end first. */
export function aimAtNextWire(desk: Desk): boolean {
  const now = desk.wiring.now();
  const start = now && desk.terminalAt(now.from);
  if (!now || !start) return false;
  const own = new Set(desk.wiresAt(now.from));
  const middles = [...desk.geometry.routes].flatMap(([wire, line]) => {
    const at = own.has(wire) ? undefined : middleOf(line);
    return at ? [{ wire, at, far: Math.abs(at.x - start.x) + Math.abs(at.y - start.y) }] : [];
  });
  middles.sort((a, b) => a.far - b.far || (a.wire < b.wire ? -1 : 1));
  const aimed: WireId | undefined = now.target?.kind === 'wire' ? now.target.wire.id : undefined;
  const next = nextInRing(middles, ({ wire }) => wire === aimed, 1);
  if (!next) return false;
  desk.wiring.follow(next.at);
  desk.announce(`${desk.spokenWire(next.wire)}: Enter ties to its middle.`);
  return true;
}

/** The grid point in the middle of a line's longest stretch, where it is long enough to have one. */
function middleOf(line: readonly GridPoint[]): GridPoint | undefined {
  const [level, upright] = [longestStretch(line, false), longestStretch(line, true)];
  const stretch = (level?.length ?? 0) >= (upright?.length ?? 0) ? level : upright;
  const [a, b] = stretch ? [line[stretch.index], line[stretch.index + 1]] : [];
  return stretch && a && b && stretch.length >= 20 ? snap({ x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 }) : undefined;
}
