import { bodyLedOut, type DrawnFet, type DrawnPart, isFet } from '#shared/circuit/drawing';
import { type Anchor, around, type Box, hungBox } from '#shared/geometry/box';
import { type GridPoint, onSheet, orient, type Place } from '#shared/geometry/place';
import { type Block, type Candidate, placesAbout } from '#shared/geometry/place-tags';
import { inkOnSheet } from '#shared/geometry/symbol-ink';
import { nameOf, valueText } from './part-text';
import { partBox } from './symbol-box';

/** Advance of one character at 12 px, as the bundled face has it, and the height of a line. */
export const CHARACTER = 7.2;
export const LINE = 16;

/** A tag with its three lines and the room inside its outline. */
export const TAG_WIDTH = 120;
export const TAG_HEIGHT = 56;

const LEFT: GridPoint = { x: -1, y: 0 };
const RIGHT: GridPoint = { x: 1, y: 0 };
const ABOVE: GridPoint = { x: 0, y: -1 };
const BELOW: GridPoint = { x: 0, y: 1 };

/** A place in a symbol's own drawing, as it is with an upright one, in order of preference. */
type OwnPlace = { readonly at: GridPoint; readonly grows: GridPoint };

/** What a part's strokes cover; a note is text alone. */
export function inkOf(part: DrawnPart): Box[] {
  return part.kind === 'note' ? [partBox(part)] : inkOnSheet(part.kind, part.place, bodyLedOut(part));
}

/** The lines beside a symbol: what it is called, then its value. */
export function labelLines(part: DrawnPart): string[] {
  return [nameOf(part), valueText(part)].filter((line) => line !== undefined);
}

/** A part's reference and value: on the gate's side of a FET, to the right of an upright two-terminal part. */
export function labelBlock(part: DrawnPart): Block | undefined {
  const own = LABEL_PLACES[part.kind];
  const lines = labelLines(part);
  if (!own || lines.length === 0) return undefined;
  const width = Math.ceil(Math.max(...lines.map((line) => line.length)) * CHARACTER);
  return {
    id: part.id,
    width,
    height: lines.length * LINE,
    candidates: laidOut(own, part.place),
    remote: {
      from: 60,
      places: () => placesAbout(around(cornersOf(inkOf(part))), [RIGHT, LEFT, BELOW, ABOVE], 60),
    },
  };
}

/** About where a part's label would like to stand; the same whatever its value, for wires must not move with values. */
export function labelWish(part: DrawnPart): Box | undefined {
  const [wish] = laidOut(LABEL_PLACES[part.kind] ?? [], part.place);
  return wish && part.kind !== 'net-name' ? hungBox(wish, 8 * CHARACTER, 2 * LINE) : undefined;
}

/** A FET's tag: across the channel from its gate, level with it. */
export function tagBlock(part: DrawnFet): Block {
  const channelSide = orient(RIGHT, part.place);
  const sides = [channelSide, BELOW, ABOVE, { x: -channelSide.x, y: -channelSide.y }];
  const distinct = sides.filter((side, i) => sides.findIndex((other) => sameSide(side, other)) === i);
  const missing = [RIGHT, LEFT].filter((side) => !distinct.some((other) => sameSide(side, other)));
  return {
    id: part.id,
    width: TAG_WIDTH,
    height: TAG_HEIGHT,
    candidates: laidOut(tagPlaces(part), part.place),
    remote: {
      from: 40,
      places: () => placesAbout(around(cornersOf(inkOf(part))), [...distinct, ...missing], 40),
    },
  };
}

/** The first choice of a tag, which wires keep clear of where they can. */
export function tagWish(part: DrawnFet): Anchor {
  const [wish] = laidOut(tagPlaces(part), part.place);
  if (!wish) throw new Error('a tag has a first choice');
  return wish;
}

function tagPlaces(part: DrawnFet): OwnPlace[] {
  // The middle of the channel, from which P lies downwards and N upwards.
  const middle = part.kind === 'pfet' ? 15 : -15;
  const slides = bodyLedOut(part) ? [Math.sign(middle) * -34, Math.sign(middle) * 34] : [0, 10, -10, 20, -20, 30, -30];
  return slides.map((slide) => ({ at: { x: 16, y: middle + slide }, grows: RIGHT }));
}

const BESIDE_UPRIGHT = (away: number): OwnPlace[] => [
  { at: { x: away, y: 0 }, grows: RIGHT },
  { at: { x: -away, y: 0 }, grows: LEFT },
  ...[10, -10, 20, -20].flatMap((y) => [
    { at: { x: away, y }, grows: RIGHT },
    { at: { x: -away, y }, grows: LEFT },
  ]),
];

/** On a corner of a FET: below or above the gate's lead, or across the channel. */
const FET_LABEL = (towardsDrain: 1 | -1): OwnPlace[] => [
  { at: { x: -29, y: 6 * towardsDrain }, grows: { x: -1, y: towardsDrain } },
  { at: { x: -29, y: -6 * towardsDrain }, grows: { x: -1, y: -towardsDrain } },
  { at: { x: 8, y: 0 }, grows: { x: 1, y: -towardsDrain } },
  { at: { x: 8, y: 32 * towardsDrain }, grows: { x: 1, y: 0 } },
];

const LABEL_PLACES: Partial<Record<DrawnPart['kind'], OwnPlace[]>> = {
  nfet: FET_LABEL(-1),
  pfet: FET_LABEL(1),
  resistor: BESIDE_UPRIGHT(16),
  inductor: BESIDE_UPRIGHT(16),
  capacitor: BESIDE_UPRIGHT(20),
  voltage: BESIDE_UPRIGHT(26),
  current: BESIDE_UPRIGHT(26),
  supply: [
    { at: { x: 0, y: -14 }, grows: ABOVE },
    { at: { x: 16, y: -10 }, grows: RIGHT },
    { at: { x: -16, y: -10 }, grows: LEFT },
  ],
  'net-name': [
    { at: { x: -16, y: 0 }, grows: LEFT },
    { at: { x: -9, y: -6 }, grows: ABOVE },
    { at: { x: -9, y: 6 }, grows: BELOW },
  ],
};

function laidOut(own: readonly OwnPlace[], place: Place): Candidate[] {
  return own.map(({ at, grows }, rank) => ({
    at: onSheet(at, place),
    grows: orient(grows, place),
    cost: rank * 6,
  }));
}

export function cornersOf(boxes: readonly Box[]): GridPoint[] {
  return boxes.flatMap(({ left, top, right, bottom }) => [
    { x: left, y: top },
    { x: right, y: bottom },
  ]);
}

function sameSide(a: GridPoint, b: GridPoint): boolean {
  return a.x === b.x && a.y === b.y;
}

/** Fets alone have tags. */
export function fetsOf(parts: Iterable<DrawnPart>): DrawnFet[] {
  return [...parts].filter(isFet);
}
