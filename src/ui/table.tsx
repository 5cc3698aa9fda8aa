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

export function Cell({ className = '', ...rest }: TdHTMLAttributes<HTMLTableCellElement>) {
  return <td {...rest} className={`border-b border-rule py-2 pr-3 last:pr-0 sm:pr-6 sm:last:pr-0 ${className}`} />;
}
