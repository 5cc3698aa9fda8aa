import type { KeyboardEvent, MouseEvent } from 'react';
import type { LedgerColumn } from './ledger-column';

/** A row of the ledger; its name is its one stop for the keyboard. */
export function LedgerRow<Row>({
  row,
  columns: [first, ...others],
  isStop,
  isSelected,
  onClick,
  onPress,
  onFocus,
  onLight,
}: {
  row: Row;
  columns: readonly LedgerColumn<Row>[];
  isStop: boolean;
  isSelected: boolean;
  onClick: (event: MouseEvent) => void;
  onPress: (event: KeyboardEvent<HTMLTableRowElement>) => void;
  onFocus: () => void;
  onLight: (lit: boolean) => void;
}) {
  return (
    <tr
      aria-current={isSelected ? 'true' : undefined}
      className={`group border-rule border-b hover:bg-sheet focus-within:bg-sheet ${isSelected ? 'bg-sheet' : ''}`}
      onMouseEnter={() => onLight(true)}
      onMouseLeave={() => onLight(false)}
      // Rows are chosen in runs with Shift, which would select their text as well.
      onMouseDown={(event) => event.shiftKey && event.preventDefault()}
      onClick={onClick}
      onKeyDown={onPress}
    >
      <th
        scope="row"
        className={`sticky left-0 z-10 h-6 pr-4 pl-4 group-focus-within:z-[11] group-focus-within:bg-sheet group-hover:bg-sheet sm:pl-6 ${
          isSelected ? 'bg-sheet shadow-[inset_3px_0_var(--focus)]' : 'bg-paper'
        }`}
      >
        <button
          type="button"
          tabIndex={isStop ? 0 : -1}
          className="min-h-6 min-w-6 scroll-mt-8 text-left font-bold"
          onFocus={onFocus}
          onBlur={() => onLight(false)}
        >
          {first?.cell(row)}
        </button>
      </th>
      {others.map(({ key, cell, precise }) => (
        <td key={key} className="h-6 pr-4" title={precise?.(row)}>
          {cell(row)}
        </td>
      ))}
    </tr>
  );
}
