import { figureColumn } from '../../formats/figures';
import type { LedgerColumn } from './ledger-table';

/** A column of figures under one prefix, in line on the decimal mark. Rows without the figure sort last. */
export function figures<Row>(
  name: string,
  unit: string,
  rows: readonly Row[],
  pick: (row: Row) => number | undefined,
  exponent?: number,
): LedgerColumn<Row> {
  const column = figureColumn(rows.map(pick), unit, exponent);
  const texts = new Map(rows.map((row, index) => [row, column.texts[index]]));
  return {
    key: name,
    head: `${name} / ${column.unit}`,
    cell: (row) => texts.get(row),
    compare: (a, b) => orLast(pick(a)) - orLast(pick(b)),
  };
}

function orLast(value: number | undefined): number {
  return value !== undefined && Number.isFinite(value) ? value : Number.MAX_VALUE;
}
