import type { ComponentType, ReactNode } from 'react';
import type { Region } from '#shared/circuit/circuit-file';
import type { Drawing, DrawnComponent, DrawnFet, PartId } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import type { GridPoint } from '#shared/geometry/place';
import type { OtherPerson, SharedView } from '../../live/presence';
import type { Selection } from '../../live/selection';
import type { SheetCommands } from '../../live/sheet-commands';
import type { UseTerminalCurrent } from './canvas-context';

export type CanvasProps = {
  /** An unchanged part must be the same object from render to render. */
  readonly drawing: Drawing;
  readonly nets: DrawnNets;
  readonly commands: SheetCommands;
  readonly selection: Selection;
  onSelect(selection: Selection): void;
  /** Stable components and a stable hook: they watch the solution themselves. */
  readonly Tag: ComponentType<{ part: DrawnFet }>;
  readonly NetVoltage: ComponentType<{ net: string }>;
  readonly PartProblem: ComponentType<{ part: DrawnComponent }>;
  readonly useTerminalCurrent?: UseTerminalCurrent;
  readonly useRegion?: (part: DrawnFet) => Region | undefined;
  /** The open slip and the part it is attached to. */
  readonly slip: ReactNode | undefined;
  readonly slipPart: PartId | undefined;
  onOpenSlip(part: PartId): void;
  onCloseSlip(): void;
  readonly others: readonly OtherPerson[];
  /** Lit from elsewhere on the page. */
  readonly lit: ReadonlySet<PartId>;
  /** Brings a part into view whenever `request` changes. */
  readonly frame: { readonly part: PartId; readonly request: number } | undefined;
  /** Says something to those who cannot see the drawing. */
  announce(message: string): void;
  /** Where the pointer is on the sheet. */
  onPointer?(at: GridPoint | undefined): void;
  /** The view of the person who is followed, and what is in view here. */
  readonly followed: SharedView | undefined;
  onView(view: SharedView): void;
  onLeaveFollowed(): void;
};
