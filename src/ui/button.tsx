import type { ButtonHTMLAttributes, ReactNode, Ref } from 'react';
import { Link, type LinkProps } from 'react-router-dom';

type Look = 'plain' | 'strong' | 'quiet' | 'danger';

const LOOKS: Record<Look, string> = {
  plain: 'border border-edge bg-sheet px-3.5 hover:bg-paper',
  strong: 'border border-ink bg-ink px-3.5 text-sheet hover:border-faint hover:bg-faint',
  quiet: 'underline decoration-edge underline-offset-4 hover:decoration-current',
  danger: 'border border-missed bg-sheet px-3.5 text-missed hover:bg-missed hover:text-sheet',
};

const SHAPE = 'inline-flex min-h-8 items-center justify-center gap-2 text-center aria-disabled:opacity-60';

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  readonly look?: Look;
  /** Something this button started is under way: it keeps the focus, but does nothing. */
  readonly busy?: boolean;
  readonly ref?: Ref<HTMLButtonElement>;
  readonly children: ReactNode;
}

export function Button({
  look = 'plain',
  busy = false,
  type = 'button',
  className = '',
  onClick,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      // A disabled button would drop the focus; this one only refuses.
      aria-disabled={busy || undefined}
      type={busy && type === 'submit' ? 'button' : type}
      onClick={busy ? undefined : onClick}
      className={`${SHAPE} ${LOOKS[look]} ${className}`}
    />
  );
}

export function ButtonLink({ look = 'plain', className = '', ...rest }: LinkProps & { readonly look?: Look }) {
  return <Link {...rest} className={`${SHAPE} ${LOOKS[look]} ${className}`} />;
}
