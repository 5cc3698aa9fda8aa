import { type KeyboardEvent, type ReactNode, useState } from 'react';
import type { PartId } from '#shared/circuit/drawing';
import { SortMark } from './sort-mark';

export type LedgerColumn<Row> = {
  readonly key: string;
  readonly head: ReactNode;
  readonly cell: (row: Row) => ReactNode;
  /** How rows are ordered by this column; a column without it does not sort. */
  readonly compare?: (a: Row, b: Row) => number;
};

export type RowActions = {
  /** The pointer or the focus is on the row of this part, or on none. */
  onLight(part: PartId | undefined): void;
  /** The row was clicked or entered. */
  onFrame(part: PartId): void;
};

type Order = { readonly key: string; readonly falling: boolean };

/**
 * A table whose rows stand for parts: one tab stop, arrows walk the rows, Enter or a click goes to the part. Its first column
 * names the row.
 */
export function LedgerTable<Row>({
  label,
  columns,
  rows,
  rowKey,
  partOf,
  selected,
  firstOrder,
  busy,
  onLight,
  onFrame,
}: {
  label: string;
  columns: readonly LedgerColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  partOf: (row: Row) => PartId | undefined;
  selected: ReadonlySet<PartId>;
  firstOrder: Order;
  busy: boolean;
} & RowActions) {
  const [order, setOrder] = useState(firstOrder);
  const [active, setActive] = useState<string>();
  const sorted = sortedBy(rows, columns.find(({ key }) => key === order.key)?.compare, order.falling);
  const keys = sorted.map(rowKey);
  const stop = active !== undefined && keys.includes(active) ? active : keys[0];

  const [first, ...others] = columns;

  return (
    <table aria-label={label} aria-busy={busy} className="min-w-full text-xs whitespace-nowrap">
      <thead className="sticky top-0 z-10 bg-paper text-faint shadow-[inset_0_-1px_var(--rule)]">
        <tr>
          {columns.map(({ key, head, compare }) => (
            <th
              key={key}
              scope="col"
              aria-sort={compare && order.key === key ? (order.falling ? 'descending' : 'ascending') : undefined}
              className="h-7 pr-4 first:pl-4 sm:first:pl-6"
            >
              {compare ? (
                <button
                  type="button"
                  className={`flex min-h-6 items-center gap-1.5 hover:text-ink ${order.key === key ? 'text-ink' : ''}`}
                  onClick={() => setOrder({ key, falling: order.key === key && !order.falling })}
                >
                  {head}
                  {order.key === key && <SortMark falling={order.falling} />}
                </button>
              ) : (
                head
              )}
            </th>
          ))}
        </tr>
      </thead>
      <tbody className={`transition-opacity ${busy ? 'opacity-45' : ''}`}>
        {sorted.map((row) => {
          const key = rowKey(row);
          const part = partOf(row);
          const isSelected = part !== undefined && selected.has(part);
          return (
            <tr
              key={key}
              aria-current={isSelected ? 'true' : undefined}
              className={`border-rule border-b hover:bg-sheet focus-within:bg-sheet ${
                isSelected ? 'bg-sheet shadow-[inset_3px_0_var(--focus)]' : ''
              }`}
              onMouseEnter={() => onLight(part)}
              onMouseLeave={() => onLight(undefined)}
              onClick={() => part !== undefined && onFrame(part)}
              onKeyDown={walkRows}
            >
              <th scope="row" className="h-6 pr-4 pl-4 sm:pl-6">
                {/* The row's one stop for the keyboard; its click is the row's. */}
                <button
                  type="button"
                  tabIndex={key === stop ? 0 : -1}
                  className="min-h-6 min-w-6 scroll-mt-8 text-left font-bold"
                  onFocus={() => {
                    setActive(key);
                    onLight(part);
                  }}
                  onBlur={() => onLight(undefined)}
                >
                  {first?.cell(row)}
                </button>
              </th>
              {others.map((column) => (
                <td key={column.key} className="h-6 pr-4">
                  {column.cell(row)}
                </td>
              ))}
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}

function walkRows(event: KeyboardEvent<HTMLTableRowElement>): void {
  const target = ROW_FOR_KEY[event.key]?.(event.currentTarget)?.querySelector('button');
  if (!target) return;
  event.preventDefault();
  target.focus();
}

const ROW_FOR_KEY: Readonly<Record<string, (row: HTMLTableRowElement) => Element | null | undefined>> = {
  ArrowDown: (row) => row.nextElementSibling,
  ArrowUp: (row) => row.previousElementSibling,
  Home: (row) => row.parentElement?.firstElementChild,
  End: (row) => row.parentElement?.lastElementChild,
};

function sortedBy<Row>(
  rows: readonly Row[],
  compare: ((a: Row, b: Row) => number) | undefined,
  falling: boolean,
): readonly Row[] {
  if (!compare) return rows;
  return [...rows].sort((a, b) => (falling ? compare(b, a) : compare(a, b)));
}
