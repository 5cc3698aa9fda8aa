import { useMemo } from 'react';
import type { CanvasParts } from './canvas-context';
import type { CanvasProps } from './canvas-props';
import { pressWire } from './press-wire';
import type { BendingHands } from './use-bending';
import type { PlacingHands } from './use-placing';
import type { View } from './use-view';
import type { WiringHands } from './use-wiring';

const unknown = () => undefined;

type Hands = { readonly placing: PlacingHands; readonly wiring: WiringHands; readonly bending: BendingHands };

/** What the page joins to symbols and wires, and what a press on them begins; all the hands are stable. */
export function useJoinedParts(
  { Tag, PartProblem, useRegion = unknown, commands: { canEdit } }: CanvasProps,
  { placing, wiring, bending }: Hands,
  { toSheet }: View,
): CanvasParts {
  return useMemo(
    () => ({
      Tag,
      PartProblem,
      useRegion,
      // A click on a terminal with a part in the hand sets the part down there; it begins no wire.
      pressTerminal: (end, event) => {
        if (!placing.now()) wiring.press(end, event);
      },
      pressWire: canEdit
        ? (wire, event) => {
            if (!placing.now() && !wiring.now()) pressWire(wire, event, bending, toSheet);
          }
        : undefined,
    }),
    [Tag, PartProblem, useRegion, canEdit, placing, wiring, bending, toSheet],
  );
}
