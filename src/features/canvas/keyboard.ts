import type { KeyboardEvent } from 'react';
import { CATALOGUE } from '#shared/circuit/catalogue';
import { type DrawnPart, isComponent, type PartId, type WireEnd } from '#shared/circuit/drawing';
import { terminalKey } from '#shared/circuit/nets';
import { GRID, type GridPoint, mirrored, turned } from '#shared/geometry/place';
import { NOTHING_SELECTED, type Selection } from '../../live/selection';
import type { SheetCommands } from '../../live/sheet-commands';
import { asPartId } from './flow-elements';
import { shortPart } from './part-text';
import { type SheetGeometry, type ShownTerminal, terminalsOf } from './sheet-geometry';
import { boxOnSheet } from './symbol-box';
import type { MovingHands } from './use-moving';
import type { PlacingHands } from './use-placing';
import type { WiringHands } from './use-wiring';
import { nextInDirection, nextInRing } from './walk';

/** All that the keys act on. */
export type Desk = {
  readonly geometry: SheetGeometry;
  readonly wiresAt: (end: WireEnd) => Selection['wires'];
  readonly commands: SheetCommands;
  readonly selection: Selection;
  readonly placing: PlacingHands;
  readonly wiring: WiringHands;
  readonly moving: MovingHands;
  readonly slipOpen: boolean;
  select(selection: Selection): void;
  /** Where a part taken by its letter first appears. */
  placingStart(): GridPoint;
  focusPart(part: PartId): void;
  focusTerminal(end: WireEnd): void;
  focusDrawing(): void;
  openSlip(part: PartId): void;
  closeSlip(): void;
  showKeys(): void;
  announce(message: string): void;
};

const ARROWS: Readonly<Record<string, GridPoint>> = {
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
};
const SHIFT_STEPS = 5;

/** Whether keys pressed here belong to what is inside, such as a value field. */
function hasOwnKeys(target: EventTarget): boolean {
  return (
    target instanceof Element && target.closest('input, textarea, select, [contenteditable], [data-own-keys]') !== null
  );
}

/** Acts on a key pressed while the drawing has the focus. */
export function handleKey(event: KeyboardEvent, desk: Desk): void {
  if (event.defaultPrevented || hasOwnKeys(event.target)) return;
  const altGraph = event.getModifierState('AltGraph');
  const acted =
    !altGraph && (event.ctrlKey || event.metaKey)
      ? handleHistory(event, desk)
      : (altGraph || !event.altKey) && handlePlain(event, desk);
  if (acted) event.preventDefault();
}

/** A held arrow moves on; letting go of it drops the part, so that one press is one undo step. */
export function handleKeyUp(event: KeyboardEvent, desk: Desk): void {
  if (event.key in ARROWS || event.key === 'Shift') desk.moving.drop();
}

function handleHistory(event: KeyboardEvent, { commands }: Desk): boolean {
  const key = event.key.toLowerCase();
  if (key === 'z' && !event.shiftKey) commands.undo();
  else if (key === 'y' || key === 'z') commands.redo();
  else return false;
  return true;
}

function handlePlain(event: KeyboardEvent, desk: Desk): boolean {
  const { key } = event;
  if (key === '?') {
    desk.showKeys();
    return true;
  }
  if (key === 'Escape') return letGo(event, desk);
  const letter = event.shiftKey ? undefined : CATALOGUE.find((entry) => entry.letter === key.toLowerCase());
  if (letter && desk.commands.canEdit) {
    desk.wiring.abort();
    desk.placing.begin(letter.kind, desk.placing.now()?.place ?? desk.placingStart());
    desk.focusDrawing();
    return true;
  }
  if (desk.placing.now()) return placingKey(event, desk);
  const arrow = ARROWS[key];
  const terminal = focusedTerminal(event, desk);
  if (desk.wiring.now()) return wiringKey(event, desk, terminal);
  if (terminal) return terminalKeyPressed(event, desk, terminal);
  if (arrow) return event.shiftKey ? moveSelected(arrow, desk) : walkParts(arrow, event, desk);
  return partKey(event, desk);
}

function placingKey(event: KeyboardEvent, { placing }: Desk): boolean {
  const arrow = ARROWS[event.key];
  if (arrow) {
    const step = event.shiftKey ? GRID * SHIFT_STEPS : GRID;
    placing.shift({ x: arrow.x * step, y: arrow.y * step });
    return true;
  }
  switch (event.key) {
    case 'Enter':
    case ' ':
      placing.put();
      return true;
    case '[':
      placing.turn(-1);
      return true;
    case ']':
      placing.turn(1);
      return true;
    case '=':
      placing.mirror();
      return true;
    default:
      return false;
  }
}

