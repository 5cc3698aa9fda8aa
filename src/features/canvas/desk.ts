import type { Drawing, DrawnPart, PartId, WireEnd, WireId } from '#shared/circuit/drawing';
import type { GridPoint } from '#shared/geometry/place';
import type { Selection } from '../../live/selection';
import type { SheetCommands } from '../../live/sheet-commands';
import type { SheetGeometry } from './sheet-geometry';
import type { BendingHands } from './use-bending';
import type { MarqueeHands } from './use-marquee';
import type { MovingHands } from './use-moving';
import type { PlacingHands } from './use-placing';
import type { WiringHands } from './use-wiring';

/** What opens over the drawing at a person's wish. */
export type Panel = 'actions' | 'alignments' | 'find' | 'keys';

/** All that keys and clicks act on. */
export type Desk = {
  readonly drawing: Drawing;
  readonly geometry: SheetGeometry;
  readonly wiresAt: (end: WireEnd) => Selection['wires'];
  readonly commands: SheetCommands;
  readonly selection: Selection;
  /** Clicks add to the selection and take from it without a key held. */
  readonly several: boolean;
  /** The selection before the pointer was last pressed, which itself selects. */
  readonly selectedAtPress: Selection;
  readonly placing: PlacingHands;
  readonly wiring: WiringHands;
  readonly moving: MovingHands;
  readonly bending: BendingHands;
  readonly marquee: MarqueeHands;
  readonly slipOpen: boolean;
  readonly terminalAt: (end: WireEnd) => GridPoint | undefined;
  readonly spokenWire: (wire: WireId) => string;
  select(selection: Selection): void;
  /** Where a part taken by its letter first appears. */
  placingStart(): GridPoint;
  /** Where a copy is put down. */
  pointerOrMiddle(): GridPoint;
  /** Things that were just put on the sheet: they are selected and brought into view. */
  arrived(selection: Selection): void;
  focusPart(part: PartId): void;
  focusTerminal(end: WireEnd): void;
  focusDrawing(): void;
  openSlip(part: PartId): void;
  closeSlip(): void;
  /** A menu at a place of the window, else at what is selected. */
  show(panel: Panel, at?: GridPoint): void;
  /** Says something to those who cannot see the drawing. */
  announce(message: string): void;
  /** Says something to everyone. */
  say(message: string): void;
};

export const ARROWS: Readonly<Record<string, GridPoint>> = {
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
};

export function selectedParts({ geometry, selection }: Desk): DrawnPart[] {
  return [...selection.parts].flatMap((id) => geometry.parts.get(id) ?? []);
}
