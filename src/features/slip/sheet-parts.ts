import { createContext, useContext } from 'react';
import type { DrawnPart } from '#shared/circuit/drawing';

/** All parts of the sheet, for what a slip says of its part among the others. */
const SheetParts = createContext<readonly DrawnPart[]>([]);

export const SheetPartsProvider = SheetParts.Provider;

export function useSheetParts(): readonly DrawnPart[] {
  return useContext(SheetParts);
}
