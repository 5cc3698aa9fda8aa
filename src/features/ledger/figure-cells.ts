import { formatValue } from '#shared/units/format-value';
import { figureColumn } from '../../formats/figures';
import type { LedgerColumn } from './ledger-column';

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
  const figure = (row: Row) => {
    const value = pick(row);
    return value !== undefined && Number.isFinite(value) ? value : undefined;
  };
  return {
    key: name,
    head: `${name} / ${column.unit}`,
    cell: (row) => texts.get(row),
    precise(row) {
      const value = figure(row);
      return value === undefined ? undefined : formatValue(value, unit, 4);
    },
    compare: (a, b) => (figure(a) ?? 0) - (figure(b) ?? 0),
    isMissing: (row) => figure(row) === undefined,
  };
}
