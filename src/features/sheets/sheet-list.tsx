import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { Sheet, SheetState } from '#shared/api/sheets';
import { Button } from '../../ui/button';
import { Cell, HeadCell, Table } from '../../ui/table';
import { When } from '../../ui/when';

const STATE_TEXTS: Record<SheetState, string> = {
  draft: 'draft',
  'in-review': 'in review',
  'signed-off': 'signed off',
  changed: 'changed since sign-off',
};

interface SheetListProps {
  readonly label: string;
  readonly sheets: readonly Sheet[];
  /** What may be done with each; null where the reader may do nothing. */
  readonly action: ((sheet: Sheet) => ReactNode) | null;
}

/** Sheets, one a line. */
export function SheetList({ label, sheets, action }: SheetListProps) {
  return (
    <Table label={label}>
      <thead>
        <tr>
          <HeadCell className="w-full sm:w-1/2">name</HeadCell>
          <HeadCell className="hidden sm:table-cell">state</HeadCell>
          <HeadCell className="hidden md:table-cell">begun</HeadCell>
          <HeadCell className="hidden sm:table-cell">last change</HeadCell>
          {action !== null && (
            <HeadCell>
              <span className="sr-only">actions</span>
            </HeadCell>
          )}
        </tr>
      </thead>
      <tbody>
        {sheets.map((sheet) => (
          <tr key={sheet.id}>
            <Cell className="max-w-0">
              <Link to={`/sheets/${sheet.id}`} className="block py-1 font-bold wrap-anywhere hover:underline">
                {sheet.name}
              </Link>
              <span className="block text-xs text-faint sm:hidden">
                {STATE_TEXTS[sheet.state]}, <When at={sheet.changedAt} />
              </span>
            </Cell>
            <Cell className="hidden whitespace-nowrap sm:table-cell">{STATE_TEXTS[sheet.state]}</Cell>
            <Cell className="hidden text-faint md:table-cell">
              <When at={sheet.createdAt} />
            </Cell>
            <Cell className="hidden sm:table-cell">
              <When at={sheet.changedAt} />
            </Cell>
            {action !== null && <Cell className="text-right">{action(sheet)}</Cell>}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

interface RowActionProps {
  readonly sheet: Sheet;
  readonly text: string;
  readonly busy: boolean;
  readonly onClick: () => void;
}

export function RowAction({ sheet, text, busy, onClick }: RowActionProps) {
  return (
    <Button
      look="quiet"
      className="text-xs whitespace-nowrap"
      busy={busy}
      aria-label={`${text}: ${sheet.name}`}
      onClick={onClick}
    >
      {text}
    </Button>
  );
}
