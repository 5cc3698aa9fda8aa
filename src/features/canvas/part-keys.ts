import type { KeyboardEvent } from 'react';
import { type DrawnPart, isComponent } from '#shared/circuit/drawing';
import { GRID, type GridPoint, mirrored, type Place, turned } from '#shared/geometry/place';
import { NOTHING_SELECTED } from '../../live/selection';
import { type Desk, selectedParts } from './desk';
import { asPartId } from './flow-elements';
import { shortPart } from './part-text';
import { terminalsOf } from './sheet-geometry';
import { partBox } from './symbol-box';
import { nextInDirection } from './walk';

/** To the next part that way, which is then the one selected; with the command key the selection stays. */
export function walkParts(arrow: GridPoint, event: KeyboardEvent, desk: Desk): boolean {
  const parts = [...desk.geometry.parts.values()];
  const here = currentPart(event, desk);
  const next = here
    ? nextInDirection(middleOf(here), arrow, parts, middleOf)
    : parts.sort((a, b) => a.place.y - b.place.y || a.place.x - b.place.x)[0];
  const to = next ?? here;
  if (to) {
    if (!event.ctrlKey && !event.metaKey) desk.select({ parts: new Set([to.id]), wires: new Set() });
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
  switch (key) {
    case 'Enter':
      return openSlipAt(here, desk);
    case '.':
    case ',': {
      const [first] = here ? terminalsOf(desk.geometry, here.id) : [];
      if (first) desk.focusTerminal(first.end);
      return first !== undefined;
    }
    case '[':
      return turnSelected(desk, -1);
    case ']':
      return turnSelected(desk, 1);
    case '=':
      return mirrorSelected(desk);
    case 'Delete':
    case 'Backspace':
      return removeSelected(desk);
    default:
      return false;
  }
}

/** The slip of the part with the focus, or of all that are selected where it is one of them. */
function openSlipAt(here: DrawnPart | undefined, desk: Desk): boolean {
  const part = here ?? selectedParts(desk).find(hasSlip);
  if (!part) return false;
  if (!desk.selection.parts.has(part.id)) desk.select({ parts: new Set([part.id]), wires: new Set() });
  desk.openSlip(part.id);
  return true;
}

/** Takes the part with the focus into the selection, or out of it. */
export function toggleFocused(event: KeyboardEvent, desk: Desk): void {
  const here = focusedPart(event, desk);
  if (!here) return;
  const parts = new Set(desk.selection.parts);
  const taken = parts.delete(here.id);
  if (!taken) parts.add(here.id);
  desk.select({ parts, wires: desk.selection.wires });
  desk.announce(`${shortPart(here)} ${taken ? 'is no longer selected' : 'is selected too'}: ${parts.size} in all.`);
}

export function hasSlip({ kind }: DrawnPart): boolean {
  return kind !== 'ground' && kind !== 'junction';
}

export function turnSelected(desk: Desk, quarters: 1 | -1): boolean {
  return placeSelected(desk, 'Turned', (place) => turned(place, quarters));
}

export function mirrorSelected(desk: Desk): boolean {
  return placeSelected(desk, 'Mirrored', mirrored);
}

function placeSelected(desk: Desk, done: string, to: (place: Place) => Place): boolean {
  const selected = selectedParts(desk);
  const [first] = selected;
  if (!desk.commands.canEdit || !first) return false;
  desk.commands.placeParts(new Map(selected.map(({ id, place }) => [id, to(place)])));
  desk.announce(`${done} ${selected.length === 1 ? shortPart(first) : `${selected.length} parts`}.`);
  return true;
}

export function removeSelected(desk: Desk): boolean {
  const { commands, selection } = desk;
  const selected = selectedParts(desk);
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
function currentPart(event: KeyboardEvent, desk: Desk): DrawnPart | undefined {
  const selected = selectedParts(desk);
  return focusedPart(event, desk) ?? (selected.length === 1 ? selected[0] : undefined);
}

function focusedPart({ target }: KeyboardEvent, { geometry }: Desk): DrawnPart | undefined {
  const element = target instanceof Element ? target.closest<HTMLElement>('[data-part]') : null;
  const id = element?.dataset.part;
  return id === undefined ? undefined : geometry.parts.get(asPartId(id));
}

function middleOf(part: DrawnPart): GridPoint {
  const { left, top, right, bottom } = partBox(part);
  return { x: (left + right) / 2, y: (top + bottom) / 2 };
}
