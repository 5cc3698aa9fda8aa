import type { KeyboardEvent } from 'react';
import { CATALOGUE } from '#shared/circuit/catalogue';
import { terminalKey } from '#shared/circuit/nets';
import { GRID } from '#shared/geometry/place';
import { NOTHING_SELECTED } from '../../live/selection';
import { actByKey } from './actions';
import { ARROWS, type Desk, selectedParts } from './desk';
import { asPartId } from './flow-elements';
import { moveSelected, partKey, toggleFocused, walkParts } from './part-keys';
import { type ShownTerminal, terminalsOf } from './sheet-geometry';
import { nextInDirection, nextInRing } from './walk';
import { aimAtNextWire, pushSelectedWire, selectNextWire } from './wire-keys';

/** Grid steps that a part being placed goes with Shift. */
const SHIFT_STEPS = 5;

/** Whether a key pressed here belongs to what is inside: a value field, or a button that it presses. */
function hasOwnKeys({ target, key }: KeyboardEvent): boolean {
  if (!(target instanceof Element)) return false;
  if ((key === 'Enter' || key === ' ') && target.closest('button, a')) return true;
  return target.closest('input, textarea, select, [contenteditable], [data-own-keys]') !== null;
}

/** Acts on a key pressed while the drawing has the focus. */
export function handleKey(event: KeyboardEvent, desk: Desk): void {
  if (event.defaultPrevented || hasOwnKeys(event)) return;
  const altGraph = event.getModifierState('AltGraph');
  const acted =
    !altGraph && (event.ctrlKey || event.metaKey)
      ? handleCommand(event, desk)
      : (altGraph || !event.altKey) && handlePlain(event, desk);
  if (acted) event.preventDefault();
}

/**
 * A held arrow moves on; letting go of it drops the part, so that one press is one undo step. Space selects when it is
 * let go of, for while it is held the pointer moves the sheet (`wasTap`: it did not).
 */
export function handleKeyUp(event: KeyboardEvent, desk: Desk, wasTap: boolean): void {
  if (event.key === ' ' && wasTap && !hasOwnKeys(event) && !isBusy(desk)) toggleFocused(event, desk);
  if (event.key in ARROWS || event.key === 'Shift') {
    desk.moving.drop();
    desk.bending.drop();
  }
}

function isBusy({ placing, wiring }: Desk): boolean {
  return placing.now() !== undefined || wiring.now() !== undefined;
}

function handleCommand(event: KeyboardEvent, desk: Desk): boolean {
  const { commands, announce } = desk;
  const arrow = ARROWS[event.key];
  if (arrow && !event.shiftKey && !isBusy(desk)) return walkParts(arrow, event, desk);
  const key = event.key.toLowerCase();
  if (key === 'z' && !event.shiftKey) {
    announce(commands.canUndo ? 'Undone.' : 'There is nothing of yours to undo.');
    commands.undo();
  } else if (key === 'y' || key === 'z') {
    announce(commands.canRedo ? 'Redone.' : 'There is nothing to redo.');
    commands.redo();
  } else return !isBusy(desk) && actByKey(event, desk);
  return true;
}

function handlePlain(event: KeyboardEvent, desk: Desk): boolean {
  const { key } = event;
  if (key === '?') {
    desk.show('keys');
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
  if (arrow && event.shiftKey) return pushSelectedWire(arrow, desk) || moveSelected(arrow, desk);
  if (key === 'a') {
    desk.show('actions');
    return true;
  }
  if (actByKey(event, desk)) return true;
  if (terminal) return terminalKeyPressed(event, desk, terminal);
  if (arrow) return walkParts(arrow, event, desk);
  // Else it would scroll the page.
  return key === ' ' || partKey(event, desk);
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
  if (event.key === 'w') return aimAtNextWire(desk);
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
  if (event.key === 'w') return selectNextWire(terminal, desk);
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
  return event.key in ARROWS || partKey(event, desk);
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

/** One thing after another is let go of, the nearest to the hand first. */
function letGo(event: KeyboardEvent, desk: Desk): boolean {
  if (desk.moving.abort() || desk.bending.abort() || desk.marquee.abort() || desk.wiring.abort()) return true;
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
