/** Where one sheet's live document is kept. All of it is synchronous, so that a room never has two loads or stores in flight. */
export interface SheetLog {
  /** The updates that make up the document, in the order they were stored. */
  load(): readonly Uint8Array[];
  /** Stores all of these durably, or throws and stores none. */
  append(updates: readonly Uint8Array[]): void;
  /** Puts the whole state in the place of all that is stored. */
  compact(state: Uint8Array): void;
}

export type OpenLog = (sheetId: string) => SheetLog;
