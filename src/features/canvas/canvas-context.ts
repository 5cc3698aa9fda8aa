import { type ComponentType, createContext, type PointerEvent, useContext } from 'react';
import type { Region } from '#shared/circuit/circuit-file';
import type { DrawnComponent, DrawnFet, WireEnd, WireId } from '#shared/circuit/drawing';

/** A hook: the current in A that leaves a part by a terminal; undefined while nobody knows. */
export type UseTerminalCurrent = (part: DrawnComponent, pin: string) => number | undefined;

/** What the page joins to the drawing; none of it changes while the page is open. */
export type CanvasParts = {
  /** A FET's annotation. */
  readonly Tag: ComponentType<{ part: DrawnFet }>;
  /** Says beside a part other than a FET why the circuit cannot be solved; else nothing. */
  readonly PartProblem: ComponentType<{ part: DrawnComponent }>;
  /** A hook: the region a FET is in, or undefined while nobody knows. */
  readonly useRegion: (part: DrawnFet) => Region | undefined;
  /** A terminal was pressed: a wire begins. */
  pressTerminal(end: WireEnd, event: PointerEvent): void;
  /** A wire was pressed, to push one of its stretches; absent where nothing may be changed. */
  readonly pressWire: ((wire: WireId, event: PointerEvent) => void) | undefined;
};

const CanvasContext = createContext<CanvasParts | undefined>(undefined);

export const CanvasPartsProvider = CanvasContext.Provider;

export function useCanvasParts(): CanvasParts {
  const parts = useContext(CanvasContext);
  if (!parts) throw new Error('a symbol was drawn outside the canvas');
  return parts;
}
