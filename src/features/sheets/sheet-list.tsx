import type { ListedSheet } from '#shared/api/sheets';
import { figureColumn } from '../../formats/figures';
import { Select } from '../../ui/select';
import { HeadCell, SortHeadCell, Table } from '../../ui/table';
import { inOrder, SHEET_COLUMNS, type SheetColumn, type SheetOrder, worstMargin } from './sheet-order';
import { type SheetActions, SheetRow } from './sheet-row';

const MILLI = -3;

const COLUMN_LOOKS: Record<SheetColumn, string> = {
  name: 'w-full',
  fets: 'hidden sm:table-cell',
  worst: 'hidden xl:table-cell',
  margin: 'hidden xl:table-cell',
  here: 'hidden sm:table-cell',
  changed: 'hidden sm:table-cell',
};

interface SheetListProps {
  readonly label: string;
  readonly sheets: readonly ListedSheet[];
  readonly order: SheetOrder;
  readonly onOrder: (order: SheetOrder) => void;
  readonly actions: SheetActions;
}

/** Sheets, one a line, in an order that any column sets. */
export function SheetList({ label, sheets, order, onOrder, actions }: SheetListProps) {
  const hasActions = Object.values(actions).some(Boolean);
  const ordered = inOrder(sheets, order);
  const margins = figureColumn(ordered.map(worstMargin), 'V', MILLI);
  return (
    <Table label={label}>
      <thead>
        <tr>
          {SHEET_COLUMNS.map(({ key, label: name, falling }) => (
            <SortHeadCell
              key={key}
              label={name}
              numeric={key === 'fets' || key === 'margin'}
              className={COLUMN_LOOKS[key]}
              order={order.by === key ? (order.falling ? 'falling' : 'rising') : undefined}
              onSort={() => onOrder({ by: key, falling: order.by === key ? !order.falling : falling })}
            />
          ))}
          {hasActions && (
            <HeadCell>
              <span className="sr-only">actions</span>
            </HeadCell>
          )}
        </tr>
      </thead>
      <tbody>
        {ordered.map((sheet, index) => (
          <SheetRow
            key={sheet.id}
            sheet={sheet}
            margin={margins.texts[index] ?? ''}
            actions={actions}
            hasActions={hasActions}
          />
        ))}
      </tbody>
    </Table>
  );
}

/** The same orders where there is no room for heads. */
export function OrderSelect({ order, onOrder }: Pick<SheetListProps, 'order' | 'onOrder'>) {
  return (
    <Select
      aria-label="Order by"
      className="h-9 w-40 shrink-0 xl:hidden"
      value={order.by}
      onChange={(event) => {
        const chosen = SHEET_COLUMNS.find(({ key }) => key === event.target.value);
        if (chosen) onOrder({ by: chosen.key, falling: chosen.falling });
      }}
    >
      {SHEET_COLUMNS.map(({ key, label }) => (
        <option key={key} value={key}>
          {label}
        </option>
      ))}
    </Select>
  );
}
