import type { ReactNode, TdHTMLAttributes, ThHTMLAttributes } from 'react';

/** Rows between hairlines, as on a parts list. */
export function Table({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  return (
    <table aria-label={label} className="w-full border-collapse">
      {children}
    </table>
  );
}

export function HeadCell({ className = '', ...rest }: ThHTMLAttributes<HTMLTableCellElement>) {
  return (
    <th
      scope="col"
      {...rest}
      className={`border-b border-edge py-2 pr-3 text-xs sm:pr-6 whitespace-nowrap text-faint last:pr-0 sm:last:pr-0 ${className}`}
    />
  );
}

interface SortHeadCellProps {
  readonly label: string;
  /** How the rows stand now by this column; undefined while they are ordered by another. */
  readonly order: 'rising' | 'falling' | undefined;
  readonly onSort: () => void;
  /** Of figures that stand at the right. */
  readonly numeric?: boolean;
  readonly className?: string;
}

/** A head that orders the rows by its column, and turns the order round when pressed again. */
export function SortHeadCell({ label, order, onSort, numeric = false, className = '' }: SortHeadCellProps) {
  const sorted = { rising: 'ascending', falling: 'descending' } as const;
  return (
    <HeadCell
      className={`${numeric ? 'text-right' : ''} ${className}`}
      {...(order === undefined ? {} : { 'aria-sort': sorted[order] })}
    >
      <button
        type="button"
        className={`inline-flex min-h-6 items-center gap-2 hover:text-ink ${numeric ? 'flex-row-reverse' : ''} ${order === undefined ? '' : 'text-ink'}`}
        onClick={onSort}
      >
        {label}
        <svg
          width="8"
          height="6"
          viewBox="0 0 8 6"
          aria-hidden="true"
          className={order === undefined ? 'invisible' : ''}
        >
          <path d={order === 'falling' ? 'M0 0H8L4 6Z' : 'M0 6H8L4 0Z'} fill="currentColor" />
        </svg>
      </button>
    </HeadCell>
  );
}

export function Cell({ className = '', ...rest }: TdHTMLAttributes<HTMLTableCellElement>) {
  return <td {...rest} className={`border-b border-rule py-2 pr-3 last:pr-0 sm:pr-6 sm:last:pr-0 ${className}`} />;
}
