import { useState } from 'react';
import { bodyLedOut, type DrawnPart } from '#shared/circuit/drawing';
import { ALIGNMENTS, type Alignment, aligned, type Direction, type Standing, spaced } from '#shared/geometry/arrange';
import { pinPlaces } from '#shared/geometry/pins';
import { MenuChoice, MenuItem, MenuLine, MenuNote } from '../../ui/menu';
import { MenuAt } from '../../ui/menu-at';
import { type Desk, selectedParts } from './desk';

/** Stands for the part's own point, at which it is placed. */
const ORIGIN = 'symbol';

type AlignMenuProps = {
  readonly at: { readonly x: number; readonly y: number } | undefined;
  readonly desk: Desk;
  readonly onClose: () => void;
};

/** Lines the selected parts up by their origins or by a terminal that all of them have, or spaces them equally. */
export function AlignMenu({ at, desk, onClose }: AlignMenuProps) {
  const [by, setBy] = useState(ORIGIN);
  const parts = selectedParts(desk).filter(({ kind }) => kind !== 'junction');
  const pins = commonPins(parts);
  const chosen = pins.includes(by) ? by : ORIGIN;
  const standings = parts.map((part) => standingBy(part, chosen));
  const align = (to: Alignment) => {
    desk.commands.placeParts(aligned(standings, to));
    desk.say(`Aligned ${parts.length} parts ${to}${chosen === ORIGIN ? '' : ` by their ${chosen}s`}.`);
  };
  const space = (direction: Direction) => {
    desk.commands.placeParts(spaced(standings, direction));
    desk.say(`Spaced ${parts.length} parts equally ${direction}.`);
  };
  return (
    <MenuAt at={at} label="Align and space" onClose={onClose} onFocusBack={desk.focusDrawing}>
      <MenuNote>
        <span className="text-faint">align</span>
      </MenuNote>
      {ALIGNMENTS.map((to) => (
        <MenuItem key={to} onSelect={() => align(to)}>
          {to}
        </MenuItem>
      ))}
      {parts.length > 2 && (
        <>
          <MenuLine />
          <MenuItem onSelect={() => space('across')}>space equally across</MenuItem>
          <MenuItem onSelect={() => space('down')}>space equally down</MenuItem>
        </>
      )}
      {pins.length > 0 && (
        <>
          <MenuLine />
          <MenuChoice
            label="by"
            value={chosen}
            options={[ORIGIN, ...pins].map((pin) => ({ value: pin, text: pin }))}
            onChange={setBy}
          />
        </>
      )}
    </MenuAt>
  );
}

function commonPins(parts: readonly DrawnPart[]): string[] {
  const [first, ...others] = parts.map(pinsOf);
  return (first ?? [])
    .map(({ pin }) => pin)
    .filter((pin) => others.every((pins) => pins.some((one) => one.pin === pin)));
}

function standingBy(part: DrawnPart, point: string): Standing<DrawnPart['id']> {
  const at = pinsOf(part).find(({ pin }) => pin === point)?.at ?? part.place;
  return { id: part.id, place: part.place, at };
}

function pinsOf(part: DrawnPart) {
  return pinPlaces(part.kind, part.place, bodyLedOut(part));
}
