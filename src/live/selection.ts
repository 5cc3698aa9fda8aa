import type { PartId, WireId } from '#shared/circuit/drawing';

/** What one person has selected here; nobody else's business but as presence. */
export type Selection = { readonly parts: ReadonlySet<PartId>; readonly wires: ReadonlySet<WireId> };

export const NOTHING_SELECTED: Selection = { parts: new Set(), wires: new Set() };
