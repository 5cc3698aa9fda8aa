import type { KeyboardEvent } from 'react';
import { type DrawnPart, isComponent } from '#shared/circuit/drawing';
import { GRID, type GridPoint, mirrored, turned } from '#shared/geometry/place';
import { NOTHING_SELECTED } from '../../live/selection';
import { type Desk, selectedParts } from './desk';
import { asPartId } from './flow-elements';
import { shortPart } from './part-text';
import { terminalsOf } from './sheet-geometry';
import { partBox } from './symbol-box';
import { nextInDirection } from './walk';

export function walkParts(arrow: GridPoint, event: KeyboardEvent, desk: Desk): boolean {
  const parts = [...desk.geometry.parts.values()];
  const here = currentPart(event, desk);
  const next = here
    ? nextInDirection(middleOf(here), arrow, parts, middleOf)
    : parts.sort((a, b) => a.place.y - b.place.y || a.place.x - b.place.x)[0];
  const to = next ?? here;
  if (to) {
    desk.select({ parts: new Set([to.id]), wires: new Set() });
    desk.focusPart(to.id);
  }
  return true;
}

export function moveSelected(arrow: GridPoint, desk: Desk): boolean {
  if (!desk.commands.canEdit) return false;
  const parts = selectedParts(desk);
  if (parts.length === 0) return false;
  const by = { x: arrow.x * GRID, y: arrow.y * GRID };
  desk.moving.show(new Map(parts.map(({ id, place }) => [id, { ...place, x: place.x + by.x, y: place.y + by.y }])));
  return true;
}

export function partKey(event: KeyboardEvent, desk: Desk): boolean {
  const { key } = event;
  const here = currentPart(event, desk);
  const selected = selectedParts(desk);
  switch (key) {
    case 'Enter':
    case ' ':
      if (!here) return false;
      desk.select({ parts: new Set([here.id]), wires: new Set() });
      desk.openSlip(here.id);
      return true;
    case '.':
    case ',': {
      const [first] = here ? terminalsOf(desk.geometry, here.id) : [];
      if (first) desk.focusTerminal(first.end);
      return first !== undefined;
    }
    case '[':
    case ']':
    case '=': {
      if (!desk.commands.canEdit || selected.length === 0) return false;
      const quarters = key === '[' ? -1 : 1;
      desk.commands.placeParts(
        new Map(selected.map(({ id, place }) => [id, key === '=' ? mirrored(place) : turned(place, quarters)])),
      );
      const [first] = selected;
      const what = selected.length === 1 && first ? shortPart(first) : `${selected.length} parts`;
      desk.announce(`${key === '=' ? 'Mirrored' : 'Turned'} ${what}.`);
      return true;
    }
    case 'Delete':
    case 'Backspace':
      return removeSelected(desk, selected);
    default:
      return false;
  }
}

function removeSelected(desk: Desk, selected: readonly DrawnPart[]): boolean {
  const { commands, selection } = desk;
  if (!commands.canEdit || selected.length + selection.wires.size === 0) return false;
  commands.remove(selection.parts, selection.wires);
  desk.select(NOTHING_SELECTED);
  desk.focusDrawing();
  const named = selected.filter(isComponent).map(({ ref }) => ref);
  const what =
    named.length > 0 && named.length === selected.length
      ? named.join(', ')
      : selected.length > 0
        ? 'the parts'
        : 'the wire';
  desk.announce(`Removed ${what}. Undo brings it back.`);
  return true;
}

/** The part that has the focus, else the only one that is selected. */
function currentPart({ target }: KeyboardEvent, desk: Desk): DrawnPart | undefined {
  const element = target instanceof Element ? target.closest<HTMLElement>('[data-part]') : null;
  const focused = element?.dataset.part;
  if (focused !== undefined) return desk.geometry.parts.get(asPartId(focused));
  const selected = selectedParts(desk);
  return selected.length === 1 ? selected[0] : undefined;
}

function middleOf(part: DrawnPart): GridPoint {
  const { left, top, right, bottom } = partBox(part);
  return { x: (left + right) / 2, y: (top + bottom) / 2 };
}