/** A wire is in the hand: arrows and the ring of all terminals choose its other end. */
function wiringKey(event: KeyboardEvent, desk: Desk, focused: ShownTerminal | undefined): boolean {
  const now = desk.wiring.now();
  if (!now) return false;
  if (event.key === 'Enter' || event.key === ' ') {
    desk.wiring.tie();
    return true;
  }
  const here = focused ?? desk.geometry.terminals.get(terminalKey(now.from));
  const next = here && nextTerminal(event.key, here, [...desk.geometry.terminals.values()]);
  if (!next) return event.key in ARROWS;
  desk.wiring.aim(next.end);
  desk.focusTerminal(next.end);
  return true;
}

/** A terminal has the focus, no wire in the hand. */
function terminalKeyPressed(event: KeyboardEvent, desk: Desk, terminal: ShownTerminal): boolean {
  if (event.key === 'Enter' || event.key === ' ') {
    desk.wiring.begin(terminal.end);
    return true;
  }
  if (event.key === 'Delete' || event.key === 'Backspace') {
    const wires = desk.wiresAt(terminal.end);
    if (wires.size === 0) return false;
    desk.commands.remove(new Set(), wires);
    desk.announce(
      wires.size === 1 ? 'Removed the wire that ended here.' : `Removed the ${wires.size} wires that ended here.`,
    );
    return true;
  }
  const ring =
    event.key in ARROWS ? [...desk.geometry.terminals.values()] : terminalsOf(desk.geometry, terminal.end.part);
  const next = nextTerminal(event.key, terminal, ring);
  if (next) {
    desk.focusTerminal(next.end);
    return true;
  }
  return event.key in ARROWS;
}

function nextTerminal(
  key: string,
  here: ShownTerminal,
  terminals: readonly ShownTerminal[],
): ShownTerminal | undefined {
  const arrow = ARROWS[key];
  if (arrow) return nextInDirection(here.at, arrow, terminals, ({ at }) => at);
  if (key !== '.' && key !== ',') return undefined;
  return nextInRing(terminals, ({ end }) => terminalKey(end) === terminalKey(here.end), key === '.' ? 1 : -1);
}

function walkParts(arrow: GridPoint, event: KeyboardEvent, desk: Desk): boolean {
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

function moveSelected(arrow: GridPoint, desk: Desk): boolean {
  if (!desk.commands.canEdit) return false;
  const parts = selectedParts(desk);
  if (parts.length === 0) return false;
  const by = { x: arrow.x * GRID, y: arrow.y * GRID };
  desk.moving.show(new Map(parts.map(({ id, place }) => [id, { ...place, x: place.x + by.x, y: place.y + by.y }])));
  return true;
}

function partKey(event: KeyboardEvent, desk: Desk): boolean {
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

/** One thing after another is let go of, the nearest to the hand first. */
function letGo(event: KeyboardEvent, desk: Desk): boolean {
  if (desk.moving.abort() || desk.wiring.abort()) return true;
  if (desk.placing.end()) {
    const [placed] = selectedParts(desk);
    if (placed) desk.focusPart(placed.id);
    return true;
  }
  if (desk.slipOpen) {
    desk.closeSlip();
    return true;
  }
  const terminal = focusedTerminal(event, desk);
  if (terminal) {
    desk.focusPart(terminal.end.part);
    return true;
  }
  desk.select(NOTHING_SELECTED);
  desk.focusDrawing();
  return true;
}

function focusedTerminal({ target }: KeyboardEvent, { geometry }: Desk): ShownTerminal | undefined {
  const element = target instanceof Element ? target.closest<HTMLElement>('[data-terminal]') : null;
  const { nodeid, handleid } = element?.dataset ?? {};
  if (nodeid === undefined || handleid === undefined) return undefined;
  return geometry.terminals.get(terminalKey({ part: asPartId(nodeid), pin: handleid }));
}

/** The part that has the focus, else the only one that is selected. */
function currentPart({ target }: KeyboardEvent, desk: Desk): DrawnPart | undefined {
  const element = target instanceof Element ? target.closest<HTMLElement>('[data-part]') : null;
  const focused = element?.dataset.part;
  if (focused !== undefined) return desk.geometry.parts.get(asPartId(focused));
  const selected = selectedParts(desk);
  return selected.length === 1 ? selected[0] : undefined;
}

function selectedParts({ geometry, selection }: Desk): DrawnPart[] {
  return [...selection.parts].flatMap((id) => geometry.parts.get(id) ?? []);
}

function middleOf(part: DrawnPart): GridPoint {
  const { left, top, right, bottom } = boxOnSheet(part.kind, part.place);
  return { x: (left + right) / 2, y: (top + bottom) / 2 };
}
