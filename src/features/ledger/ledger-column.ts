import type { ReactNode } from 'react';

/** A column of a table of the ledger. */
export type LedgerColumn<Row> = {
  readonly key: string;
  readonly head: ReactNode;
  /** What the head says, where it is no plain text. */
  readonly headText?: string;
  readonly cell: (row: Row) => ReactNode;
  /** The cell's figure at length, for a hover. */
  readonly precise?: (row: Row) => string | undefined;
  readonly compare: (a: Row, b: Row) => number;
  /** Rows without the figure come last whichever way the column sorts. */
  readonly isMissing?: (row: Row) => boolean;
};
