import { type Clip, clipOf } from '#shared/circuit/clip';
import { besideModel, middleAt } from '#shared/circuit/copy-spot';
import type { Carry } from '#shared/geometry/carry';
import type { GridPoint } from '#shared/geometry/place';
import type { Desk } from './desk';

/** Puts a copy of what is selected to its right, as it is or as its mirror image. */
export function duplicate(desk: Desk, mirror: boolean): void {
  const clip = clipOf(desk.drawing, desk.selection.parts);
  const carry = besideModel(clip.parts, desk.drawing.parts, mirror);
  insert(desk, clip, carry, mirror ? 'Duplicated as a mirror image' : 'Duplicated');
}

/** Puts a clip with its middle at a point. */
export function insertAt(desk: Desk, clip: Clip, at: GridPoint): void {
  insert(desk, clip, middleAt(clip.parts, desk.drawing.parts, at), 'Pasted');
}

function insert(desk: Desk, clip: Clip, carry: Carry, done: string): void {
  const inserted = desk.commands.insertClip(clip, carry);
  if (!inserted.ok) {
    desk.say(inserted.reason);
    return;
  }
  const { parts, wires, renamedProcesses } = inserted;
  desk.arrived({ parts, wires });
  const renamed = renamedProcesses.map(
    ({ from, to }) => ` This sheet has another process ${from}; the one that came along is called ${to} here.`,
  );
  desk.say(`${done}: ${countOf(parts.size)}.${renamed.join('')}`);
}

export function countOf(parts: number): string {
  return parts === 1 ? '1 part' : `${parts} parts`;
}
