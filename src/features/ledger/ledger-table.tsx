import { type KeyboardEvent, type MouseEvent, memo, type ReactNode, useMemo, useState } from 'react';
import type { PartId } from '#shared/circuit/drawing';
import type { LedgerColumn } from './ledger-column';
import { LedgerRow } from './ledger-row';
import { type Choice, choiceOf, chosen } from './row-selection';
import { SortMark } from './sort-mark';

export type RowActions = {
  /** The pointer or the focus is on the row of this part, or on none. */
  onLight(part: PartId | undefined): void;
  /** The row was clicked: bring its part into view. */
  onFrame(part: PartId): void;
  /** The row was entered: open its part's slip. */
  onOpen(part: PartId): void;
  onSelectParts(parts: ReadonlySet<PartId>): void;
};

type TableProps<Row> = {
  label: string;
  columns: readonly LedgerColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  partOf: (row: Row) => PartId | undefined;
  selected: ReadonlySet<PartId>;
  /** Key of the column that orders the rows at first. */
  firstOrder: string;
} & RowActions;

/**
 * A table whose rows stand for parts: one tab stop, arrows walk the rows and with Shift select them, Enter opens the part's
 * slip, a click goes to it. Its first column names the row, and stays in sight where the table is wider than the page.
 */
export const LedgerTable = memo(function LedgerTable<Row>({
  label,
  columns,
  rows,
  rowKey,
  partOf,
  selected,
  firstOrder,
  onLight,
  onFrame,
  onOpen,
  onSelectParts,
}: TableProps<Row>) {
  const [order, setOrder] = useState({ key: firstOrder, falling: false });
  const [active, setActive] = useState<string>();
  const [anchor, setAnchor] = useState<PartId>();
  const sorted = useMemo(() => sortedBy(rows, columns, order), [rows, columns, order]);
  const keys = sorted.map(rowKey);
  const stop = active !== undefined && keys.includes(active) ? active : keys[0];

  const choose = (part: PartId, choice: Choice) => {
    const parts = sorted.flatMap((row) => partOf(row) ?? []);
    onSelectParts(chosen(selected, part, choice, parts, anchor));
    if (choice !== 'through' || anchor === undefined) setAnchor(part);
  };
  const click = (part: PartId, event: MouseEvent) => {
    const choice = choiceOf(event);
    choose(part, choice);
    if (choice === 'alone') onFrame(part);
  };
  const press = (part: PartId | undefined, event: KeyboardEvent<HTMLTableRowElement>) => {
    if (event.key === 'Enter' && part !== undefined) {
      event.preventDefault();
      choose(part, 'alone');
      onFrame(part);
      onOpen(part);
      return;
    }
    const target = ROW_FOR_KEY[event.key]?.(event.currentTarget);
    const button = target?.querySelector('button');
    if (!target || !button) return;
    event.preventDefault();
    button.focus();
    const reached = sorted[[...(target.parentElement?.children ?? [])].indexOf(target)];
    const reachedPart = reached && partOf(reached);
    if (!event.shiftKey || part === undefined || reachedPart === undefined) return;
    const parts = sorted.flatMap((row) => partOf(row) ?? []);
    // A run goes on while the row it has come to is part of it; on any other row another begins.
    const from = anchor !== undefined && selected.has(part) ? anchor : part;
    setAnchor(from);
    onSelectParts(chosen(selected, reachedPart, 'through', parts, from));
  };
  const focus = (key: string, part: PartId | undefined) => {
    setActive(key);
    onLight(part);
  };

  return (
    <table aria-label={label} className="min-w-full whitespace-nowrap text-xs">
      <thead className="sticky top-0 z-20 bg-paper text-faint shadow-[inset_0_-1px_var(--rule)]">
        <tr>
          {columns.map(({ key, head, headText }) => (
            <th
              key={key}
              scope="col"
              aria-sort={order.key === key ? (order.falling ? 'descending' : 'ascending') : undefined}
              className="h-7 bg-paper pr-4 shadow-[inset_0_-1px_var(--rule)] first:sticky first:left-0 first:z-10 first:pl-4 sm:first:pl-6"
            >
              <button
                type="button"
                aria-label={headText}
                className={`flex min-h-6 items-center gap-1.5 hover:text-ink ${order.key === key ? 'text-ink' : ''}`}
                onClick={() => setOrder({ key, falling: order.key === key && !order.falling })}
              >
                {head}
                {order.key === key && <SortMark falling={order.falling} />}
              </button>
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {sorted.map((row) => {
          const key = rowKey(row);
          const part = partOf(row);
          return (
            <LedgerRow
              key={key}
              row={row}
              columns={columns}
              isStop={key === stop}
              isSelected={part !== undefined && selected.has(part)}
              onClick={(event) => part !== undefined && click(part, event)}
              onPress={(event) => press(part, event)}
              onFocus={() => focus(key, part)}
              onLight={(lit) => onLight(lit ? part : undefined)}
            />
          );
        })}
      </tbody>
    </table>
  );
}) as <Row>(props: TableProps<Row>) => ReactNode;

const ROW_FOR_KEY: Readonly<Record<string, (row: HTMLTableRowElement) => Element | null | undefined>> = {
  ArrowDown: (row) => row.nextElementSibling,
  ArrowUp: (row) => row.previousElementSibling,
  Home: (row) => row.parentElement?.firstElementChild,
  End: (row) => row.parentElement?.lastElementChild,
};

function sortedBy<Row>(
  rows: readonly Row[],
  columns: readonly LedgerColumn<Row>[],
  order: { readonly key: string; readonly falling: boolean },
): readonly Row[] {
  const column = columns.find(({ key }) => key === order.key);
  if (!column) return rows;
  const { compare, isMissing = () => false } = column;
  return rows.toSorted(
    (a, b) => Number(isMissing(a)) - Number(isMissing(b)) || (order.falling ? compare(b, a) : compare(a, b)),
  );
}
